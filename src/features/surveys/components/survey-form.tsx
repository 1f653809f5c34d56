import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { createSurveyRequest, type CreateSurveyRequest } from '#shared/contracts/survey.ts';
import { Button } from '#src/components/button.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary, type FormFault } from '#src/components/form-error-summary.tsx';
import { Select } from '#src/components/select.tsx';
import type { ApiError } from '#src/lib/api-error.ts';

/** Which route was walked on which day. */
export function SurveyForm({
  routes,
  routeId,
  today,
  saving,
  failure,
  existing,
  onSave,
}: {
  routes: readonly { id: number; name: string }[];
  routeId: number | null;
  today: string;
  saving: boolean;
  failure: ApiError | null;
  /** What to say where the route has a survey of that day: it leads there. */
  existing: (survey: CreateSurveyRequest) => ReactNode;
  onSave: (survey: CreateSurveyRequest) => void;
}) {
  const form = useForm({
    resolver: zodResolver(surveyOfPast(today)),
    defaultValues: { routeId: routeId ?? ('' as unknown), surveyedOn: today },
  });
  const { errors } = form.formState;
  const [chosenRoute, surveyedOn] = useWatch({
    control: form.control,
    name: ['routeId', 'surveyedOn'],
  });
  const there = existing({ routeId: Number(chosenRoute), surveyedOn });
  const faults: FormFault[] = [
    ...(errors.routeId ? [{ inputId: 'routeId', message: errors.routeId.message ?? '' }] : []),
    ...(errors.surveyedOn
      ? [{ inputId: 'surveyedOn', message: errors.surveyedOn.message ?? '' }]
      : []),
  ];
  if (faults.length === 0 && failure !== null && !there) faults.push({ message: failure.message });
  const send = form.handleSubmit(onSave);
  return (
    <form
      noValidate
      onSubmit={(event) => void send(event)}
      className="flex max-w-xl flex-col gap-5"
    >
      <FormErrorSummary faults={faults} />
      <Field id="routeId" label="Route" error={errors.routeId?.message}>
        <Select
          placeholder="Choose a route"
          options={routes.map(({ id, name }) => ({ value: String(id), label: name }))}
          {...form.register('routeId')}
        />
      </Field>
      <Field
        id="surveyedOn"
        label="Date of the walk"
        hint="One survey a route and day"
        error={errors.surveyedOn?.message}
      >
        <DateInput max={today} {...form.register('surveyedOn')} />
      </Field>
      {there || (
        <div>
          <Button type="submit" variant="primary" busy={saving} busyLabel="Making…">
            Make the survey
          </Button>
        </div>
      )}
    </form>
  );
}

const surveyOfPast = (today: string) =>
  createSurveyRequest.extend({
    routeId: z.coerce.number().int().min(1, 'Choose a route.'),
    surveyedOn: createSurveyRequest.shape.surveyedOn.refine(
      (day) => day <= today,
      'The date lies in the future.',
    ),
  });

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type FieldErrors } from 'react-hook-form';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { createRouteRequest, type CreateRouteRequest } from '#shared/contracts/route.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Panel } from '#src/components/panel.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asNumber } from '#src/lib/form-values.ts';
import { faultsOf } from './form-faults.ts';
import { PointPicker } from './point-picker.tsx';

/** A route: its name, what to record there, and the points in the order of the walk. */
export function RouteForm({
  route,
  choices,
  saving,
  failure,
  onSave,
}: {
  route?: CreateRouteRequest;
  choices: readonly PointChoice[];
  saving: boolean;
  failure: ApiError | null;
  onSave: (route: CreateRouteRequest) => void;
}) {
  const form = useForm({
    resolver: zodResolver(createRouteRequest),
    defaultValues: route ?? { name: '', topFrequencyHz: null, lineCount: null, pointIds: [] },
  });
  const { register, formState, watch, setValue } = form;
  const errors: FieldErrors = formState.errors;
  const error = (name: keyof CreateRouteRequest) => errors[name]?.message as string | undefined;
  const send = form.handleSubmit(onSave);
  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-5">
      <FormErrorSummary faults={faultsOf(errors, failure)} />
      <div className="grid max-w-4xl gap-4 phone:grid-cols-3">
        <Field id="name" label="Name" error={error('name')}>
          <TextInput {...register('name')} />
        </Field>
        <Field
          id="topFrequencyHz"
          label="Top frequency"
          hint="What to record at each point"
          optional
          error={error('topFrequencyHz')}
        >
          <NumberInput unit="Hz" {...register('topFrequencyHz', asNumber)} />
        </Field>
        <Field
          id="lineCount"
          label="Spectrum lines"
          hint="Lines ÷ top frequency is the duration"
          optional
          error={error('lineCount')}
        >
          <NumberInput whole {...register('lineCount', asNumber)} />
        </Field>
      </div>
      <Panel title="Measuring points, in the order of the walk">
        <PointPicker
          id="pointIds"
          choices={choices}
          chosen={watch('pointIds').map(Number)}
          error={error('pointIds')}
          onChange={(pointIds) =>
            setValue('pointIds', pointIds, {
              shouldDirty: true,
              shouldValidate: formState.isSubmitted,
            })
          }
        />
      </Panel>
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Save route
        </Button>
      </div>
    </form>
  );
}

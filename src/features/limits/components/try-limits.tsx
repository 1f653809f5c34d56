import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import {
  tryLimitsQuery,
  type LimitsResponse,
  type TryLimitsQuery,
} from '#shared/contracts/limits.ts';
import { machineKinds } from '#shared/contracts/machine.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { asNumber } from '#src/lib/form-values.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { trialForm, trialQueryOf, type TrialForm } from './trial-form.ts';

/** The limits to try: for whom, and from which scores. */
export function TryLimits({
  limits,
  onTry,
}: {
  limits: LimitsResponse;
  onTry: (query: TryLimitsQuery) => void;
}) {
  const { register, handleSubmit, control, formState, setValue } = useForm<TrialForm>({
    resolver: zodResolver(trialForm),
    defaultValues: {
      machineKind: '',
      follow: false,
      suspectedScore: limits.site.suspectedScore,
      likelyScore: limits.site.likelyScore,
    },
  });
  const { errors } = formState;
  const [machineKind, follow] = useWatch({ control, name: ['machineKind', 'follow'] });
  const inForce = (kind: string) =>
    limits.kinds.find((one) => one.machineKind === kind) ?? limits.site;
  const followed = machineKind === '' ? limits.method : limits.site;
  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) =>
        void handleSubmit((form) => onTry(tryLimitsQuery.parse(trialQueryOf(form))))(event)
      }
    >
      <div className="grid gap-4 phone:grid-cols-3">
        <Field label="For">
          <Select
            {...register('machineKind', {
              onChange: (event: { target: { value: string } }) => {
                const { suspectedScore, likelyScore } = inForce(event.target.value);
                setValue('suspectedScore', suspectedScore);
                setValue('likelyScore', likelyScore);
                setValue('follow', false);
              },
            })}
            options={[
              { value: '', label: 'The whole site' },
              ...machineKinds
                .filter((kind) => limits.kinds.some((one) => one.machineKind === kind))
                .map((kind) => ({ value: kind, label: `Machine kind: ${kind}` })),
            ]}
          />
        </Field>
        <Field
          label="Looseness suspected from"
          hint="A score between 0 and 1."
          error={follow ? undefined : errors.suspectedScore?.message}
        >
          <NumberInput disabled={follow} {...register('suspectedScore', asNumber)} />
        </Field>
        <Field
          label="Looseness likely from"
          hint="A score between 0 and 1."
          error={follow ? undefined : errors.likelyScore?.message}
        >
          <NumberInput disabled={follow} {...register('likelyScore', asNumber)} />
        </Field>
      </div>
      <Checkbox
        {...register('follow')}
        label={`${machineKind === '' ? 'As the method proposes' : 'As the whole site'} (${formatFixed(followed.suspectedScore, 2)} and ${formatFixed(followed.likelyScore, 2)})`}
      />
      <div>
        <Button type="submit" variant="primary">
          Try on the past surveys
        </Button>
      </div>
    </form>
  );
}

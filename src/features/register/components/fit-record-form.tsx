import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type FieldErrors } from 'react-hook-form';
import {
  createFitRecordRequest,
  fitSources,
  seatConditions,
  seatNames,
  type CreateFitRecordRequest,
} from '#shared/contracts/fit-record.ts';
import { Button } from '#src/components/button.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asNumber, asTextOrNull } from '#src/lib/form-values.ts';
import { faultsOf } from './form-faults.ts';
import { optionsOf } from './machine-words.ts';

const fresh: CreateFitRecordRequest = {
  seat: 'shaft',
  recordedOn: '',
  source: 'drawing',
  toleranceClass: null,
  seatMeasuredMm: null,
  ringMeasuredMm: null,
  diameterUnit: 'mm',
  driveUpMm: null,
  clearanceReductionUm: null,
  bonding: null,
  condition: null,
  note: null,
};

/** What is known of one seat on one date. Records are added, never overwritten. */
export function FitRecordForm({
  saving,
  failure,
  onSave,
}: {
  saving: boolean;
  failure: ApiError | null;
  onSave: (record: CreateFitRecordRequest) => void;
}) {
  const form = useForm({ resolver: zodResolver(createFitRecordRequest), defaultValues: fresh });
  const { register, formState, watch } = form;
  const errors: FieldErrors = formState.errors;
  const error = (name: keyof CreateFitRecordRequest) => errors[name]?.message as string | undefined;
  const send = form.handleSubmit(onSave);
  const onShaft = watch('seat') === 'shaft';
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.stopPropagation();
        void send(event);
      }}
      className="flex flex-col gap-4"
    >
      <FormErrorSummary faults={faultsOf(errors, failure)} />
      <div className="grid gap-4 phone:grid-cols-3">
        <Field id="seat" label="Seat" error={error('seat')}>
          <Select
            options={optionsOf(seatNames).map((one) => ({ ...one, label: `${one.label} seat` }))}
            {...register('seat')}
          />
        </Field>
        <Field id="recordedOn" label="Date" error={error('recordedOn')}>
          <DateInput {...register('recordedOn')} />
        </Field>
        <Field id="source" label="Source" error={error('source')}>
          <Select options={optionsOf(fitSources)} {...register('source')} />
        </Field>
        <Field
          id="toleranceClass"
          label="Tolerance class (ISO 286)"
          hint={onShaft ? 'e.g. k5' : 'e.g. H7'}
          optional
          error={error('toleranceClass')}
        >
          <TextInput {...register('toleranceClass', asTextOrNull)} />
        </Field>
        <Field
          id="seatMeasuredMm"
          label={onShaft ? 'Shaft, mean diameter' : 'Housing bore, mean diameter'}
          hint="Measured at 20 °C"
          optional
          error={error('seatMeasuredMm')}
        >
          <NumberInput unit="mm" {...register('seatMeasuredMm', asNumber)} />
        </Field>
        <Field
          id="ringMeasuredMm"
          label={onShaft ? 'Bearing bore, mean' : 'Bearing outside diameter, mean'}
          hint="Measured at 20 °C"
          optional
          error={error('ringMeasuredMm')}
        >
          <NumberInput unit="mm" {...register('ringMeasuredMm', asNumber)} />
        </Field>
        <Field id="condition" label="Condition" optional error={error('condition')}>
          <Select
            placeholder="Not looked at"
            options={optionsOf(seatConditions)}
            {...register('condition', asTextOrNull)}
          />
        </Field>
      </div>
      <Field id="note" label="Note" optional error={error('note')}>
        <Textarea {...register('note', asTextOrNull)} />
      </Field>
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Add fit record
        </Button>
      </div>
    </form>
  );
}

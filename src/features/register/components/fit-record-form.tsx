import { useForm, type FieldErrors } from 'react-hook-form';
import {
  diameterUnits,
  fitSources,
  seatBondings,
  seatConditions,
  seatNames,
  type AddFitRecordRequest,
} from '#shared/contracts/fit-record.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asNumber, asTextOrNull } from '#src/lib/form-values.ts';
import { fitRecordResolver, isTaperedSeat, type RecordedPosition } from './fit-record-draft.ts';
import { faultAt, faultsOf } from './form-faults.ts';
import { optionsOf } from './machine-words.ts';

const fresh: AddFitRecordRequest = {
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
  correctsSameDay: false,
};

function classHint(isTapered: boolean, onShaft: boolean): string {
  if (isTapered) return 'Of the shaft under the sleeve, e.g. h9';
  return onShaft ? 'e.g. k5' : 'e.g. H7';
}

const unitWords = { mm: 'Millimetres', in: 'Inches' } as const;

/** What is known of one seat on one date. Records are added, never overwritten. */
export function FitRecordForm({
  position,
  initial,
  saving,
  failure,
  onSave,
}: {
  position: RecordedPosition;
  /** Values the form begins with. */
  initial?: Partial<AddFitRecordRequest>;
  saving: boolean;
  failure: ApiError | null;
  onSave: (record: AddFitRecordRequest) => void;
}) {
  const form = useForm({
    resolver: fitRecordResolver(position),
    defaultValues: { ...fresh, ...initial },
  });
  const { register, formState, watch } = form;
  const errors: FieldErrors = formState.errors;
  const error = (name: keyof AddFitRecordRequest) => faultAt(name, errors, failure);
  const send = form.handleSubmit(onSave);
  const [seat, recordedOn, unit] = watch(['seat', 'recordedOn', 'diameterUnit']);
  const onShaft = seat === 'shaft';
  const isTapered = isTaperedSeat(position, seat);
  const hasSameDay = position.fitRecords.some(
    (record) => record.seat === seat && record.recordedOn === recordedOn,
  );
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
          hint={classHint(isTapered, onShaft)}
          optional
          error={error('toleranceClass')}
        >
          <TextInput {...register('toleranceClass', asTextOrNull)} />
        </Field>
        <Field
          id="bonding"
          label="Adhesive"
          hint="Between ring and seat, on purpose"
          optional
          error={error('bonding')}
        >
          <Select
            placeholder="Not known"
            options={optionsOf(seatBondings)}
            {...register('bonding', asTextOrNull)}
          />
        </Field>
        <Field id="condition" label="Condition" optional error={error('condition')}>
          <Select
            placeholder="Not looked at"
            options={optionsOf(seatConditions)}
            {...register('condition', asTextOrNull)}
          />
        </Field>
      </div>
      {isTapered ? (
        <fieldset className="grid gap-4 phone:grid-cols-3">
          <legend className="lettering mb-2 text-ink-faint">Driven up on its taper</legend>
          <Field
            id="driveUpMm"
            label="Drive-up"
            hint="Along the shaft, from where all parts touched"
            optional
            error={error('driveUpMm')}
          >
            <NumberInput unit="mm" {...register('driveUpMm', asNumber)} />
          </Field>
          <Field
            id="clearanceReductionUm"
            label="Loss of internal clearance"
            hint="Before less after, by feeler gauge"
            optional
            error={error('clearanceReductionUm')}
          >
            <NumberInput unit="µm" {...register('clearanceReductionUm', asNumber)} />
          </Field>
        </fieldset>
      ) : (
        <fieldset className="grid gap-4 phone:grid-cols-3">
          <legend className="lettering mb-2 text-ink-faint">
            Measured at 20 °C, mean diameters
          </legend>
          <Field id="diameterUnit" label="Unit" error={error('diameterUnit')}>
            <Select
              options={diameterUnits.map((one) => ({ value: one, label: unitWords[one] }))}
              {...register('diameterUnit')}
            />
          </Field>
          <Field
            id="seatMeasuredMm"
            label={onShaft ? 'Shaft' : 'Housing bore'}
            optional
            error={error('seatMeasuredMm')}
          >
            <NumberInput unit={unit} {...register('seatMeasuredMm', asNumber)} />
          </Field>
          <Field
            id="ringMeasuredMm"
            label={onShaft ? 'Bearing bore' : 'Bearing outside diameter'}
            optional
            error={error('ringMeasuredMm')}
          >
            <NumberInput unit={unit} {...register('ringMeasuredMm', asNumber)} />
          </Field>
        </fieldset>
      )}
      {hasSameDay && (
        <Checkbox
          label="It corrects the record of this seat and date"
          hint="The earlier one stays in the seat's history, and no longer counts where the two differ"
          {...register('correctsSameDay')}
        />
      )}
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

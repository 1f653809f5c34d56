import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type FieldErrors } from 'react-hook-form';
import { createMachineRequest, type CreateMachineRequest } from '#shared/contracts/machine.ts';
import { Button } from '#src/components/button.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Panel } from '#src/components/panel.tsx';
import { Select, type SelectOption } from '#src/components/select.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asIdOrNull, asNumber, asTextOrNull } from '#src/lib/form-values.ts';
import { faultsOf } from './form-faults.ts';
import { criticalityOptions, kindOptions, mountingOptions } from './machine-words.ts';

const fresh: CreateMachineRequest = {
  tag: '',
  name: '',
  kind: 'pump',
  drive: null,
  powerKw: null,
  nominalSpeedRpm: null,
  speedMinRpm: null,
  speedMaxRpm: null,
  lineFrequencyHz: null,
  mounting: null,
  bladeCount: null,
  gearTeethCount: null,
  beltFrequencyHz: null,
  criticality: 'medium',
  nextPlannedStopOn: null,
  notes: null,
  ownerUserId: null,
};

/** Everything the register knows of a machine itself. */
export function MachineForm({
  machine,
  owners,
  saving,
  failure,
  onSave,
}: {
  machine?: CreateMachineRequest;
  owners: readonly SelectOption[];
  saving: boolean;
  failure: ApiError | null;
  onSave: (machine: CreateMachineRequest) => void;
}) {
  const form = useForm({
    resolver: zodResolver(createMachineRequest),
    defaultValues: machine ?? fresh,
  });
  const { register, formState } = form;
  const errors: FieldErrors = formState.errors;
  const error = (name: keyof CreateMachineRequest) => errors[name]?.message as string | undefined;
  const send = form.handleSubmit(onSave);
  return (
    <form
      noValidate
      onSubmit={(event) => void send(event)}
      className="flex max-w-4xl flex-col gap-5"
    >
      <FormErrorSummary faults={faultsOf(errors, failure)} />
      <Panel title="Which machine">
        <div className="grid gap-4 phone:grid-cols-2">
          <Field
            id="tag"
            label="Tag"
            hint="As on the drawing and the nameplate"
            error={error('tag')}
          >
            <TextInput {...register('tag')} />
          </Field>
          <Field id="name" label="Name" error={error('name')}>
            <TextInput {...register('name')} />
          </Field>
          <Field id="kind" label="Kind" error={error('kind')}>
            <Select options={kindOptions} {...register('kind')} />
          </Field>
          <Field id="criticality" label="Criticality" error={error('criticality')}>
            <Select options={criticalityOptions} {...register('criticality')} />
          </Field>
          <Field
            id="ownerUserId"
            label="Asset owner"
            hint="Is asked to inspect"
            optional
            error={error('ownerUserId')}
          >
            <Select
              placeholder="Nobody yet"
              options={owners}
              {...register('ownerUserId', asIdOrNull)}
            />
          </Field>
          <Field
            id="nextPlannedStopOn"
            label="Next planned stop"
            optional
            error={error('nextPlannedStopOn')}
          >
            <DateInput {...register('nextPlannedStopOn', asTextOrNull)} />
          </Field>
        </div>
      </Panel>
      <Panel title="How it runs">
        <div className="grid gap-4 phone:grid-cols-3">
          <Field
            id="nominalSpeedRpm"
            label="Nominal speed"
            optional
            error={error('nominalSpeedRpm')}
          >
            <NumberInput unit="r/min" {...register('nominalSpeedRpm', asNumber)} />
          </Field>
          <Field id="speedMinRpm" label="Lowest speed" optional error={error('speedMinRpm')}>
            <NumberInput unit="r/min" {...register('speedMinRpm', asNumber)} />
          </Field>
          <Field id="speedMaxRpm" label="Highest speed" optional error={error('speedMaxRpm')}>
            <NumberInput unit="r/min" {...register('speedMaxRpm', asNumber)} />
          </Field>
          <Field id="drive" label="Drive" optional error={error('drive')}>
            <TextInput
              placeholder="direct, flexible coupling"
              {...register('drive', asTextOrNull)}
            />
          </Field>
          <Field id="powerKw" label="Power" optional error={error('powerKw')}>
            <NumberInput unit="kW" {...register('powerKw', asNumber)} />
          </Field>
          <Field id="mounting" label="Mounting" optional error={error('mounting')}>
            <Select
              placeholder="Not known"
              options={mountingOptions}
              {...register('mounting', asTextOrNull)}
            />
          </Field>
        </div>
      </Panel>
      <Panel title="What else turns or hums">
        <p className="mb-3 max-w-prose text-sm text-ink-soft">
          Lines that these explain are not taken for looseness.
        </p>
        <div className="grid gap-4 phone:grid-cols-4">
          <Field
            id="lineFrequencyHz"
            label="Line frequency"
            optional
            error={error('lineFrequencyHz')}
          >
            <NumberInput unit="Hz" {...register('lineFrequencyHz', asNumber)} />
          </Field>
          <Field id="bladeCount" label="Blades or vanes" optional error={error('bladeCount')}>
            <NumberInput whole {...register('bladeCount', asNumber)} />
          </Field>
          <Field id="gearTeethCount" label="Gear teeth" optional error={error('gearTeethCount')}>
            <NumberInput whole {...register('gearTeethCount', asNumber)} />
          </Field>
          <Field
            id="beltFrequencyHz"
            label="Belt frequency"
            optional
            error={error('beltFrequencyHz')}
          >
            <NumberInput unit="Hz" {...register('beltFrequencyHz', asNumber)} />
          </Field>
        </div>
      </Panel>
      <Field id="notes" label="Notes" optional error={error('notes')}>
        <Textarea {...register('notes', asTextOrNull)} />
      </Field>
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Save machine
        </Button>
      </div>
    </form>
  );
}

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, type FieldErrors } from 'react-hook-form';
import {
  bearingClasses,
  bearingTypes,
  clearanceGroups,
  createBearingPositionRequest,
  housingMaterials,
  loadLevels,
  positionKinds,
  ringLoads,
  seatTapers,
  shaftMaterials,
  shaftSeatForms,
  type CreateBearingPositionRequest,
} from '#shared/contracts/bearing-position.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Field } from '#src/components/field.tsx';
import { FormErrorSummary } from '#src/components/form-error-summary.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Select } from '#src/components/select.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asNumber, asTextOrNull } from '#src/lib/form-values.ts';
import { faultAt, faultsOf } from './form-faults.ts';
import { optionsOf } from './machine-words.ts';
import { shaftsInWords, type Shaft } from './machine-shafts.ts';

const fresh: CreateBearingPositionRequest = createBearingPositionRequest.parse({
  code: 'DE',
  name: 'Drive end',
});

const kindOptions = positionKinds.map((kind) => ({
  value: kind,
  label: kind === 'rolling' ? 'Rolling bearing' : 'Plain bearing',
}));

type Name = keyof CreateBearingPositionRequest;
const choices: [Name, string, readonly string[]][] = [
  ['bearingType', 'Bearing type', bearingTypes],
  ['bearingClass', 'Tolerance class (ISO 492)', bearingClasses],
  ['clearanceGroup', 'Clearance group (ISO 5753-1)', clearanceGroups],
  ['innerLoad', 'Load on the inner ring', ringLoads],
  ['outerLoad', 'Load on the outer ring', ringLoads],
  ['loadLevel', 'Load level', loadLevels],
];
const sizes: [Name, string][] = [
  ['boreMm', 'Bore d'],
  ['outsideMm', 'Outside diameter D'],
  ['widthMm', 'Width B'],
];
/** What holds the bearing: seat forms, materials and walls. */
const materials: [Name, string, readonly string[]][] = [
  ['shaftMaterial', 'Shaft material', shaftMaterials],
  ['housingMaterial', 'Housing material', housingMaterials],
];
const walls: [Name, string, string][] = [
  ['shaftBoreMm', 'Bore of a hollow shaft', 'Empty for a solid one'],
  ['housingWallMm', 'Housing wall', 'Round the bore; empty where it is thick'],
];
const temperatures: [Name, string][] = [
  ['shaftC', 'Shaft'],
  ['innerRingC', 'Inner ring'],
  ['outerRingC', 'Outer ring'],
  ['housingC', 'Housing'],
];

/** One bearing of a machine: what it is, how it is loaded, how warm it runs. */
export function PositionForm({
  position,
  shafts,
  saving,
  failure,
  onSave,
}: {
  position?: CreateBearingPositionRequest;
  /** The shafts that the machine has so far; the fastest way to the right ratio. */
  shafts: readonly Shaft[];
  saving: boolean;
  failure: ApiError | null;
  onSave: (position: CreateBearingPositionRequest) => void;
}) {
  const form = useForm({
    resolver: zodResolver(createBearingPositionRequest),
    defaultValues: position ?? { ...fresh, code: '', name: '' },
  });
  const { register, formState, watch } = form;
  const [kind, seatForm] = watch(['kind', 'shaftSeatForm']);
  const isRolling = kind !== 'plain';
  const errors: FieldErrors = formState.errors;
  const error = (name: Name) => faultAt(name, errors, failure);
  const send = form.handleSubmit(onSave);
  const choiceField = ([name, label, words]: (typeof choices)[number]) => (
    <Field key={name} id={name} label={label} optional error={error(name)}>
      <Select
        placeholder="Not known"
        options={optionsOf(words)}
        {...register(name, asTextOrNull)}
      />
    </Field>
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
        <Field id="code" label="Short name" hint="e.g. M-DE" error={error('code')}>
          <TextInput {...register('code')} />
        </Field>
        <Field id="name" label="Name" hint="e.g. Motor, drive end" error={error('name')}>
          <TextInput {...register('name')} />
        </Field>
        <Field
          id="sequence"
          label="Place along the train"
          hint="From the driver’s free end"
          error={error('sequence')}
        >
          <NumberInput whole {...register('sequence', asNumber)} />
        </Field>
        <Field id="kind" label="Bearing" error={error('kind')}>
          <Select options={kindOptions} {...register('kind')} />
        </Field>
        <Field
          id="shaftRatio"
          label="Shaft speed ratio"
          hint={`Its shaft’s speed over the machine’s told speed. ${shaftsInWords(shafts)}`}
          error={error('shaftRatio')}
        >
          <NumberInput {...register('shaftRatio', asNumber)} />
        </Field>
      </div>
      {isRolling ? (
        <>
          <div className="grid gap-4 phone:grid-cols-3">
            <Field
              id="designation"
              label="Designation"
              hint="Basic designation, e.g. 6312"
              optional
              error={error('designation')}
            >
              <TextInput {...register('designation', asTextOrNull)} />
            </Field>
            {sizes.map(([name, label]) => (
              <Field key={name} id={name} label={label} optional error={error(name)}>
                <NumberInput unit="mm" {...register(name, asNumber)} />
              </Field>
            ))}
            {choices.map(choiceField)}
            <Field id="radialLoadN" label="Radial load" optional error={error('radialLoadN')}>
              <NumberInput unit="N" {...register('radialLoadN', asNumber)} />
            </Field>
          </div>
          <fieldset className="grid gap-4 phone:grid-cols-3">
            <legend className="lettering mb-2 text-ink-faint">Shaft and housing</legend>
            <Field id="shaftSeatForm" label="Shaft seat" error={error('shaftSeatForm')}>
              <Select options={optionsOf(shaftSeatForms)} {...register('shaftSeatForm')} />
            </Field>
            {seatForm !== 'cylindrical' && (
              <Field id="seatTaper" label="Taper" optional error={error('seatTaper')}>
                <Select
                  placeholder="Not known, taken as 1:12"
                  options={optionsOf(seatTapers)}
                  {...register('seatTaper', asTextOrNull)}
                />
              </Field>
            )}
            {materials.map(choiceField)}
            {walls.map(([name, label, hint]) => (
              <Field key={name} id={name} label={label} hint={hint} optional error={error(name)}>
                <NumberInput unit="mm" {...register(name, asNumber)} />
              </Field>
            ))}
          </fieldset>
          <fieldset className="grid gap-4 phone:grid-cols-4">
            <legend className="lettering mb-2 text-ink-faint">Running temperatures</legend>
            {temperatures.map(([name, label]) => (
              <Field key={name} id={name} label={label} optional error={error(name)}>
                <NumberInput unit="°C" {...register(name, asNumber)} />
              </Field>
            ))}
          </fieldset>
          <div className="flex flex-wrap gap-x-8 gap-y-2">
            <Checkbox label="The housing is split" {...register('splitHousing')} />
            <Checkbox
              label="Floating bearing"
              hint="Its stationary ring must stay free to move"
              {...register('mustSlide')}
            />
            <Checkbox
              label="Heat comes through the shaft"
              hint="The shaft warms the bearing, so the outer ring needs room"
              {...register('heatThroughShaft')}
            />
          </div>
        </>
      ) : (
        <p className="max-w-prose text-sm text-ink-soft">
          A plain bearing carries measuring points and has no seats: no fits are recorded for it.
        </p>
      )}
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Save bearing position
        </Button>
      </div>
    </form>
  );
}

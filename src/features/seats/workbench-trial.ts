import { assessSeats } from '#shared/fits/assess-seats.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import {
  bearingClasses,
  bearingTypes,
  clearanceGroups,
  housingMaterials,
  loadLevels,
  ringLoads,
  shaftMaterials,
  type PositionAssessment,
} from '#shared/fits/fit-types.ts';
import { readPositionFit } from '#shared/fits/read-position-fit.ts';
import { resolvePosition } from '#shared/fits/resolve-position.ts';

type FieldKind = 'text' | 'number' | 'diameter' | 'flag' | { choices: readonly string[] };

export interface WorkbenchField {
  /** Name in the address, and key of the calculation where `path` is absent. */
  name: string;
  label: string;
  kind: FieldKind;
  unit?: string;
  hint?: string;
  /** Key of the calculation, with a dot inside an object. */
  path?: string;
}

/** What can be tried, in the order of the page. */
export const workbenchGroups: readonly { title: string; fields: readonly WorkbenchField[] }[] = [
  {
    title: 'Bearing',
    fields: [
      { name: 'designation', label: 'Designation', kind: 'text', hint: 'e.g. 6312; or its sizes' },
      { name: 'd', label: 'Bore d', kind: 'number', unit: 'mm' },
      { name: 'D', label: 'Outside diameter D', kind: 'number', unit: 'mm' },
      { name: 'B', label: 'Width B', kind: 'number', unit: 'mm' },
      { name: 'bearingType', label: 'Type', kind: { choices: bearingTypes } },
      { name: 'bearingClass', label: 'Tolerance class', kind: { choices: bearingClasses } },
      { name: 'clearanceGroup', label: 'Clearance group', kind: { choices: clearanceGroups } },
      { name: 'capped', label: 'Sealed, shielded or greased', kind: 'flag' },
    ],
  },
  {
    title: 'Seats',
    fields: [
      { name: 'shaftClass', label: 'Shaft class', kind: 'text', hint: 'e.g. k5' },
      { name: 'housingClass', label: 'Housing class', kind: 'text', hint: 'e.g. H7' },
      { name: 'shaftMeasuredMm', label: 'Shaft, measured', kind: 'diameter' },
      { name: 'boreMeasuredMm', label: 'Bore of the inner ring, measured', kind: 'diameter' },
      { name: 'outsideMeasuredMm', label: 'Outer ring, measured', kind: 'diameter' },
      { name: 'housingMeasuredMm', label: 'Housing bore, measured', kind: 'diameter' },
      { name: 'shaftMaterial', label: 'Shaft material', kind: { choices: shaftMaterials } },
      { name: 'shaftBoreMm', label: 'Bore of a hollow shaft', kind: 'number', unit: 'mm' },
      { name: 'housingMaterial', label: 'Housing material', kind: { choices: housingMaterials } },
      { name: 'splitHousing', label: 'Split housing', kind: 'flag' },
    ],
  },
  {
    title: 'Load',
    fields: [
      { name: 'innerLoad', label: 'Load on the inner ring', kind: { choices: ringLoads } },
      { name: 'outerLoad', label: 'Load on the outer ring', kind: { choices: ringLoads } },
      { name: 'loadLevel', label: 'Load', kind: { choices: loadLevels } },
      { name: 'radialLoadN', label: 'Radial load', kind: 'number', unit: 'N' },
      { name: 'staticRatingN', label: 'Static load rating', kind: 'number', unit: 'N' },
      { name: 'mustSlide', label: 'One ring must slide (floating bearing)', kind: 'flag' },
      { name: 'heatThroughShaft', label: 'Heat comes through the shaft', kind: 'flag' },
    ],
  },
  {
    title: 'Running temperatures',
    fields: [
      { name: 'shaftC', path: 'temperaturesC.shaft', label: 'Shaft', kind: 'number', unit: '°C' },
      {
        name: 'innerRingC',
        path: 'temperaturesC.innerRing',
        label: 'Inner ring',
        kind: 'number',
        unit: '°C',
      },
      {
        name: 'outerRingC',
        path: 'temperaturesC.outerRing',
        label: 'Outer ring',
        kind: 'number',
        unit: '°C',
      },
      {
        name: 'housingC',
        path: 'temperaturesC.housing',
        label: 'Housing',
        kind: 'number',
        unit: '°C',
      },
    ],
  },
];

export const workbenchFields = workbenchGroups.flatMap(({ fields }) => fields);
/** Measured diameters are typed in this unit. */
export const unitParameter = 'unit';

export interface Trial {
  /** Null where nothing was typed, or a fault stands in the way. */
  assessment: PositionAssessment | null;
  /** What is wrong, by field name; '' for what belongs to no field. */
  faults: Readonly<Record<string, string>>;
  /** Nominal sizes of the two seats, mm; null where none is known. */
  nominalMm: { shaft: number | null; housing: number | null };
  isEmpty: boolean;
}

const noSizes = { shaft: null, housing: null };

const millimetresPerInch = 25.4;

/** The value of a field for the calculation; a fault where it can't be one. */
function valueOf(
  field: WorkbenchField,
  typed: string,
  inInches: boolean,
): { value: unknown } | { fault: string } {
  const { kind } = field;
  if (kind === 'text') return { value: typed };
  if (kind === 'flag') return { value: typed === '1' };
  if (typeof kind === 'object') {
    return kind.choices.includes(typed)
      ? { value: typed }
      : { fault: `“${typed}” is not one of ${kind.choices.join(', ')}.` };
  }
  const number = Number(typed.replace(',', '.'));
  if (!Number.isFinite(number)) return { fault: `“${typed}” is not a number.` };
  // To a nanometre: finer than any micrometer.
  return {
    value:
      kind === 'diameter' && inInches
        ? Math.round(number * millimetresPerInch * 1e6) / 1e6
        : number,
  };
}

function put(input: Record<string, unknown>, path: string, value: unknown): void {
  const [head = '', tail] = path.split('.');
  if (tail === undefined) input[head] = value;
  else input[head] = { ...(input[head] as object | undefined), [tail]: value };
}

/** Reads a trial from the address and works it out; what can't be read is named at its field. */
export function readTrial(parameters: URLSearchParams): Trial {
  const input: Record<string, unknown> = {};
  const faults: Record<string, string> = {};
  const inInches = parameters.get(unitParameter) === 'in';
  let isEmpty = true;
  for (const field of workbenchFields) {
    const typed = parameters.get(field.name)?.trim() ?? '';
    if (typed === '' || (field.kind === 'flag' && typed !== '1')) continue;
    isEmpty = false;
    const read = valueOf(field, typed, inInches);
    if ('fault' in read) faults[field.name] = read.fault;
    else put(input, field.path ?? field.name, read.value);
  }
  const known = new Set([...workbenchFields.map(({ name }) => name), unitParameter]);
  const strange = [...parameters.keys()].filter((name) => !known.has(name));
  if (strange.length > 0) {
    faults[''] = `The address holds what this page does not know: ${strange.join(', ')}.`;
  }
  if (isEmpty) return { assessment: null, faults, nominalMm: noSizes, isEmpty };
  try {
    // A field that can't be read is left out; the rest still says what it can.
    const position = readPositionFit(input);
    const { d, D } = resolvePosition(position);
    const nominalMm = { shaft: d ?? null, housing: D ?? null };
    return { assessment: assessSeats(position), faults, nominalMm, isEmpty };
  } catch (error) {
    if (!(error instanceof FitInputError)) throw error;
    const at = workbenchFields.find(({ name, path }) => (path ?? name) === error.field);
    const place = at?.name ?? (error.field === '' ? '' : 'designation');
    return {
      assessment: null,
      faults: { ...faults, [place]: error.message },
      nominalMm: noSizes,
      isEmpty,
    };
  }
}

/** The typed classes and diameters as the fit records of the two seats have them. */
export function copiedSeats(parameters: URLSearchParams) {
  const inInches = parameters.get(unitParameter) === 'in';
  const text = (name: string) => parameters.get(name)?.trim() || null;
  const diameter = (name: string) => {
    const typed = Number((text(name) ?? '').replace(',', '.'));
    // The form holds what is typed, in the unit it is typed in.
    return text(name) === null || !Number.isFinite(typed) ? null : typed;
  };
  const of = (classField: string, seat: string, ring: string) => ({
    toleranceClass: text(classField),
    seatMeasuredMm: diameter(seat),
    ringMeasuredMm: diameter(ring),
    diameterUnit: inInches ? ('in' as const) : ('mm' as const),
    source:
      diameter(seat) === null && diameter(ring) === null
        ? ('drawing' as const)
        : ('mounting' as const),
  });
  return {
    shaft: of('shaftClass', 'shaftMeasuredMm', 'boreMeasuredMm'),
    housing: of('housingClass', 'housingMeasuredMm', 'outsideMeasuredMm'),
  };
}

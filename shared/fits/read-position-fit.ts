import { FitInputError } from './fit-input-error.ts';
import {
  bearingClasses,
  bearingTypes,
  clearanceGroups,
  housingMaterials,
  loadLevels,
  ringLoads,
  shaftMaterials,
  type PositionFit,
} from './fit-types.ts';

type Kind = 'number' | 'text' | 'boolean' | readonly string[] | Readonly<Record<string, 'number'>>;

/** The keys of the command line, with what each may hold. */
const keys: Readonly<Record<string, Kind>> = {
  designation: 'text',
  d: 'number',
  D: 'number',
  B: 'number',
  bearingClass: bearingClasses,
  bearingType: bearingTypes,
  clearanceGroup: clearanceGroups,
  capped: 'boolean',
  shaftClass: 'text',
  housingClass: 'text',
  shaftMeasuredMm: 'number',
  boreMeasuredMm: 'number',
  outsideMeasuredMm: 'number',
  housingMeasuredMm: 'number',
  temperaturesC: { shaft: 'number', innerRing: 'number', outerRing: 'number', housing: 'number' },
  innerWarmerThanOuterK: 'number',
  shaftMaterial: shaftMaterials,
  shaftBoreMm: 'number',
  housingMaterial: housingMaterials,
  alphaPerK: { shaft: 'number', ring: 'number', housing: 'number' },
  innerLoad: ringLoads,
  outerLoad: ringLoads,
  loadLevel: loadLevels,
  pOverC: 'number',
  splitHousing: 'boolean',
  heatThroughShaft: 'boolean',
  mustSlide: 'boolean',
  radialLoadN: 'number',
  staticRatingN: 'number',
  warmerThanSurroundingsK: 'number',
  smoothingUm: 'number',
  slideOnClearanceUm: 'number',
  handlingMarginK: 'number',
  spanMm: 'number',
};

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function wrongType(field: string, expected: string, value: unknown): FitInputError {
  return new FitInputError(
    'wrong_type',
    field,
    `${field} must be ${expected}; got ${JSON.stringify(value)}.`,
  );
}

function readChoice(field: string, choices: readonly string[], value: unknown): string {
  if (typeof value === 'string' && choices.includes(value)) return value;
  throw new FitInputError(
    field === 'clearanceGroup' ? 'unknown_clearance_group' : 'unknown_value',
    field,
    `${field} must be one of ${choices.join(', ')}; got ${JSON.stringify(value)}.`,
  );
}

function readPart(
  field: string,
  parts: Readonly<Record<string, 'number'>>,
  value: unknown,
): unknown {
  if (!isObject(value)) throw wrongType(field, 'an object', value);
  return readKeys(value, parts, `${field}.`);
}

function readValue(field: string, kind: Kind, value: unknown): unknown {
  if (kind === 'number') {
    if (typeof value !== 'number') throw wrongType(field, 'a number', value);
    return value;
  }
  if (kind === 'boolean') {
    if (typeof value !== 'boolean') throw wrongType(field, 'true or false', value);
    return value;
  }
  if (kind === 'text') {
    if (typeof value !== 'string') throw wrongType(field, 'text', value);
    return value;
  }
  return isList(kind) ? readChoice(field, kind, value) : readPart(field, kind, value);
}

function isList(
  kind: readonly string[] | Readonly<Record<string, 'number'>>,
): kind is readonly string[] {
  return Array.isArray(kind);
}

function readKeys(
  object: Readonly<Record<string, unknown>>,
  allowed: Readonly<Record<string, Kind>>,
  prefix: string,
): Record<string, unknown> {
  const result: Record<string, unknown> = {};
  for (const [key, value] of Object.entries(object)) {
    const field = prefix + key;
    const kind = Object.hasOwn(allowed, key) ? allowed[key] : undefined;
    if (kind === undefined) {
      throw new FitInputError(
        'unknown_key',
        field,
        `"${field}" is not known; expected one of ${Object.keys(allowed).join(', ')}.`,
      );
    }
    // null says the same as leaving the key out: not known.
    if (value !== null) result[key] = readValue(field, kind, value);
  }
  return result;
}

/**
 * Reads one parsed JSON value as the input of the fit calculation: known keys only, each of its kind.
 * Numbers are checked for their range by `assessSeats`.
 *
 * @throws {FitInputError} `not_an_object`, `unknown_key`, `wrong_type`, `unknown_value`,
 *   `unknown_clearance_group`
 */
export function readPositionFit(value: unknown): PositionFit {
  if (!isObject(value)) {
    throw new FitInputError('not_an_object', '', 'Each line must hold one JSON object.');
  }
  return readKeys(value, keys, '');
}

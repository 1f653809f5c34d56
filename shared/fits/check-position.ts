import { FitInputError } from './fit-input-error.ts';
import type { PositionFit } from './fit-types.ts';

const absoluteZeroC = -273.15;

function finite(value: number | undefined, field: string): number | undefined {
  if (value !== undefined && !Number.isFinite(value)) {
    throw new FitInputError('not_finite', field, `${field} must be a finite number.`);
  }
  return value;
}

function notNegative(value: number | undefined, field: string): void {
  if ((finite(value, field) ?? 0) < 0) {
    throw new FitInputError('negative', field, `${field} must not be negative; got ${value}.`);
  }
}

function positive(value: number | undefined, field: string): void {
  notNegative(value, field);
  if (value === 0) {
    throw new FitInputError('out_of_range', field, `${field} must be greater than 0.`);
  }
}

function temperature(value: number | undefined, field: string): void {
  if ((finite(value, field) ?? 0) < absoluteZeroC) {
    throw new FitInputError(
      'below_absolute_zero',
      field,
      `${value} °C is below absolute zero (${absoluteZeroC} °C).`,
    );
  }
}

/** No engineering material expands more than 100e-6 a kelvin: 12 was meant as 12e-6. */
const greatestAlphaPerK = 100e-6;

function expansion(value: number | undefined, field: string): void {
  positive(value, field);
  if (value !== undefined && value > greatestAlphaPerK) {
    throw new FitInputError('out_of_range', field, `${field} is in 1/K, e.g. 12e-6; got ${value}.`);
  }
}

function size(value: number | undefined, field: string): void {
  if (finite(value, field) === undefined) return;
  if ((value ?? 0) <= 0 || (value ?? 0) > 500) {
    throw new FitInputError(
      'size_out_of_range',
      field,
      `${value} mm is outside the tables, which cover nominal sizes above 0 up to 500 mm.`,
    );
  }
}

/**
 * Checks the numbers of a position one by one: finite, inside the tables, physically possible.
 *
 * @throws {FitInputError} naming the field
 */
export function checkPositionNumbers(position: PositionFit): void {
  size(position.d, 'd');
  size(position.D, 'D');
  positive(position.B, 'B');
  for (const key of [
    'shaftMeasuredMm',
    'boreMeasuredMm',
    'outsideMeasuredMm',
    'housingMeasuredMm',
  ] as const) {
    positive(position[key], key);
  }
  for (const key of ['shaft', 'innerRing', 'outerRing', 'housing'] as const) {
    temperature(position.temperaturesC?.[key], `temperaturesC.${key}`);
  }
  for (const key of ['shaft', 'ring', 'housing'] as const) {
    expansion(position.alphaPerK?.[key], `alphaPerK.${key}`);
  }
  for (const key of ['shaft', 'bore', 'outside', 'housing'] as const) {
    notNegative(position.uncertaintyUm?.[key], `uncertaintyUm.${key}`);
  }
  finite(position.innerWarmerThanOuterK, 'innerWarmerThanOuterK');
  finite(position.warmerThanSurroundingsK, 'warmerThanSurroundingsK');
  notNegative(position.shaftBoreMm, 'shaftBoreMm');
  notNegative(position.pOverC, 'pOverC');
  notNegative(position.radialLoadN, 'radialLoadN');
  positive(position.staticRatingN, 'staticRatingN');
  notNegative(position.smoothingUm, 'smoothingUm');
  notNegative(position.slideOnClearanceUm, 'slideOnClearanceUm');
  notNegative(position.handlingMarginK, 'handlingMarginK');
  positive(position.spanMm, 'spanMm');
  notNegative(position.speedRpm, 'speedRpm');
  positive(position.housingOutsideMm, 'housingOutsideMm');
  for (const key of ['shaftHistory', 'housingHistory'] as const) {
    notNegative(position[key]?.yearsInService, `${key}.yearsInService`);
    notNegative(position[key]?.earlierFindings, `${key}.earlierFindings`);
  }
  notNegative(position.shaftTapered?.driveUpMm, 'shaftTapered.driveUpMm');
  notNegative(position.shaftTapered?.clearanceReductionUm, 'shaftTapered.clearanceReductionUm');
}

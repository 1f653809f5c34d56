import { quantityOfUnit, type Unit } from './quantity.ts';

/** Standard acceleration of free fall, m/s², exact (3rd CGPM 1901; ISO 80000-3:2019). */
export const standardGravityMPerS2 = 9.80665;

/** Length of one inch, mm, exact (international yard and pound agreement, 1959). */
export const inchMm = 25.4;

/** One unit in the metric unit of its quantity (m/s², mm/s, µm); every factor is exact. */
const inMetric: Readonly<Record<Unit, number>> = {
  g: standardGravityMPerS2,
  'm/s²': 1,
  'mm/s': 1,
  'in/s': inchMm,
  µm: 1,
  // A mil is a thousandth of an inch.
  mil: inchMm,
};

/**
 * Expresses a value in another unit of the same quantity. Integration between quantities depends on
 * frequency and belongs to the signal.
 *
 * @param value - any number; NaN and infinities stay what they are
 * @returns the value in `to`; relative error at most 2^-52 (two roundings; below 1e-307 less exact), none where `from` is `to`
 * @throws {RangeError} where the units measure different quantities
 *
 * @example
 * convertUnit(1, 'in/s', 'mm/s') // => 25.4
 */
export function convertUnit(value: number, from: Unit, to: Unit): number {
  if (from === to) return value;
  if (quantityOfUnit[from] !== quantityOfUnit[to]) {
    throw new RangeError(`${from} measures ${quantityOfUnit[from]}, ${to} ${quantityOfUnit[to]}.`);
  }
  return (value * inMetric[from]) / inMetric[to];
}

/** @returns the units of the same quantity as `unit`, itself included, metric first */
export function unitsLike(unit: Unit): Unit[] {
  const alike = (Object.keys(inMetric) as Unit[]).filter(
    (other) => quantityOfUnit[other] === quantityOfUnit[unit],
  );
  return alike.sort((a, b) => inMetric[a] - inMetric[b]);
}

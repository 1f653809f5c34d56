import type { SeatName } from './fit-types.ts';

/** A seat as it was measured on one day. */
export interface MeasuredSeat {
  /** Day of the measurement, ms since 1970. */
  atMs: number;
  diameterMm: number;
  /** Standard uncertainty of the mean diameter, µm. */
  standardUncertaintyUm: number;
}

/** What two measurements of one seat say of the time between them. */
export interface MeasuredWear {
  /** Loss of interference, µm: positive where the seat has worn, negative where it came back tighter. */
  lossUm: number;
  /** Expanded uncertainty of the loss (k = 2, about 95 %). */
  expandedUncertaintyUm: number;
  /** Loss a year and its expanded uncertainty; absent for a span too short to speak of years. */
  perYearUm?: number;
  perYearUncertaintyUm?: number;
  /** Whether the loss, or gain, is larger than its uncertainty. */
  isSignificant: boolean;
}

const msPerYear = 365.25 * 24 * 3600 * 1000;
/** Below this a rate a year is the uncertainty blown up (project's choice, no source). */
const leastYears = 1 / 12;

/**
 * Wear of a seat between two measurements of it: a shaft gets smaller, a housing bore larger. The two
 * uncertainties are taken as independent, U = 2·√(u₁² + u₂²) (GUM).
 *
 * @param from - the earlier measurement; uncertainty ≥ 0
 * @param to - the later one
 * @throws {RangeError} where `to` is earlier than `from` or a number is not finite
 *
 * @example
 * // Shaft 60.010 mm, two years later 60.000 mm: 10 µm lost, 5 µm a year.
 */
export function measuredWear(seat: SeatName, from: MeasuredSeat, to: MeasuredSeat): MeasuredWear {
  const years = (to.atMs - from.atMs) / msPerYear;
  const growthUm = (to.diameterMm - from.diameterMm) * 1000;
  if (!(years >= 0) || !Number.isFinite(growthUm)) {
    throw new RangeError('Wear needs two finite diameters, the earlier one first.');
  }
  // Rounded to a nanometre: the difference of two doubles carries bits nobody measured.
  const lossUm = Math.round((seat === 'shaft' ? 0 - growthUm : growthUm) * 1000) / 1000;
  const expandedUncertaintyUm =
    2 * Math.hypot(from.standardUncertaintyUm, to.standardUncertaintyUm);
  return {
    lossUm,
    expandedUncertaintyUm,
    ...(years < leastYears
      ? {}
      : { perYearUm: lossUm / years, perYearUncertaintyUm: expandedUncertaintyUm / years }),
    isSignificant: Math.abs(lossUm) > expandedUncertaintyUm,
  };
}

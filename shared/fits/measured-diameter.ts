import { FitInputError } from './fit-input-error.ts';

const mmPerInch = 25.4;
/** A worn seat is off by tenths of a millimetre, never by 1 % of its size and half a millimetre. */
const plausibleShare = 0.01;
const plausibleMm = 0.5;

function isNear(value: number, target: number): boolean {
  return Math.abs(value / target - 1) < 0.03;
}

/**
 * Checks a diameter someone measured against the nominal size, so that a slip of unit is questioned
 * before it is taken for wear.
 *
 * @returns deviation from the nominal size, µm
 * @throws {FitInputError} `not_finite`; `measured_in_inches` (about nominal / 25.4),
 *   `measured_in_millimetres` (about nominal × 25.4: millimetres given as inches), `factor_1000`
 *   (about 1000 times or a thousandth of the nominal), `far_from_nominal` (off by more than 1 % and
 *   0.5 mm)
 *
 * @example
 * measuredDeviationUm(60.5, 60, 'shaftMeasuredMm') // => 500
 */
export function measuredDeviationUm(measuredMm: number, nominalMm: number, field: string): number {
  if (!Number.isFinite(measuredMm)) {
    throw new FitInputError('not_finite', field, 'The measured diameter is not a number.');
  }
  if (isNear(measuredMm * mmPerInch, nominalMm)) {
    throw new FitInputError(
      'measured_in_inches',
      field,
      `${measuredMm} looks like inches (${(measuredMm * mmPerInch).toFixed(3)} mm); the nominal size is ${nominalMm} mm.`,
    );
  }
  if (isNear(measuredMm, nominalMm * mmPerInch)) {
    throw new FitInputError(
      'measured_in_millimetres',
      field,
      `${Number((measuredMm / mmPerInch).toFixed(4))} looks like millimetres taken for inches; the nominal size is ${nominalMm} mm.`,
    );
  }
  if (isNear(measuredMm, nominalMm * 1000) || isNear(measuredMm * 1000, nominalMm)) {
    throw new FitInputError(
      'factor_1000',
      field,
      `${measuredMm} mm is off by a factor of 1000; the nominal size is ${nominalMm} mm.`,
    );
  }
  const offMm = Math.abs(measuredMm - nominalMm);
  if (offMm > plausibleMm && offMm > plausibleShare * nominalMm) {
    throw new FitInputError(
      'far_from_nominal',
      field,
      `${measuredMm} mm is ${offMm.toFixed(3)} mm off the nominal ${nominalMm} mm; check size, unit and reading.`,
    );
  }
  // Rounded to a nanometre: the difference of two doubles carries bits nobody measured.
  return Math.round((measuredMm - nominalMm) * 1e6) / 1e3;
}

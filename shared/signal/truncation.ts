import type { Clipping } from './clipping.ts';
import type { Truncation } from './screening-types.ts';

/** Near the extreme: within this share of the half range. Narrow, since a second order also rounds a crest. */
const nearShare = 0.03;
/** The same for marking the record, which carries more than the average. */
const markShare = 0.1;
/** Share of a turn that a sine spends there: arccos(0.97)/π. */
const sineShare = Math.acos(1 - nearShare) / Math.PI;
/** A side counts as truncated where it dwells this much longer than a sine. */
const dwellFactor = 1.6;
const rangesMax = 400;

/**
 * How long the averaged revolution dwells near its extremes compared with a sine: a joint that hits
 * a stop flattens the displacement there.
 *
 * @param displacementUm - one averaged turn
 * @param values - the record, for marking where it is near the extreme
 */
export function findTruncation(
  displacementUm: Float64Array,
  values: Float64Array,
  clipping: Clipping,
): Truncation {
  const high = displacementUm.reduce((most, value) => Math.max(most, value), -Infinity);
  const low = displacementUm.reduce((least, value) => Math.min(least, value), Infinity);
  const half = (high - low) / 2;
  const share = (near: (value: number) => boolean) =>
    displacementUm.length === 0 ? 0 : displacementUm.filter(near).length / displacementUm.length;
  const upper = half > 0 ? share((value) => value > high - nearShare * half) : 0;
  const lower = half > 0 ? share((value) => value < low + nearShare * half) : 0;
  const instrument = clipping.upper || clipping.lower;
  const flat = (dwell: number) => dwell > dwellFactor * sineShare;
  const side = instrument
    ? sideOf(clipping.upper, clipping.lower)
    : sideOf(flat(upper), flat(lower));
  return {
    side,
    share: instrument ? clipping.share : Math.max(upper, lower),
    expectedShare: instrument ? 0 : sineShare,
    instrument,
    ranges: side === 'none' ? [] : extremeRanges(values, side),
  };
}

const sideOf = (upper: boolean, lower: boolean): Truncation['side'] =>
  upper && lower ? 'both' : upper ? 'upper' : lower ? 'lower' : 'none';

function extremeRanges(values: Float64Array, side: Truncation['side']): [number, number][] {
  let [low, high] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const reach = (markShare * (high - low)) / 2;
  const ranges: [number, number][] = [];
  let start = -1;
  for (let i = 0; i <= values.length && ranges.length < rangesMax; i += 1) {
    const value = values[i];
    const near =
      value !== undefined &&
      ((side !== 'lower' && value > high - reach) || (side !== 'upper' && value < low + reach));
    if (near && start < 0) start = i;
    if (!near && start >= 0) {
      ranges.push([start, i]);
      start = -1;
    }
  }
  return ranges;
}

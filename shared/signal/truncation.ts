import type { AveragedRevolution } from './averaged-revolution.ts';
import type { Clipping } from './clipping.ts';
import { realFft, realFromLines } from './fft.ts';
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

/** Orders that make the shape a truncated one is held against: what 1× and 2× round is not truncated. */
const shapeOrders = 2;

/**
 * How long the averaged revolution dwells near its extremes, in displacement and in velocity,
 * compared with its own first two orders, and at least with a sine: a joint that hits a stop flattens
 * the motion there.
 *
 * @param revolution - one averaged turn
 * @param values - the record, for marking where it is near the extreme
 */
export function findTruncation(
  revolution: Pick<AveragedRevolution, 'displacementUm' | 'velocityMmPerS'>,
  values: Float64Array,
  clipping: Clipping,
): Truncation {
  if (clipping.upper || clipping.lower) {
    const side = sideOf(clipping.upper, clipping.lower);
    return {
      side,
      share: clipping.share,
      expectedShare: 0,
      instrument: true,
      ranges: extremeRanges(values, side),
    };
  }
  const turns = [revolution.displacementUm, revolution.velocityMmPerS].map(dwellsOf);
  const flat = ({ share, expected }: Dwell) => share > dwellFactor * expected;
  const held = turns.find(({ upper, lower }) => flat(upper) || flat(lower)) ?? turns[0]!;
  const side = sideOf(flat(held.upper), flat(held.lower));
  const told =
    side === 'upper' || (side !== 'lower' && held.upper.share > held.lower.share)
      ? held.upper
      : held.lower;
  return {
    side,
    share: told.share,
    expectedShare: told.expected,
    instrument: false,
    ranges: side === 'none' ? [] : extremeRanges(values, side),
  };
}

interface Dwell {
  share: number;
  expected: number;
}

function dwellsOf(turn: Float64Array): { upper: Dwell; lower: Dwell } {
  const lines = realFft(turn).map((value) => value / Math.max(1, turn.length));
  const shape =
    turn.length < 4 ? turn : realFromLines(lines.subarray(0, 2 * (shapeOrders + 1)), turn.length);
  const [is, would] = [nearExtremes(turn), nearExtremes(shape)];
  return {
    upper: { share: is.upper, expected: Math.max(sineShare, would.upper) },
    lower: { share: is.lower, expected: Math.max(sineShare, would.lower) },
  };
}

/** Share of the turn near the highest and near the lowest value. */
function nearExtremes(turn: Float64Array): { upper: number; lower: number } {
  let [high, low] = [-Infinity, Infinity];
  for (const value of turn) {
    if (value > high) high = value;
    if (value < low) low = value;
  }
  const reach = (nearShare * (high - low)) / 2;
  if (!(reach > 0)) return { upper: 0, lower: 0 };
  const share = (near: (value: number) => boolean) => turn.filter(near).length / turn.length;
  return {
    upper: share((value) => value > high - reach),
    lower: share((value) => value < low + reach),
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

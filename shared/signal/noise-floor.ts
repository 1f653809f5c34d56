import { fisherTail, gammaTail } from './tail-chances.ts';

/** Median of a chi-square variable with two degrees of freedom over its mean: ln 2. */
const medianOverMean = Math.LN2;
const linesForMedian = 100;

/**
 * The k-th smallest of the first `count` values (Hoare's selection). The values change places.
 *
 * @param k - from 0, below `count`
 */
export function selectSmallest(values: Float64Array, count: number, k: number): number {
  let [low, high] = [0, count - 1];
  while (low < high) {
    const pivot = values[(low + high) >> 1] ?? 0;
    let [i, j] = [low, high];
    while (i <= j) {
      while ((values[i] as number) < pivot) i += 1;
      while ((values[j] as number) > pivot) j -= 1;
      if (i <= j) {
        const swap = values[i] ?? 0;
        values[i] = values[j] ?? 0;
        values[j] = swap;
        i += 1;
        j -= 1;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return values[k] ?? 0;
}

/** Median of the first `count` values; 0 where there are none. The values change places. */
export function medianInPlace(values: Float64Array, count: number): number {
  return count === 0 ? 0 : selectSmallest(values, count, count >> 1);
}

/**
 * Local noise power of a single-average spectrum from a running median, which lines do not lift as
 * long as they fill less than half of the window. For noise of a smooth colour the power of one
 * Hann line is exponentially distributed, whose median is ln 2 of its mean. The window stays
 * symmetric at the edges: the median of a slope is then its value in the middle.
 *
 * @param power - power of each line, any unit
 * @param halfWidth - lines to either side, at least 8
 * @returns mean noise power at each line, in the same unit; never below the smallest positive double
 */
export function noiseFloor(power: Float64Array, halfWidth: number): Float64Array {
  const count = power.length;
  const floor = new Float64Array(count);
  const window = new Float64Array(2 * halfWidth + 1);
  const floorAt = (centre: number) => {
    const reach = Math.max(4, Math.min(halfWidth, centre - 1, count - 1 - centre));
    const from = Math.max(Math.min(1, count - 1), centre - reach);
    const to = Math.min(count, centre + reach + 1);
    // A hundred lines tell a median well enough; neighbours through a window are much alike.
    const stride = Math.max(1, Math.floor((to - from) / linesForMedian));
    let taken = 0;
    for (let k = from; k < to; k += stride) window[taken++] = power[k] as number;
    return Math.max(medianInPlace(window, taken) / medianOverMean, Number.MIN_VALUE);
  };
  let left = 0;
  let leftFloor = floorAt(0);
  while (left < count - 1) {
    // Finer steps at the lower edge, where the floor is steepest.
    const right = Math.min(count - 1, left + Math.max(2, Math.min(halfWidth, left >> 2)));
    const rightFloor = floorAt(right);
    for (let i = left; i < right; i += 1) {
      floor[i] = leftFloor + ((rightFloor - leftFloor) * (i - left)) / (right - left);
    }
    [left, leftFloor] = [right, rightFloor];
  }
  if (count > 0) floor[count - 1] = leftFloor;
  return floor;
}

/**
 * Chance that noise alone gives at least this power in one of a few neighbouring lines. Averaging
 * `averages` independent spectra gives a gamma variable of that shape; the floor it is held against
 * is itself an estimate worth `floorAverages`, so the ratio is F-distributed with (2 averages,
 * 2 floorAverages) degrees of freedom.
 *
 * @param ratio - power over noise floor, >= 0
 * @param lines - independent lines looked at
 * @param averages - independent averages, >= 1
 * @param floorAverages - independent averages the floor is worth; Infinity for a known floor
 * @returns 0–1
 */
export function chanceOfLine(
  ratio: number,
  lines: number,
  averages = 1,
  floorAverages = Infinity,
): number {
  const one = Number.isFinite(floorAverages)
    ? fisherTail(ratio, averages, floorAverages)
    : gammaTail(averages, averages * ratio);
  if (one <= 0) return 0;
  return Math.min(1, Math.max(0, -Math.expm1(lines * Math.log1p(-Math.min(one, 1 - 1e-16)))));
}

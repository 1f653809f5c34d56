/** Median of a chi-square variable with two degrees of freedom over its mean: ln 2. */
const medianOverMean = Math.LN2;
const blockLines = 8;

/**
 * Local noise power of a single-average spectrum from a running median, which lines do not lift as
 * long as they fill less than half of the window. For noise of a smooth colour the power of one
 * Hann line is exponentially distributed, whose median is ln 2 of its mean.
 *
 * @param power - power of each line, any unit
 * @param halfWidth - lines to either side, at least 8
 * @returns mean noise power at each line, in the same unit; never below the smallest positive double
 */
export function noiseFloor(power: Float64Array, halfWidth: number): Float64Array {
  const count = power.length;
  const blocks = Math.max(1, Math.ceil(count / blockLines));
  const centres = new Float64Array(blocks);
  for (let block = 0; block < blocks; block += 1) {
    const centre = Math.min(count - 1, block * blockLines + blockLines / 2);
    const from = Math.max(0, Math.floor(centre - halfWidth));
    const to = Math.min(count, Math.ceil(centre + halfWidth + 1));
    const window = power.slice(from, to).sort();
    centres[block] = (window[window.length >> 1] ?? 0) / medianOverMean;
  }
  const floor = new Float64Array(count);
  for (let i = 0; i < count; i += 1) {
    const at = Math.max(0, Math.min(blocks - 1, (i - blockLines / 2) / blockLines));
    const left = Math.floor(at);
    const right = Math.min(blocks - 1, left + 1);
    const share = at - left;
    const value = (centres[left] ?? 0) * (1 - share) + (centres[right] ?? 0) * share;
    floor[i] = Math.max(value, Number.MIN_VALUE);
  }
  return floor;
}

/**
 * Chance that noise alone gives at least this power somewhere in a few neighbouring lines: each is
 * exponential with the floor as its mean (chi-square with two degrees of freedom).
 *
 * @param ratio - power over noise floor, >= 0
 * @param lines - independent lines looked at
 * @returns 0–1
 */
export function chanceOfLine(ratio: number, lines: number): number {
  return Math.min(1, -Math.expm1(lines * Math.log1p(-Math.exp(-Math.min(ratio, 700)))));
}

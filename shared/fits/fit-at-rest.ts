import type { LimitsUm, SpreadUm } from './fit-types.ts';

/**
 * Fit of two parts from their deviations: the inner part's (shaft, or outside diameter of the ring)
 * minus the outer part's (bore of the ring, or housing bore).
 *
 * @param innerUm - [lower, upper] deviation of the inner part from the common nominal size, µm
 * @param outerUm - [lower, upper] deviation of the outer part, µm
 * @returns least, mean and greatest interference, µm; clearance negative
 *
 * @example
 * fitAtRest([2, 13], [-12, 0]) // => { min: 2, mean: 13.5, max: 25 }
 */
export function fitAtRest(innerUm: LimitsUm, outerUm: LimitsUm): SpreadUm {
  const min = innerUm[0] - outerUm[1];
  const max = innerUm[1] - outerUm[0];
  return { min, mean: (min + max) / 2, max };
}

/**
 * Probable range of a fit: mean ± √((T₁/2)² + (T₂/2)²). Assumes that both sizes are normally
 * distributed about the middle of their tolerance, independent, and that each tolerance is six
 * standard deviations wide; then 99.7 % of pairs lie inside.
 *
 * @returns least and greatest probable interference, µm
 *
 * @example
 * probableRange([0, 6], [-8, 0]) // => { min: 2, max: 12 }
 */
export function probableRange(innerUm: LimitsUm, outerUm: LimitsUm): { min: number; max: number } {
  const { mean } = fitAtRest(innerUm, outerUm);
  const half = Math.hypot((innerUm[1] - innerUm[0]) / 2, (outerUm[1] - outerUm[0]) / 2);
  return { min: mean - half, max: mean + half };
}

import type { BearingType, ClearanceGroup, SpreadUm } from './fit-types.ts';
import { internalClearance } from './tables/internal-clearance.ts';

/**
 * Radial internal clearance of the unmounted bearing, ISO 5753-1:2009 (cylindrical bore).
 *
 * @param d - bore, mm
 * @returns least, mean and greatest clearance, µm, clearance positive here as the standard has it;
 *   `undefined` where size or group is not tabulated
 *
 * @example
 * unmountedClearance('ball', 60, 'C3') // => { min: 23, mean: 33, max: 43 }
 */
export function unmountedClearance(
  type: BearingType,
  d: number,
  group: ClearanceGroup,
): SpreadUm | undefined {
  const row = internalClearance[type].find((r) => d > r.above && d <= r.upTo);
  const range = row?.um[group];
  return range && { min: range[0], mean: (range[0] + range[1]) / 2, max: range[1] };
}

/** Interference that counts for the loss of clearance: after smoothing, never below 0. */
export function effectiveInterference(fit: SpreadUm, smoothingUm: number): SpreadUm {
  const left = (um: number) => Math.max(0, um - smoothingUm);
  return { min: left(fit.min), mean: left(fit.mean), max: left(fit.max) };
}

/**
 * Internal clearance left after mounting: unmounted less each ring's factor times its effective
 * interference; the least clearance pairs with the greatest interference.
 *
 * @param losses - per seat: factor from `innerLossFactor` / `outerLossFactor`, interference, µm
 * @returns least, mean and greatest clearance, µm; below 0 is preload
 */
export function mountedClearance(
  unmounted: SpreadUm,
  losses: readonly { factor: number; effective: SpreadUm }[],
): SpreadUm {
  const loss = (key: keyof SpreadUm) =>
    losses.reduce((sum, seat) => sum + seat.factor * seat.effective[key], 0);
  return {
    min: unmounted.min - loss('max'),
    mean: unmounted.mean - loss('mean'),
    max: unmounted.max - loss('min'),
  };
}

/**
 * Loss of clearance by an inner ring warmer than the outer: α·ΔT·Do (two sources).
 *
 * @param racewayMm - Do from `heatedRacewayMm`, mm
 * @returns loss, µm; negative (a gain) where the outer ring is the warmer
 *
 * @example
 * heatingLossUm(12.5e-6, 10, 100) // => 12.5
 */
export function heatingLossUm(alphaPerK: number, innerWarmerK: number, racewayMm: number): number {
  return 1000 * alphaPerK * innerWarmerK * racewayMm;
}

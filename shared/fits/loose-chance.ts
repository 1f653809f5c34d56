import { normalBelow, scaledTail } from './normal-distribution.ts';

/**
 * Chance that a seat runs with more clearance than it may: P(fit − wear < threshold).
 *
 * Model: the running fit is normal about its mean (drawing limits as six standard deviations, or the
 * uncertainty of the measured diameters); the wear since is exponential with a given mean and
 * independent of it. The sum has a closed form (exponentially modified normal distribution).
 *
 * @param fit - mean and standard deviation of the running fit, µm; deviation ≥ 0
 * @param meanWearUm - mean wear, µm; ≥ 0
 * @param thresholdUm - least interference that is still right, µm (negative: clearance by design)
 * @returns chance, 0–1
 *
 * @example
 * looseChance({ meanUm: 0, sigmaUm: 1 }, 0, 0) // => 0.5
 */
export function looseChance(
  fit: { meanUm: number; sigmaUm: number },
  meanWearUm: number,
  thresholdUm: number,
): number {
  const margin = fit.meanUm - thresholdUm;
  const s = fit.sigmaUm;
  const w = meanWearUm;
  if (s === 0 && w === 0) return margin < 0 ? 1 : 0;
  if (s === 0) return margin < 0 ? 1 : Math.exp(-margin / w);
  const atOnce = normalBelow(-margin / s);
  if (w === 0) return atOnce;
  const z = margin / s - s / w;
  // Far out the exponential overflows while the tail vanishes: the two are joined there.
  const later =
    z < -6
      ? Math.exp(-(margin ** 2) / (2 * s ** 2)) * scaledTail(z)
      : Math.exp(s ** 2 / (2 * w ** 2) - margin / w) * normalBelow(z);
  return Math.min(1, Math.max(0, atOnce + later));
}

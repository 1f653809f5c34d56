import type { SpreadUm } from './fit-types.ts';

/** Reference temperature of all diameters, ISO 1. */
export const referenceC = 20;

/**
 * Change of a fit by temperature: each part grows by its own expansion from 20 °C, and the inner
 * part's growth tightens the fit while the outer part's loosens it. Plain physics of free expansion.
 *
 * @param nominalMm - common diameter, mm
 * @param inner, outer - coefficient of expansion 1/K and temperature °C of the two parts
 * @returns change of interference, µm; negative where the fit loosens
 *
 * @example
 * expansionUm(100, { alphaPerK: 12e-6, temperatureC: 70 }, { alphaPerK: 12e-6, temperatureC: 20 }) // => 60
 */
export function expansionUm(
  nominalMm: number,
  inner: { alphaPerK: number; temperatureC: number },
  outer: { alphaPerK: number; temperatureC: number },
): number {
  return (
    1000 *
    nominalMm *
    (inner.alphaPerK * (inner.temperatureC - referenceC) -
      outer.alphaPerK * (outer.temperatureC - referenceC))
  );
}

/**
 * Fit when running: at rest, less what the smoothing of the surfaces takes, plus the change by
 * temperature, less the growth of a fast ring. Smoothing is taken off on both sides of zero: the
 * diameters are measured over the peaks that are flattened.
 *
 * @returns least, mean and greatest interference when running, µm
 */
export function runningFit(
  atRest: SpreadUm,
  effects: { smoothingUm: number; expansionUm: number; ringGrowthUm: number },
): SpreadUm {
  const shift = effects.expansionUm - effects.smoothingUm - effects.ringGrowthUm;
  return { min: atRest.min + shift, mean: atRest.mean + shift, max: atRest.max + shift };
}

import type { LimitsUm } from './fit-types.ts';
import { referenceC } from './running-fit.ts';

/** Diameters between which a seat is right, at 20 °C, for the micrometer. */
export interface InspectionLimits {
  lowerMm: number;
  upperMm: number;
  lowerInch: number;
  upperInch: number;
}

const mmPerInch = 25.4;

/**
 * Limit deviations as diameters at 20 °C, for the micrometer.
 *
 * @param limitsUm - [lower, upper] deviation, µm
 * @returns limits in mm (exact to 1e-9) and inches
 *
 * @example
 * inspectionLimits(60, [2, 15]).upperMm // => 60.015
 */
export function inspectionLimits(nominalMm: number, limitsUm: LimitsUm): InspectionLimits {
  const [lowerMm, upperMm] = limitsUm.map(
    (um) => Math.round((nominalMm + um / 1000) * 1e9) / 1e9,
  ) as [number, number];
  return { lowerMm, upperMm, lowerInch: lowerMm / mmPerInch, upperInch: upperMm / mmPerInch };
}

/**
 * Brings a diameter read at another temperature to 20 °C (ISO 1): part and instrument expand each by
 * their own coefficient.
 *
 * @param readMm - diameter as read, mm
 * @param part, instrument - coefficient 1/K and temperature °C; the instrument at 20 °C by default
 * @returns diameter at 20 °C, mm
 *
 * @example
 * diameterAt20Mm(60.03, { alphaPerK: 11.5e-6, temperatureC: 40 }) // about 60.0162
 */
export function diameterAt20Mm(
  readMm: number,
  part: { alphaPerK: number; temperatureC: number },
  instrument: { alphaPerK: number; temperatureC: number } = {
    alphaPerK: part.alphaPerK,
    temperatureC: referenceC,
  },
): number {
  const partGrowth = 1 + part.alphaPerK * (part.temperatureC - referenceC);
  const scaleGrowth = 1 + instrument.alphaPerK * (instrument.temperatureC - referenceC);
  return (readMm * scaleGrowth) / partGrowth;
}

import { findColumn } from './find-column.ts';
import type { BearingClass, LimitsUm } from './fit-types.ts';
import {
  boreLowerUm,
  boreUpToMm,
  outsideLowerUm,
  outsideUpToMm,
} from './tables/bearing-tolerances.ts';

/**
 * Limit deviations of a bearing's mean bore diameter, ISO 492:2014.
 *
 * @param d - nominal bore, mm; 2.5 up to 500
 * @returns [lower, 0], µm; `undefined` where the class is not tabulated (below 2.5 mm; class 5
 *   above 400 mm)
 *
 * @example
 * boreLimitsUm(60, 'Normal') // => [-15, 0]
 */
export function boreLimitsUm(d: number, bearingClass: BearingClass): LimitsUm | undefined {
  const column = d < 2.5 ? undefined : findColumn(d, boreUpToMm);
  const lower = column === undefined ? null : boreLowerUm[bearingClass][column];
  return lower == null ? undefined : [lower, 0];
}

/**
 * Limit deviations of a bearing's mean outside diameter, ISO 492:2014; there is a step at 150 mm
 * that ISO 286 does not have.
 *
 * @param D - nominal outside diameter, mm; 6 up to 500
 * @returns [lower, 0], µm; `undefined` where the class is not tabulated
 *
 * @example
 * outsideLimitsUm(160, 'Normal') // => [-25, 0]
 */
export function outsideLimitsUm(D: number, bearingClass: BearingClass): LimitsUm | undefined {
  const column = D < 6 ? undefined : findColumn(D, outsideUpToMm);
  const lower = column === undefined ? null : outsideLowerUm[bearingClass][column];
  return lower == null ? undefined : [lower, 0];
}

import { referenceC } from './running-fit.ts';

/**
 * How far the ring of a floating bearing must be able to move as the machine warms up:
 * 1000·L·(α_shaft·(T_shaft − 20) − α_housing·(T_housing − 20)). From memory, plain physics.
 *
 * @param spanMm - distance from the locating bearing, mm; > 0
 * @returns travel, µm; positive where the shaft grows more than the housing
 *
 * @example
 * // 500 mm, steel shaft 12e-6 at 70 °C, iron housing 10e-6 at 40 °C → 200 µm
 */
export function floatingTravelUm(
  spanMm: number,
  shaft: { alphaPerK: number; temperatureC: number },
  housing: { alphaPerK: number; temperatureC: number },
): number {
  return (
    1000 *
    spanMm *
    (shaft.alphaPerK * (shaft.temperatureC - referenceC) -
      housing.alphaPerK * (housing.temperatureC - referenceC))
  );
}

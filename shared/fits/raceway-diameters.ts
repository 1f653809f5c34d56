import type { BearingType } from './fit-types.ts';

/** Mean raceway diameters of inner and outer ring, mm. */
export interface RacewayDiameters {
  innerMm: number;
  outerMm: number;
}

/**
 * Raceway diameters for the loss of internal clearance through interference. Ball: 1.05·(4d+D)/5 and
 * 0.95·(d+4D)/5 (one source). Rollers: (3d+D)/4 and (d+3D)/4, spherical rollers (4d+D)/5 and
 * (d+4D)/5 (from memory; the outer ones are those of the heating formula).
 *
 * @example
 * racewayDiameters('ball', 60, 130) // => { innerMm: 77.7, outerMm: 110.2 }
 */
export function racewayDiameters(type: BearingType, d: number, D: number): RacewayDiameters {
  if (type === 'ball') {
    return { innerMm: (1.05 * (4 * d + D)) / 5, outerMm: (0.95 * (d + 4 * D)) / 5 };
  }
  if (type === 'roller') return { innerMm: (3 * d + D) / 4, outerMm: (d + 3 * D) / 4 };
  return { innerMm: (4 * d + D) / 5, outerMm: (d + 4 * D) / 5 };
}

/**
 * Outer raceway diameter for the loss of clearance by a warmer inner ring: 0.20·(d+4D) for ball and
 * spherical roller bearings, 0.25·(d+3D) for other rollers (two sources).
 */
export function heatedRacewayMm(type: BearingType, d: number, D: number): number {
  return type === 'roller' ? 0.25 * (d + 3 * D) : 0.2 * (d + 4 * D);
}

/**
 * Lower deviations of the mean bore and the mean outside diameter in one plane, µm; the upper
 * deviation is 0 throughout. ISO 492:2014 Tables 1–6, equal in two published tables except where a
 * note says otherwise; a null is a size the class is not tabulated for.
 */
import type { BearingClass } from '../fit-types.ts';

/** Bores above the limit before, up to and including this one, mm; the first column from 2.5 mm. */
export const boreUpToMm = [10, 18, 30, 50, 80, 120, 180, 250, 315, 400, 500] as const;

/** Class 5 above 315 mm: published tables print −23 and −25; −23 is kept. */
export const boreLowerUm: Readonly<Record<BearingClass, readonly (number | null)[]>> = {
  Normal: [-8, -8, -10, -12, -15, -20, -25, -30, -35, -40, -45],
  '6': [-7, -7, -8, -10, -12, -15, -18, -22, -25, -30, -35],
  '5': [-5, -5, -6, -8, -9, -10, -13, -15, -18, -23, null],
};

/** Outside diameters; unlike ISO 286 there is a step at 150 mm. The first column from 6 mm. */
export const outsideUpToMm = [18, 30, 50, 80, 120, 150, 180, 250, 315, 400, 500] as const;

export const outsideLowerUm: Readonly<Record<BearingClass, readonly (number | null)[]>> = {
  Normal: [-8, -9, -11, -13, -15, -18, -25, -30, -35, -40, -45],
  '6': [-7, -8, -9, -11, -13, -15, -18, -20, -25, -28, -33],
  '5': [-5, -6, -7, -9, -10, -11, -13, -15, -18, -20, -23],
};

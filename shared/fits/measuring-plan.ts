import type { SeatName } from './fit-types.ts';

/** Two planes across the seat, four directions in each. */
export const measuringPlanes = [1, 2] as const;
export const measuringDirectionsDeg = [0, 45, 90, 135] as const;

/** How a seat is to be measured. */
export interface MeasuringPlan {
  instrument: string;
  /** Distance of each plane from the open end of the seat, mm; absent where the width is unknown. */
  planesMm?: readonly [number, number];
  directionsDeg: readonly number[];
  readingCount: number;
  steps: readonly string[];
}

/**
 * Where and how to measure a seat: two planes at a quarter of the width from either side, four
 * directions 45° apart (common practice, no source).
 *
 * @param widthMm - width of the bearing, mm
 */
export function measuringPlan(seat: SeatName, nominalMm: number, widthMm?: number): MeasuringPlan {
  const instrument =
    seat === 'shaft'
      ? `Outside micrometer reading to 1 µm for ${nominalMm} mm, set against a gauge of about that size.`
      : `Two-point bore gauge reading to 1 µm for ${nominalMm} mm, set in a ring or micrometer of about that size.`;
  return {
    instrument,
    ...(widthMm === undefined ? {} : { planesMm: [widthMm / 4, (3 * widthMm) / 4] as const }),
    directionsDeg: measuringDirectionsDeg,
    readingCount: measuringPlanes.length * measuringDirectionsDeg.length,
    steps: [
      'Clean the seat, take off burrs and old paste, and look at it before measuring: the marks tell as much as the size.',
      'Let part, gauge and instrument stand together until they have the same temperature, near 20 °C; write the temperature down.',
      'Set the instrument to zero on the gauge before and after.',
      'Read plane 1 near the shoulder and plane 2 near the open end, each at 0°, 45°, 90° and 135°.',
      ...(seat === 'housing' ? ['Measure a split housing bolted together to its torque.'] : []),
      "Measure the ring's mating diameter the same way if the bearing goes back in.",
    ],
  };
}

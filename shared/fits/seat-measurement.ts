import { FitInputError } from './fit-input-error.ts';
import { measuredDeviationUm } from './measured-diameter.ts';

/** One reading of a two-point instrument: plane across the seat, direction round it. */
export interface DiameterReading {
  plane: 1 | 2;
  directionDeg: 0 | 45 | 90 | 135;
  diameter: number;
}

/** What the readings of one plane say. */
export interface PlaneFigures {
  plane: 1 | 2;
  meanMm: number;
  /** Largest less least diameter; absent below two directions. */
  outOfRoundnessUm?: number;
  readingCount: number;
}

/** What a set of readings says of one seat or ring. */
export interface SeatMeasurement {
  meanMm: number;
  meanDeviationUm: number;
  /** Mean of plane 1 less mean of plane 2; absent where only one plane was read. */
  taperUm?: number;
  /** Largest less least diameter in one plane, of the worse plane; absent below two directions. */
  outOfRoundnessUm?: number;
  /** Standard uncertainty of the mean: instrument and scatter of the readings. */
  standardUncertaintyUm: number;
  /** Twice the standard uncertainty, about 95 %. */
  expandedUncertaintyUm: number;
  readingCount: number;
  /** Planes that were read, in their order. */
  planes: readonly PlaneFigures[];
  /** Both planes in all four directions. */
  complete: boolean;
}

/** Standard uncertainty of a micrometer or bore gauge in the plant, µm (assumption). */
export const defaultInstrumentUncertaintyUm = 2;

const mmPerInch = 25.4;

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function spread(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

function standardDeviation(values: readonly number[]): number {
  if (values.length < 2) return 0;
  const middle = mean(values);
  return Math.sqrt(
    values.reduce((sum, value) => sum + (value - middle) ** 2, 0) / (values.length - 1),
  );
}

/**
 * Turns the readings of one seat (two planes, four directions) into mean, taper, out-of-roundness and
 * uncertainty. The uncertainty of the mean is √(u² + s²/n): u of the instrument, which no repetition
 * takes away, and the scatter s of n readings (GUM, type A and B).
 *
 * @param readings - at least one; diameters at 20 °C in `unit`
 * @param field - name of the input, for errors (`readings[2]`)
 * @throws {FitInputError} `size_missing` without readings; `not_finite`, `measured_in_inches`,
 *   `factor_1000`, `far_from_nominal` naming the reading
 *
 * @example
 * // 60.002 and 60.004 mm in plane 1: mean 60.003, out-of-roundness 2 µm
 */
export function measureSeat(
  readings: readonly DiameterReading[],
  nominalMm: number,
  options: { unit?: 'mm' | 'in'; instrumentUncertaintyUm?: number; field?: string } = {},
): SeatMeasurement {
  const field = options.field ?? 'readings';
  if (readings.length === 0) {
    throw new FitInputError('size_missing', field, 'At least one reading is needed.');
  }
  const factor = options.unit === 'in' ? mmPerInch : 1;
  const deviations = readings.map((reading, index) => ({
    ...reading,
    um: measuredDeviationUm(reading.diameter * factor, nominalMm, `${field}[${index}]`),
  }));
  const planes = ([1, 2] as const)
    .map((plane) => ({ plane, rows: deviations.filter((r) => r.plane === plane) }))
    .filter(({ rows }) => rows.length > 0)
    .map(({ plane, rows }) => ({
      plane,
      directions: new Set(rows.map((r) => r.directionDeg)),
      um: rows.map((r) => r.um),
    }));
  const meanUm = mean(planes.map((plane) => mean(plane.um)));
  const [first, second] = planes;
  const round = planes
    .filter((plane) => plane.directions.size > 1)
    .map((plane) => spread(plane.um));
  const scatter = standardDeviation(deviations.map((r) => r.um)) / Math.sqrt(readings.length);
  const uncertainty = Math.hypot(
    options.instrumentUncertaintyUm ?? defaultInstrumentUncertaintyUm,
    scatter,
  );
  return {
    meanMm: nominalMm + meanUm / 1000,
    meanDeviationUm: meanUm,
    taperUm: first && second ? mean(first.um) - mean(second.um) : undefined,
    outOfRoundnessUm: round.length > 0 ? Math.max(...round) : undefined,
    standardUncertaintyUm: uncertainty,
    expandedUncertaintyUm: 2 * uncertainty,
    readingCount: readings.length,
    planes: planes.map(({ plane, directions, um }) => ({
      plane,
      meanMm: nominalMm + mean(um) / 1000,
      outOfRoundnessUm: directions.size > 1 ? spread(um) : undefined,
      readingCount: um.length,
    })),
    complete: planes.length === 2 && planes.every((plane) => plane.directions.size === 4),
  };
}

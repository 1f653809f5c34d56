import { quantityOfUnit, type Quantity, type Unit } from '../quantities/quantity.ts';

/** Longest record that is analysed whole; of longer ones the beginning is. */
export const analysedSamplesMax = 2 ** 20;

/** Factor from each unit to the one calculated in: m/s², mm/s, µm. */
const toBase: Readonly<Record<Unit, number>> = {
  g: 9.80665, // ISO 80000-3, standard acceleration of free fall
  'm/s²': 1,
  'mm/s': 1,
  'in/s': 25.4,
  µm: 1,
  mil: 25.4,
};

/** No sensor reads as much in any unit: larger values are gaps, and their powers stay finite. */
const largestSample = 1e12;

export interface PreparedSamples {
  /** As recorded, as far as analysed. */
  raw: Float64Array;
  /** Without gaps and without mean, in m/s², mm/s or µm. */
  values: Float64Array;
  quantity: Quantity;
  /** Factor from the recorded unit. */
  factor: number;
  gapCount: number;
  longestGap: number;
  cutShort: boolean;
}

/**
 * Makes samples fit to be transformed: gaps (values that are not finite or beyond all measure) bridged by straight lines and
 * counted, the mean taken out, the unit made m/s², mm/s or µm.
 *
 * @param samples - recorded values; not changed
 */
export function prepareSamples(samples: Float64Array, unit: Unit): PreparedSamples {
  const count = Math.min(samples.length, analysedSamplesMax);
  const factor = toBase[unit];
  const values = new Float64Array(count);
  let [gapCount, longestGap, gap, last, sum] = [0, 0, 0, 0, 0];
  let known = false;
  for (let i = 0; i < count; i += 1) {
    const value = samples[i] ?? Number.NaN;
    if (!(Math.abs(value) < largestSample)) {
      gapCount += 1;
      gap += 1;
      longestGap = Math.max(longestGap, gap);
      continue;
    }
    const scaled = value * factor;
    if (gap > 0) {
      const from = known ? last : scaled;
      for (let j = 1; j <= gap; j += 1) {
        values[i - gap - 1 + j] = from + ((scaled - from) * j) / (gap + 1);
      }
      gap = 0;
    }
    values[i] = scaled;
    last = scaled;
    known = true;
  }
  for (let i = count - gap; i < count; i += 1) values[i] = last;
  for (let i = 0; i < count; i += 1) sum += values[i] ?? 0;
  const mean = count === 0 ? 0 : sum / count;
  for (let i = 0; i < count; i += 1) values[i] = (values[i] ?? 0) - mean;
  return {
    raw: samples.subarray(0, count),
    values,
    quantity: quantityOfUnit[unit],
    factor,
    gapCount,
    longestGap,
    cutShort: samples.length > count,
  };
}

import type { Quantity } from '../quantities/quantity.ts';

/** Below this integrated noise hides everything; ISO 20816 measures from 2 Hz on slow machines. */
export const highPassHz = 1.5;

/**
 * Factor from a peak amplitude in m/s², mm/s or µm to a velocity in mm/s rms at one frequency:
 * a = (2πf) v = (2πf)² x.
 *
 * @param frequencyHz - Hz; below the high-pass of 1.5 Hz the factor is 0
 */
export function velocityRmsFactor(quantity: Quantity, frequencyHz: number): number {
  return frequencyHz < highPassHz ? 0 : plainVelocityRmsFactor(quantity, frequencyHz);
}

/** The same without the high-pass, for a frequency > 0. */
export function plainVelocityRmsFactor(quantity: Quantity, frequencyHz: number): number {
  const omega = 2 * Math.PI * frequencyHz;
  if (quantity === 'acceleration') return 1000 / omega / Math.SQRT2;
  if (quantity === 'velocity') return 1 / Math.SQRT2;
  return (omega * 1e-3) / Math.SQRT2;
}

/**
 * Turns a spectrum of any quantity into velocity lines.
 *
 * @param amplitudePeak - peak amplitudes in m/s², mm/s or µm
 * @returns mm/s rms a line
 */
export function velocityLines(
  amplitudePeak: Float64Array,
  stepHz: number,
  quantity: Quantity,
): Float64Array {
  return amplitudePeak.map((value, index) => value * velocityRmsFactor(quantity, index * stepHz));
}

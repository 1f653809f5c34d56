import { nextPowerOfTwo, realFromLines } from './fft.ts';
import type { SpectrumView } from './spectrum-view.ts';

/** Highest order kept; beyond it the run is not looked at, but its floor is. */
export const bandOrders = 25;
/** Lower edge over the shaft's speed: below lie drift and what integration makes of it. */
const highPassShare = 0.2;
const fullPassShare = 0.28;
/** Points per cycle of the highest order, so that a cubic through four of them is good to 0.1 %. */
const pointsPerCycle = 6;
const smallestLength = 64;

/** Velocity of the whole record, limited to the orders' band. */
export interface BandVelocity {
  /** mm/s, at equal steps over the record's duration. */
  mmPerS: Float64Array;
  /** Points a second. */
  rateHz: number;
}

/**
 * Integrates (or differentiates) the record to velocity by its Fourier lines, v = a/(2πif) = 2πif·x,
 * high-passed from 0.2 to 0.28 of the shaft speed by a raised cosine and cut above order 25 or the
 * usable band, and samples it anew.
 *
 * @param speedHz - of the shaft, > 0
 */
export function bandVelocity(view: SpectrumView, durationS: number, speedHz: number): BandVelocity {
  const { lines, stepHz, quantity } = view;
  const topHz = Math.min(view.usableHz, (bandOrders + 0.5) * speedHz);
  const count = Math.max(2, Math.min(lines.length >> 1, Math.floor(topHz / stepHz) + 1));
  const kept = new Float64Array(2 * count);
  for (let k = Math.max(1, Math.ceil((highPassShare * speedHz) / stepHz)); k < count; k += 1) {
    const frequencyHz = k * stepHz;
    const omega = 2 * Math.PI * frequencyHz;
    const rise = (frequencyHz / speedHz - highPassShare) / (fullPassShare - highPassShare);
    const pass = rise >= 1 ? 1 : 0.5 - 0.5 * Math.cos(Math.PI * rise);
    // Half, since a real signal is twice the real part of its upper lines.
    const [re, im] = [0.5 * pass * (lines[2 * k] ?? 0), 0.5 * pass * (lines[2 * k + 1] ?? 0)];
    if (quantity === 'acceleration') {
      kept[2 * k] = (1000 * im) / omega;
      kept[2 * k + 1] = (-1000 * re) / omega;
    } else if (quantity === 'velocity') {
      kept[2 * k] = re;
      kept[2 * k + 1] = im;
    } else {
      kept[2 * k] = -im * omega * 1e-3;
      kept[2 * k + 1] = re * omega * 1e-3;
    }
  }
  const length = Math.max(smallestLength, nextPowerOfTwo(pointsPerCycle * count));
  return { mmPerS: realFromLines(kept, length), rateHz: length / durationS };
}

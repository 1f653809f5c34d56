import { medianInPlace } from './noise-floor.ts';
import type { OrderSpectrum } from './order-spectra.ts';

const lowestOrder = 0.3;
const octaves = 4;
const linesMin = 3;
const tiltMax = 8;

/**
 * How the noise slopes at low orders: the exponent of power over order, from the medians of four
 * octaves (Theil 1950: the median of all slopes between two of them). Noise that falls steeply would
 * else lift every fraction below 1× over a floor that can only be taken above it.
 *
 * @param isOrder - whether a line belongs to an order and is left out
 * @returns 0 where the lines are too few to tell
 */
export function noiseTilt(
  { power, linesPerOrder }: OrderSpectrum,
  isOrder: (line: number) => boolean,
): number {
  const levels: { at: number; level: number }[] = [];
  const beside = new Float64Array(power.length);
  for (let octave = 0; octave < octaves; octave += 1) {
    const from = Math.ceil(lowestOrder * 2 ** octave * linesPerOrder);
    const to = Math.min(power.length, Math.ceil(lowestOrder * 2 ** (octave + 1) * linesPerOrder));
    let [count, sum] = [0, 0];
    for (let k = from; k < to; k += 1) {
      if (isOrder(k)) continue;
      beside[count++] = power[k] ?? 0;
      sum += Math.log(k);
    }
    const median = medianInPlace(beside, count);
    if (count < linesMin || median <= 0) continue;
    levels.push({ at: sum / count, level: Math.log(median) });
  }
  const slopes: number[] = [];
  levels.forEach((low, i) => {
    for (const high of levels.slice(i + 1)) {
      slopes.push((high.level - low.level) / (high.at - low.at));
    }
  });
  if (slopes.length < 3) return 0;
  slopes.sort((a, b) => a - b);
  const middle = ((slopes[(slopes.length - 1) >> 1] ?? 0) + (slopes[slopes.length >> 1] ?? 0)) / 2;
  return Math.max(-tiltMax, Math.min(tiltMax, middle));
}

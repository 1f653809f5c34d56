import type { BandVelocity } from './band-velocity.ts';

/** Points a turn; with the band ending at order 25.5 nothing folds back. */
export const pointsPerTurn = 64;

/** How far the shaft is ahead of steady running, in turns, at equal steps of time. */
export interface AngleDeviation {
  /** Time of the first value, s. */
  fromS: number;
  stepS: number;
  turns: Float64Array;
}

export const steadyRunning: AngleDeviation = { fromS: 0, stepS: 1, turns: new Float64Array(1) };

/** Linear between the given times, and going on with the outer slopes beyond them. */
function deviationAt({ fromS, stepS, turns }: AngleDeviation, timeS: number): number {
  if (turns.length < 2) return turns[0] ?? 0;
  const place = (timeS - fromS) / stepS;
  const left = Math.max(0, Math.min(turns.length - 2, Math.floor(place)));
  const [a, b] = [turns[left] ?? 0, turns[left + 1] ?? 0];
  return a + (b - a) * (place - left);
}

/**
 * Samples the record at equal steps of the shaft angle, by a cubic through four neighbours.
 *
 * @param speedHz - mean speed, > 0
 * @param deviation - by which the angle runs ahead of speed × time
 * @returns mm/s, `pointsPerTurn` values a turn, whole turns only
 */
export function toShaftAngle(
  band: BandVelocity,
  speedHz: number,
  deviation: AngleDeviation,
): Float64Array {
  const { mmPerS, rateHz } = band;
  const durationS = mmPerS.length / rateHz;
  const first = deviationAt(deviation, 0);
  const last = durationS * speedHz + deviationAt(deviation, durationS);
  const turns = Math.max(0, Math.floor(last - first + 1e-9));
  const out = new Float64Array(turns * pointsPerTurn);
  const steady = deviation.turns.length < 2;
  for (let j = 0; j < out.length; j += 1) {
    const angle = first + j / pointsPerTurn;
    let timeS = angle / speedHz;
    if (!steady) {
      // The deviation changes slowly: two rounds of the fixed point are exact enough.
      timeS = (angle - deviationAt(deviation, timeS)) / speedHz;
      timeS = (angle - deviationAt(deviation, timeS)) / speedHz;
    }
    out[j] = cubicAt(mmPerS, timeS * rateHz);
  }
  return out;
}

/** Cubic Lagrange interpolation through four points; the band-limited record is periodic. */
function cubicAt(values: Float64Array, place: number): number {
  const mask = values.length - 1; // a power of two
  const base = Math.floor(place);
  const t = place - base;
  // The mask keeps every index inside; this loop is the busiest of the method.
  const a = values[(base - 1) & mask] as number;
  const b = values[base & mask] as number;
  const c = values[(base + 1) & mask] as number;
  const d = values[(base + 2) & mask] as number;
  const before = t + 1;
  const after = t - 1;
  const beyond = t - 2;
  return (t * after * (d * before - a * beyond)) / 6 + (before * beyond * (b * after - c * t)) / 2;
}

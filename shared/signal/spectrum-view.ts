import type { Quantity } from '../quantities/quantity.ts';
import { amplitudeSpectrum } from './amplitude-spectrum.ts';
import { noiseFloor } from './noise-floor.ts';
import { velocityLines } from './velocity-lines.ts';

/** The whole-record spectrum as the steps after it look at it. */
export interface SpectrumView {
  stepHz: number;
  quantity: Quantity;
  /** Peak, m/s², mm/s or µm. */
  amplitudePeak: Float64Array;
  /** mm/s rms a line. */
  velocity: Float64Array;
  /** Power over the local noise floor, a line. */
  ratio: Float64Array;
  /** mm/s rms of the noise in a line. */
  floor: Float64Array;
  /** Highest frequency that is not touched by the anti-alias filter, Hz. */
  usableHz: number;
}

/** Recorders keep a guard band: the usable band is the sampling rate over 2.56 (common practice, no source). */
const guardFactor = 2.56;
const floorHalfWidthMin = 24;

/**
 * @param values - prepared samples, m/s², mm/s or µm
 * @param orderHz - about one shaft speed: the floor is taken over a window of that width
 */
export function viewSpectrum(
  values: Float64Array,
  sampleRateHz: number,
  quantity: Quantity,
  orderHz: number,
): SpectrumView {
  const { stepHz, amplitudePeak } = amplitudeSpectrum(values, sampleRateHz);
  const velocity = velocityLines(amplitudePeak, stepHz, quantity);
  const power = amplitudePeak.map((value) => value * value);
  const halfWidth = Math.max(
    floorHalfWidthMin,
    Math.min(400, Math.round((0.6 * orderHz) / stepHz)),
  );
  const noise = noiseFloor(power, halfWidth);
  return {
    stepHz,
    quantity,
    amplitudePeak,
    velocity,
    ratio: power.map((value, i) => value / (noise[i] ?? 1)),
    floor: velocity.map((value, i) => {
      const peak = amplitudePeak[i] ?? 0;
      return peak > 0 ? (value / peak) * Math.sqrt(noise[i] ?? 0) : 0;
    }),
    usableHz: sampleRateHz / guardFactor,
  };
}

/**
 * The strongest line within a few lines of a frequency, with its place and height read between the
 * lines (Hann window: two-line interpolation, Grandke 1983).
 *
 * @param reachLines - how far to look to either side
 * @returns null outside the spectrum
 */
export function peakNear(
  view: Pick<SpectrumView, 'stepHz' | 'amplitudePeak'>,
  frequencyHz: number,
  reachLines: number,
): { index: number; frequencyHz: number; amplitudePeak: number } | null {
  const { amplitudePeak, stepHz } = view;
  const centre = frequencyHz / stepHz;
  const from = Math.max(1, Math.round(centre - reachLines));
  const to = Math.min(amplitudePeak.length - 2, Math.round(centre + reachLines));
  if (to < from) return null;
  let index = from;
  for (let i = from + 1; i <= to; i += 1) {
    if ((amplitudePeak[i] ?? 0) > (amplitudePeak[index] ?? 0)) index = i;
  }
  const [left, middle, right] = [
    amplitudePeak[index - 1] ?? 0,
    amplitudePeak[index] ?? 0,
    amplitudePeak[index + 1] ?? 0,
  ];
  const toRight = right >= left;
  const neighbour = toRight ? right : left;
  const ratio = middle > 0 ? neighbour / middle : 0;
  const offset = Math.max(0, Math.min(0.5, (2 * ratio - 1) / (ratio + 1)));
  return {
    index,
    frequencyHz: (index + (toRight ? offset : -offset)) * stepHz,
    amplitudePeak: middle / hannResponse(offset),
  };
}

/** Response of the Hann window to a tone `offset` lines away, relative to the one on a line. */
function hannResponse(offset: number): number {
  if (Math.abs(offset) < 1e-9) return 1;
  const x = Math.PI * offset;
  return Math.sin(x) / x / (1 - offset * offset);
}

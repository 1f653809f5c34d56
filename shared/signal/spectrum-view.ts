import type { Quantity } from '../quantities/quantity.ts';
import { realFft } from './fft.ts';
import { noiseFloor } from './noise-floor.ts';
import { velocityRmsFactor } from './velocity-lines.ts';

/** The whole-record spectrum as the steps after it look at it. */
export interface SpectrumView {
  stepHz: number;
  quantity: Quantity;
  /** Fourier lines without a window, interleaved, scaled to peak amplitudes. */
  lines: Float64Array;
  /** Through a Hann window: peak, m/s², mm/s or µm. */
  amplitudePeak: Float64Array;
  /** mm/s rms a line, through the Hann window. */
  velocity: Float64Array;
  /** Power over the local noise floor, a line. */
  ratio: Float64Array;
  /** Highest frequency that is not touched by the anti-alias filter, Hz. */
  usableHz: number;
}

/** Recorders keep a guard band: the usable band is the sampling rate over 2.56 (common practice, no source). */
const guardFactor = 2.56;
const floorHalfWidthMin = 24;
const floorHalfWidthMax = 400;

/**
 * Lines to either side over which the noise floor is taken: a little over one order wide
 * in all, so that lines fill little of it.
 *
 * @param orderHz - about one shaft speed, Hz, > 0
 * @param stepHz - distance of two lines, Hz, > 0
 * @returns 24 to 400 lines
 */
export function floorHalfWidthLines(orderHz: number, stepHz: number): number {
  return Math.max(
    floorHalfWidthMin,
    Math.min(floorHalfWidthMax, Math.round((0.6 * orderHz) / stepHz)),
  );
}

/**
 * One transform of the whole record, seen with and without a window: a periodic Hann window in time
 * is the convolution of the lines with −¼, ½, −¼, so the second transform is saved.
 *
 * @param values - prepared samples, m/s², mm/s or µm; at least 4
 * @param orderHz - about one shaft speed: the floor is taken over a window of that width
 */
export function viewSpectrum(
  values: Float64Array,
  sampleRateHz: number,
  quantity: Quantity,
  orderHz: number,
): SpectrumView {
  const n = values.length;
  const stepHz = sampleRateHz / n;
  const lines = realFft(values);
  const count = lines.length >> 1;
  const scale = 2 / n;
  for (let i = 0; i < lines.length; i += 1) lines[i] = (lines[i] ?? 0) * scale;
  const amplitudePeak = hannAmplitudes(lines, n);
  const velocity = new Float64Array(count);
  const power = new Float64Array(count);
  for (let k = 0; k < count; k += 1) {
    const peak = amplitudePeak[k] ?? 0;
    velocity[k] = peak * velocityRmsFactor(quantity, k * stepHz);
    power[k] = peak * peak;
  }
  const noise = noiseFloor(power, floorHalfWidthLines(orderHz, stepHz));
  const ratio = new Float64Array(count);
  for (let k = 0; k < count; k += 1) ratio[k] = (power[k] ?? 0) / (noise[k] ?? 1);
  return {
    stepHz,
    quantity,
    lines,
    amplitudePeak,
    velocity,
    ratio,
    usableHz: sampleRateHz / guardFactor,
  };
}

/** Amplitudes through a Hann window, coherent gain corrected, from the lines without one. */
function hannAmplitudes(lines: Float64Array, n: number): Float64Array {
  const count = lines.length >> 1;
  const nyquist = n % 2 === 0 ? count - 1 : -1;
  const amplitudes = new Float64Array(count);
  for (let k = 0; k < count; k += 1) {
    // Beyond both ends the spectrum of a real signal is its own mirror image.
    const below = k === 0 ? 1 : k - 1;
    const mirrorBelow = k === 0 ? -1 : 1;
    const above = k < count - 1 ? k + 1 : nyquist === k ? k - 1 : k;
    const mirrorAbove = k < count - 1 ? 1 : -1;
    const re = (lines[2 * k] ?? 0) - 0.5 * ((lines[2 * below] ?? 0) + (lines[2 * above] ?? 0));
    const im =
      (lines[2 * k + 1] ?? 0) -
      0.5 * (mirrorBelow * (lines[2 * below + 1] ?? 0) + mirrorAbove * (lines[2 * above + 1] ?? 0));
    const single = k === 0 || k === nyquist ? 0.5 : 1;
    amplitudes[k] = single * Math.sqrt(re * re + im * im);
  }
  return amplitudes;
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

import { bandOrders } from './band-velocity.ts';
import { realFft } from './fft.ts';
import { pointsPerTurn } from './shaft-angle.ts';

/** Segment by segment spectra over the shaft angle: Hann, overlapping by half. */
export interface OrderSegments {
  /** Lines to an order: the turns a segment covers. */
  linesPerOrder: number;
  /** Lines of each segment, interleaved, peak amplitudes in mm/s, from order 0 to 25. */
  segments: readonly Float64Array[];
  /** Turns between the beginnings of two segments. */
  hopTurns: number;
}

/** Averaged spectrum over the shaft angle. */
export interface OrderSpectrum {
  linesPerOrder: number;
  /** (mm/s rms)² a line, mean over the segments. */
  power: Float64Array;
  /** The same of the mean of the complex lines: what keeps its phase to the shaft. */
  coherentPower: Float64Array;
  segmentCount: number;
  /** Independent averages the mean power is worth; 0 without segments. */
  averages: number;
}

const longestSegmentTurns = 64;
const shortestSegmentTurns = 4;
const segmentsMax = 400;
/** Neighbours overlapping by half share 1/36 of their variance (Welch 1967, Hann window). */
const overlapLoss = 1 + 2 / 36;

const windows = new Map<number, Float64Array>();

/** Periodic Hann window, scaled so that a sine shows its peak amplitude. */
function hannOf(length: number): Float64Array {
  const known = windows.get(length);
  if (known !== undefined) return known;
  const window = new Float64Array(length);
  for (let i = 0; i < length; i += 1) {
    window[i] = (2 / length) * (1 - Math.cos((2 * Math.PI * i) / length));
  }
  windows.set(length, window);
  return window;
}

/** Turns a segment should cover: three segments and more, and no more lines than are of use. */
export function segmentTurns(turns: number): number {
  const fitting = 2 ** Math.floor(Math.log2(Math.max(1, turns / 2)));
  return Math.max(shortestSegmentTurns, Math.min(longestSegmentTurns, fitting));
}

/**
 * Spectra of overlapping segments over the shaft angle.
 *
 * @param velocity - mm/s at `pointsPerTurn` points a turn
 * @param turns - of one segment, a power of two
 * @param hopTurns - from one segment to the next
 * @param points - a turn has in `velocity`; with fewer than `pointsPerTurn` the lines end earlier
 * @returns no segments where the record is shorter than one
 */
export function orderSegments(
  velocity: Float64Array,
  turns: number,
  hopTurns: number,
  points = pointsPerTurn,
): OrderSegments {
  const length = turns * points;
  const window = hannOf(length);
  const lineCount = Math.min(bandOrders * turns, length / 2) + 1;
  const segments: Float64Array[] = [];
  const part = new Float64Array(length);
  for (
    let from = 0;
    from + length <= velocity.length && segments.length < segmentsMax;
    from += hopTurns * points
  ) {
    for (let i = 0; i < length; i += 1) {
      part[i] = (velocity[from + i] as number) * (window[i] as number);
    }
    segments.push(realFft(part).subarray(0, 2 * lineCount));
  }
  return { linesPerOrder: turns, segments, hopTurns };
}

/** Mean power and coherent power of segments that overlap by half. */
export function averageSegments({ linesPerOrder, segments }: OrderSegments): OrderSpectrum {
  const lineCount = bandOrders * linesPerOrder + 1;
  const power = new Float64Array(lineCount);
  const mean = new Float64Array(2 * lineCount);
  for (const lines of segments) {
    for (let k = 0; k < lineCount; k += 1) {
      const [re, im] = [lines[2 * k] ?? 0, lines[2 * k + 1] ?? 0];
      power[k] = (power[k] ?? 0) + re * re + im * im;
      // Segments begin half their (even) turns apart: whole and half orders meet in phase.
      mean[2 * k] = (mean[2 * k] ?? 0) + re;
      mean[2 * k + 1] = (mean[2 * k + 1] ?? 0) + im;
    }
  }
  const count = Math.max(1, segments.length);
  const coherentPower = new Float64Array(lineCount);
  for (let k = 0; k < lineCount; k += 1) {
    power[k] = (power[k] ?? 0) / (2 * count);
    coherentPower[k] =
      ((mean[2 * k] ?? 0) ** 2 + (mean[2 * k + 1] ?? 0) ** 2) / (2 * count * count);
  }
  return {
    linesPerOrder,
    power,
    coherentPower,
    segmentCount: segments.length,
    averages: segments.length <= 1 ? segments.length : count / overlapLoss,
  };
}

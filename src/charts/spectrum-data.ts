import type { Series } from './aligned-data.ts';
import { decimateMinMax } from './decimate-min-max.ts';
import { evidenceOrders, isWholeOrder, type OrderMark } from './order-mark.ts';
import type { Window } from './plot-window.ts';

export interface Spectrum {
  /** Frequency of line i is i × stepHz. */
  stepHz: number;
  amplitude: Float32Array;
}

/** Points a plot draws at most: some four a pixel, with both extremes of what lies between them. */
export const plotMaxPoints = 4000;

/** Lines of a window, on both sides one more than is in sight. */
export function linesIn(
  { stepHz, amplitude }: Spectrum,
  unitsPerHz: number,
  { min, max }: Window,
): { first: number; end: number } {
  const perUnit = 1 / (stepHz * unitsPerHz);
  let first = Math.max(0, Math.floor(min * perUnit) - 1);
  const end = Math.min(amplitude.length, Math.ceil(max * perUnit) + 2);
  // Lines that integration hides stand at the beginning.
  while (first < end && Number.isNaN(amplitude[first])) first += 1;
  return { first, end };
}

/**
 * A part of a spectrum as the plot takes it.
 *
 * @param unitsPerHz - scale of the x axis (60 for 1/min, 1/speed for orders)
 * @param view - stretch of the x axis
 * @param heightOf - where an amplitude stands on the y axis
 */
export function spectrumSeries(
  spectrum: Spectrum,
  unitsPerHz: number,
  view: Window,
  heightOf: (amplitude: number) => number,
): Series {
  const { first, end } = linesIn(spectrum, unitsPerHz, view);
  const { index, value } = decimateMinMax(spectrum.amplitude, first, end, plotMaxPoints);
  return {
    x: index.map((line) => line * spectrum.stepHz * unitsPerHz),
    y: Float64Array.from(value, heightOf),
  };
}

/** The lower end of a logarithmic axis: five decades below the greatest line. */
export function logFloor(amplitude: Float32Array): number {
  let max = 0;
  for (const value of amplitude) if (value > max) max = value;
  return max > 0 ? max * 1e-5 : 1e-6;
}

/** The greatest line within `halfWidthHz` of a frequency. */
export function peakNear(
  { stepHz, amplitude }: Spectrum,
  frequencyHz: number,
  halfWidthHz: number,
): { frequencyHz: number; amplitude: number } | null {
  const first = Math.max(0, Math.ceil((frequencyHz - halfWidthHz) / stepHz));
  const last = Math.min(amplitude.length - 1, Math.floor((frequencyHz + halfWidthHz) / stepHz));
  let best: { frequencyHz: number; amplitude: number } | null = null;
  for (let line = first; line <= last; line += 1) {
    const value = amplitude[line] ?? 0;
    // What integration hides (NaN) is no line.
    if (value >= 0 && (best === null || value > best.amplitude)) {
      best = { frequencyHz: line * stepHz, amplitude: value };
    }
  }
  return best;
}

export interface SpectrumMark {
  order: number;
  frequencyHz: number;
  amplitude: number;
  /** `run`, `fraction`: evidence of looseness; `standing`: stands out without being evidence. */
  kind: 'run' | 'fraction' | 'standing' | 'explained';
  explainedBy: string | null;
  /** The same line at the survey before, where it is known. */
  previousAmplitude: number | null;
}

/** Which lines of the spectrum are marked, and as what; those that are only noise are not. */
export function spectrumMarks(
  spectrum: Spectrum,
  speedHz: number | null,
  orders: readonly OrderMark[],
  run: { from: number; to: number; length: number } | null,
  previous: Spectrum | null = null,
): SpectrumMark[] {
  if (speedHz === null || speedHz <= 0) return [];
  const evidence = evidenceOrders(orders, run);
  const halfWidthHz = Math.max(1.5 * spectrum.stepHz, 0.01 * speedHz);
  return orders
    .filter((mark) => mark.significant)
    .flatMap((mark) => {
      const peak = peakNear(spectrum, mark.order * speedHz, halfWidthHz);
      if (peak === null) return [];
      return [
        {
          order: mark.order,
          ...peak,
          kind: kindOf(mark, evidence),
          explainedBy: mark.explainedBy,
          previousAmplitude:
            previous === null
              ? null
              : (peakNear(previous, mark.order * speedHz, halfWidthHz)?.amplitude ?? null),
        } as const,
      ];
    });
}

function kindOf(mark: OrderMark, evidence: ReadonlySet<number>): SpectrumMark['kind'] {
  if (mark.explainedBy !== null) return 'explained';
  if (!evidence.has(mark.order)) return 'standing';
  return isWholeOrder(mark.order) ? 'run' : 'fraction';
}

import { formatFixed } from '#shared/quantities/format-number.ts';

export type Point = readonly [x: number, y: number];

/** Linear place of a value on a stretch of paper. */
export interface Axis {
  from: number;
  to: number;
  start: number;
  length: number;
}

export const placeOn = ({ from, to, start, length }: Axis, value: number): number =>
  start + ((value - from) / (to - from)) * length;

/** Round steps that give at most so many ticks inside the axis. */
export function ticksOf(from: number, to: number, most: number): number[] {
  const span = to - from;
  if (!(span > 0) || !Number.isFinite(span)) return [];
  const decade = 10 ** Math.floor(Math.log10(span / most));
  const step = decade * ([1, 2, 5, 10].find((one) => span / (one * decade) <= most) ?? 10);
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, index) => (first + index) * step);
}

/** A tick with the decimals that its neighbours need, and a true minus. */
export function tickText(tick: number, ticks: readonly number[]): string {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0)) || 1;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  return formatFixed(tick, Math.min(20, decimals));
}

/** Whole decades from the one below the floor to the one above the highest line, three at least. */
export function decadesOf(highest: number): { from: number; to: number } {
  const to = highest > 0 ? Math.ceil(Math.log10(highest * 1.1)) : 0;
  return { from: to - 4, to };
}

/**
 * The lines of a spectrum as a path: of all lines that fall into one column the highest is kept,
 * so that no peak is lost however many there are.
 *
 * @param heights - of line k, in the axis' own measure; NaN is left out
 * @param columnWidth - points of paper
 */
export function highestPath(
  heights: ArrayLike<number>,
  stepHz: number,
  x: Axis,
  y: Axis,
  columnWidth = 0.5,
): Point[] {
  const path: Point[] = [];
  let column = -1;
  let best: Point | null = null;
  const first = Math.max(0, Math.ceil(x.from / stepHz));
  const last = Math.min(heights.length - 1, Math.floor(x.to / stepHz));
  const clamp = (value: number) => Math.max(y.from, Math.min(y.to, value));
  let bestHeight = -Infinity;
  for (let k = first; k <= last; k += 1) {
    const height = heights[k] ?? Number.NaN;
    if (Number.isNaN(height)) continue;
    const at = placeOn(x, k * stepHz);
    const here = Math.floor((at - x.start) / columnWidth);
    if (here !== column) {
      if (best !== null) path.push(best);
      [column, best, bestHeight] = [here, null, -Infinity];
    }
    if (best === null || height > bestHeight) {
      best = [at, placeOn(y, clamp(height))];
      bestHeight = height;
    }
  }
  if (best !== null) path.push(best);
  return path;
}

/**
 * A time record as paths, one for each stretch without a gap: of all samples that fall into one
 * column the lowest and the highest are kept, in the order in which they come.
 */
export function samplePaths(
  samples: ArrayLike<number>,
  x: Axis,
  y: Axis,
  columnWidth = 0.4,
): Point[][] {
  const paths: Point[][] = [[]];
  const perColumn = Math.max(1, Math.floor((samples.length * columnWidth) / x.length));
  const pointAt = (index: number): Point => [
    placeOn(x, index),
    placeOn(y, samples[index] ?? Number.NaN),
  ];
  for (let first = 0; first < samples.length; first += perColumn) {
    let [low, high] = [-1, -1];
    for (let i = first; i < Math.min(samples.length, first + perColumn); i += 1) {
      const value = samples[i] ?? Number.NaN;
      if (Number.isNaN(value)) continue;
      if (low < 0 || value < (samples[low] ?? Infinity)) low = i;
      if (high < 0 || value > (samples[high] ?? -Infinity)) high = i;
    }
    const path = paths.at(-1);
    if (low < 0) {
      if (path !== undefined && path.length > 0) paths.push([]);
      continue;
    }
    for (const index of low === high ? [low] : [Math.min(low, high), Math.max(low, high)]) {
      path?.push(pointAt(index));
    }
  }
  return paths.filter((path) => path.length > 0);
}

/** Lowest and highest of what is there, with air; null where nothing is. */
export function reachOf(samples: ArrayLike<number>): { from: number; to: number } | null {
  let [low, high] = [Infinity, -Infinity];
  for (let i = 0; i < samples.length; i += 1) {
    const value = samples[i] ?? Number.NaN;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (low > high) return null;
  const air = (high - low) * 0.08 || Math.max(1, Math.abs(high)) * 0.1;
  return { from: low - air, to: high + air };
}

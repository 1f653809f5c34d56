import type uPlot from 'uplot';

export interface Window {
  min: number;
  max: number;
}

/** Halves or doubles a window about a point, kept within the whole; null where nothing changes. */
export function zoomedWindow(
  view: Window,
  whole: Window,
  about: number,
  factor: number,
): Window | null {
  const min = Math.max(whole.min, about - (about - view.min) * factor);
  const max = Math.min(whole.max, about + (view.max - about) * factor);
  if (!(max > min) || (min === view.min && max === view.max)) return null;
  // Below a millionth of the whole there is nothing left to see.
  if (max - min < (whole.max - whole.min) * 1e-6) return null;
  return { min, max };
}

/** The index a cursor goes to, from where it is (or the middle of the view), within the view. */
export function cursorIndex(
  at: number | null | undefined,
  steps: number,
  first: number,
  last: number,
): number {
  const from = at ?? Math.round((first + last) / 2) - steps;
  return Math.min(last, Math.max(first, from + steps));
}

export function moveCursor(plot: uPlot, steps: number): void {
  const xs = plot.data[0];
  const [first, last] = plot.series[0]?.idxs ?? [0, xs.length - 1];
  const index = cursorIndex(plot.cursor.idx, steps, first, last);
  const x = xs[index];
  if (x === undefined) return;
  plot.setCursor({ left: plot.valToPos(x, 'x'), top: plot.over.clientHeight / 2 });
}

/** @param whole - the ends of x; the data's own where it is all there (a thinned record's is not) */
export function zoomAboutCursor(plot: uPlot, factor: number, whole = wholeOf(plot)): void {
  const view = viewOf(plot);
  if (view === null || whole === null) return;
  const left = plot.cursor.left ?? -1;
  const about = left >= 0 ? plot.posToVal(left, 'x') : (view.min + view.max) / 2;
  const next = zoomedWindow(view, whole, about, factor);
  if (next) plot.setScale('x', next);
}

export function resetZoom(plot: uPlot, whole = wholeOf(plot)): void {
  if (whole) plot.setScale('x', whole);
}

function viewOf(plot: uPlot): Window | null {
  const { min, max } = plot.scales['x'] ?? {};
  return min === undefined || max === undefined || min === null || max === null
    ? null
    : { min, max };
}

function wholeOf(plot: uPlot): Window | null {
  const xs = plot.data[0];
  const min = xs[0];
  const max = xs[xs.length - 1];
  return min === undefined || max === undefined ? null : { min, max };
}

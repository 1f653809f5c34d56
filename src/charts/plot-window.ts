/** A stretch of an x axis, in its unit. */
export interface Window {
  min: number;
  max: number;
}

/** Below a millionth of the whole there is nothing left to see. */
const leastShare = 1e-6;

/** The window where it lies in the whole, else the whole: kept from another record, it may not. */
export function windowWithin(view: Window | null, whole: Window): Window {
  if (view === null) return whole;
  const min = Math.max(whole.min, view.min);
  const max = Math.min(whole.max, view.max);
  return max - min > (whole.max - whole.min) * leastShare ? { min, max } : whole;
}

/** Narrows or widens a window about a point, kept within the whole; null where nothing changes. */
export function zoomedWindow(
  view: Window,
  whole: Window,
  about: number,
  factor: number,
): Window | null {
  const min = Math.max(whole.min, about - (about - view.min) * factor);
  const max = Math.min(whole.max, about + (view.max - about) * factor);
  if (!(max > min) || (min === view.min && max === view.max)) return null;
  return max - min < (whole.max - whole.min) * leastShare ? null : { min, max };
}

/** Moves a window by a share of its width, as far as the whole goes; null where it can't. */
export function pannedWindow(view: Window, whole: Window, share: number): Window | null {
  const width = view.max - view.min;
  const min = Math.min(whole.max - width, Math.max(whole.min, view.min + share * width));
  return min === view.min || width >= whole.max - whole.min ? null : { min, max: min + width };
}

/** Moves a window just so far that `at` is in it. */
export function windowShowing(view: Window, whole: Window, at: number): Window {
  const width = view.max - view.min;
  if (at >= view.min && at <= view.max) return view;
  const min = at < view.min ? at - 0.1 * width : at - 0.9 * width;
  const kept = Math.min(whole.max - width, Math.max(whole.min, min));
  return { min: kept, max: kept + width };
}

/** Null for the whole: it then stays the whole when another record is shown. */
export function orWhole(view: Window, whole: Window): Window | null {
  return view.min <= whole.min && view.max >= whole.max ? null : view;
}

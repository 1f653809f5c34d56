import type uPlot from 'uplot';

export interface Series {
  x: Float64Array;
  y: Float64Array;
}

/**
 * One table of uPlot for a spectrum with others behind and before it that have lines of their own:
 * these are read off at the spectrum's places, between their lines along the straight line.
 */
export function alignedData(
  spectrum: Series,
  behind: readonly (Series | null)[],
  before: readonly Series[] = [],
): uPlot.AlignedData {
  const read = (series: Series | null) =>
    series === null ? Array.from(spectrum.x, () => null) : readAt(series, spectrum.x);
  return [spectrum.x, ...behind.map(read), spectrum.y, ...before.map(read)];
}

/** Null where there is nothing: a NaN would leave the y scale without an end. */
function readAt({ x, y }: Series, places: Float64Array): (number | null)[] {
  const read = Array<number | null>(places.length).fill(null);
  let right = 0;
  for (let i = 0; i < places.length; i += 1) {
    const place = places[i] ?? 0;
    while (right < x.length && (x[right] ?? 0) < place) right += 1;
    const xRight = x[right];
    const yRight = y[right];
    if (xRight === undefined || yRight === undefined) break;
    const xLeft = x[right - 1] ?? xRight;
    const yLeft = y[right - 1] ?? yRight;
    const share = xRight > xLeft ? (place - xLeft) / (xRight - xLeft) : 1;
    read[i] = yLeft + share * (yRight - yLeft);
  }
  return read;
}

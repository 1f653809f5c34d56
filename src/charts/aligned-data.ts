import type uPlot from 'uplot';

interface Series {
  x: Float64Array;
  y: Float64Array;
}

/**
 * One table of uPlot for a spectrum and, behind it, another one with lines of its own: the second is
 * read off at the first one's places, between its lines along the straight line.
 */
export function alignedData(front: Series, behind: Series | null): uPlot.AlignedData {
  if (behind === null) return [front.x, front.y];
  return [front.x, readAt(behind, front.x), front.y];
}

function readAt({ x, y }: Series, places: Float64Array): (number | null)[] {
  const read: (number | null)[] = [];
  let right = 0;
  for (const place of places) {
    while (right < x.length && (x[right] ?? 0) < place) right += 1;
    const xRight = x[right];
    const yRight = y[right];
    if (xRight === undefined || yRight === undefined) {
      read.push(null);
      continue;
    }
    const xLeft = x[right - 1] ?? xRight;
    const yLeft = y[right - 1] ?? yRight;
    const share = xRight > xLeft ? (place - xLeft) / (xRight - xLeft) : 1;
    read.push(yLeft + share * (yRight - yLeft));
  }
  return read;
}

export interface Decimated {
  /** Positions of the kept samples in the whole record, rising. */
  index: Float64Array;
  value: Float64Array;
  /** Samples that stand behind one kept sample; 1 where all are kept. */
  samplesPerPoint: number;
}

/**
 * Thins a stretch of a record to what a plot can show without losing a peak: of each bucket the
 * least and the greatest sample are kept, in the order in which they come.
 *
 * @param from, to - half-open range of sample positions, cut to the record
 * @param maxPoints - about how many points may remain; at least 4
 * NaN (a gap) never counts as an extreme; a bucket of nothing but NaN keeps one NaN.
 */
export function decimateMinMax(
  samples: ArrayLike<number>,
  from: number,
  to: number,
  maxPoints: number,
): Decimated {
  const start = Math.max(0, Math.floor(from));
  const end = Math.min(samples.length, Math.ceil(to));
  const count = Math.max(0, end - start);
  if (count <= Math.max(4, maxPoints)) {
    const index = new Float64Array(count);
    const value = new Float64Array(count);
    for (let i = 0; i < count; i += 1) {
      index[i] = start + i;
      value[i] = samples[start + i] ?? Number.NaN;
    }
    return { index, value, samplesPerPoint: 1 };
  }
  const buckets = Math.max(2, Math.floor(maxPoints / 2));
  const index = new Float64Array(buckets * 2);
  const value = new Float64Array(buckets * 2);
  let kept = 0;
  const keep = (at: number) => {
    index[kept] = at;
    value[kept] = samples[at] ?? Number.NaN;
    kept += 1;
  };
  for (let bucket = 0; bucket < buckets; bucket += 1) {
    const first = start + Math.floor((bucket * count) / buckets);
    const last = start + Math.floor(((bucket + 1) * count) / buckets);
    const [least, greatest] = extremesOf(samples, first, last);
    if (least < 0) keep(first);
    else if (least === greatest) keep(least);
    else {
      keep(Math.min(least, greatest));
      keep(Math.max(least, greatest));
    }
  }
  return {
    index: index.subarray(0, kept),
    value: value.subarray(0, kept),
    samplesPerPoint: count / kept,
  };
}

/** Positions of the least and the greatest sample of [first, last); −1 where all are NaN. */
function extremesOf(samples: ArrayLike<number>, first: number, last: number): [number, number] {
  let least = -1;
  let greatest = -1;
  let min = Infinity;
  let max = -Infinity;
  for (let i = first; i < last; i += 1) {
    const sample = samples[i] ?? Number.NaN;
    if (sample < min) {
      min = sample;
      least = i;
    }
    if (sample > max) {
      max = sample;
      greatest = i;
    }
  }
  return [least, greatest < 0 ? least : greatest];
}

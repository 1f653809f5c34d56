/** The outline of a stretch of samples: lowest and highest of each of `cells` pieces, −1 to 1. */
export type Sketch = readonly (readonly [number, number])[];

/**
 * Draws samples small: each cell spans what lies in it, scaled to the largest excursion from the
 * mean. Gaps leave their cells empty.
 */
export function sketchOf(samples: Float64Array, cells = 60): Sketch {
  let sum = 0;
  let count = 0;
  for (const value of samples) {
    if (!Number.isFinite(value)) continue;
    sum += value;
    count += 1;
  }
  if (count === 0) return [];
  const mean = sum / count;
  const spans: [number, number][] = [];
  let largest = 0;
  const used = Math.min(cells, samples.length);
  for (let cell = 0; cell < used; cell += 1) {
    const from = Math.floor((cell * samples.length) / used);
    const to = Math.floor(((cell + 1) * samples.length) / used);
    let low = Infinity;
    let high = -Infinity;
    for (let i = from; i < to; i += 1) {
      const value = (samples[i] ?? Number.NaN) - mean;
      if (value < low) low = value;
      if (value > high) high = value;
    }
    if (low > high) spans.push([Number.NaN, Number.NaN]);
    else {
      spans.push([low, high]);
      largest = Math.max(largest, -low, high);
    }
  }
  const scale = largest === 0 ? 1 : largest;
  return spans.map(([low, high]) => [low / scale, high / scale] as const);
}

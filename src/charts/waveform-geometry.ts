/**
 * Times at which turns begin within a stretch; every second, fifth, tenth … turn where they would
 * lie closer than `minStepS`.
 */
export function revolutionTimes(
  revolutionS: number,
  fromS: number,
  toS: number,
  minStepS: number,
): number[] {
  if (!(revolutionS > 0) || !(toS > fromS)) return [];
  let step = revolutionS;
  for (let factor = 1; step < minStepS; factor *= 10) {
    const fit = [2, 5, 10].find((times) => revolutionS * factor * times >= minStepS);
    step = revolutionS * factor * (fit ?? 10);
  }
  const times: number[] = [];
  for (let turn = Math.ceil(fromS / step - 1e-9); turn * step <= toS; turn += 1) {
    times.push(turn * step);
  }
  return times;
}

/** Spans brought in order and joined where less than `gap` lies between them. */
export function mergedSpans(
  spans: readonly (readonly [number, number])[],
  gap: number,
): [number, number][] {
  const sorted = [...spans].sort((a, b) => a[0] - b[0]);
  const merged: [number, number][] = [];
  for (const [from, to] of sorted) {
    const last = merged[merged.length - 1];
    if (last !== undefined && from <= last[1] + gap) last[1] = Math.max(last[1], to);
    else merged.push([from, to]);
  }
  return merged;
}

export interface Stretch {
  fromS: number;
  toS: number;
  min: number;
  max: number;
  rms: number;
}

/** The record in equal parts with the extremes and the rms about zero of each; gaps are left out. */
export function stretchesOf(
  samples: ArrayLike<number>,
  sampleRateHz: number,
  parts: number,
): Stretch[] {
  const count = Math.min(parts, samples.length);
  return Array.from({ length: count }, (_, part) => {
    const first = Math.floor((part * samples.length) / count);
    const last = Math.floor(((part + 1) * samples.length) / count);
    let min = Infinity;
    let max = -Infinity;
    let squares = 0;
    let known = 0;
    for (let i = first; i < last; i += 1) {
      const sample = samples[i] ?? Number.NaN;
      if (Number.isNaN(sample)) continue;
      if (sample < min) min = sample;
      if (sample > max) max = sample;
      squares += sample * sample;
      known += 1;
    }
    return {
      fromS: first / sampleRateHz,
      toS: last / sampleRateHz,
      min: known > 0 ? min : Number.NaN,
      max: known > 0 ? max : Number.NaN,
      rms: known > 0 ? Math.sqrt(squares / known) : Number.NaN,
    };
  });
}

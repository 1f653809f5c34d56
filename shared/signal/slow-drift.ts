import type { SpectrumView } from './spectrum-view.ts';

const blocks = 8;
const slopeEdge = 0.25;
const ordersEdge = 0.4;

/**
 * How far the beginning lies from where the record settles, in rms of its later half; 0 where the
 * means of its blocks do not go one way, as a sensor that settles does.
 */
export function settlingDrift(values: Float64Array): number {
  const size = Math.floor(values.length / blocks);
  if (size < 2) return 0;
  const means = Array.from({ length: blocks }, (_, block) => {
    let sum = 0;
    for (let i = block * size; i < (block + 1) * size; i += 1) sum += values[i] ?? 0;
    return sum / size;
  });
  const half = (blocks / 2) * size;
  const late = means.slice(blocks / 2).reduce((sum, mean) => sum + mean, 0) / (blocks / 2);
  let square = 0;
  for (let i = half; i < blocks * size; i += 1) square += ((values[i] ?? 0) - late) ** 2;
  let all = 0;
  for (const value of values) all += value * value;
  const rms = Math.max(Math.sqrt(square / half), 0.02 * Math.sqrt(all / values.length));
  const away = means.map((mean) => (mean - late) * Math.sign((means[0] ?? 0) - late));
  const falls = away.slice(1, 4).every((value, i) => value <= (away[i] ?? 0));
  return falls && rms > 0 ? (away[0] ?? 0) / rms : 0;
}

/**
 * Power below a quarter of running speed over that of everything above 0.4 of it, in acceleration or
 * velocity (displacement always slopes). A single slow line is no slope.
 */
export function skiSlopeRatio(view: SpectrumView, speedHz: number): number {
  const { stepHz, usableHz } = view;
  const amplitudePeak =
    view.quantity === 'displacement'
      ? view.amplitudePeak.map((value, k) => value * k)
      : view.amplitudePeak;
  let [slow, strongest, rest] = [0, 0, 0];
  const to = Math.floor((slopeEdge * speedHz) / stepHz);
  for (let k = 1; k <= to; k += 1) {
    const power = (amplitudePeak[k] ?? 0) ** 2;
    slow += power;
    strongest = Math.max(strongest, power);
  }
  const last = Math.min(amplitudePeak.length - 1, Math.floor(usableHz / stepHz));
  for (let k = Math.ceil((ordersEdge * speedHz) / stepHz); k <= last; k += 1) {
    rest += (amplitudePeak[k] ?? 0) ** 2;
  }
  // One line through the Hann window holds two thirds of its power in the middle.
  if (to < 1 || rest <= 0 || (to > 6 && strongest > 0.6 * slow)) return 0;
  return slow / rest;
}

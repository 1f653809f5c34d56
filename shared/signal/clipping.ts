/** Samples that sit on one and the same extreme raw value. */
export interface Clipping {
  upper: boolean;
  lower: boolean;
  /** Share of the samples on a rail, 0–1. */
  share: number;
}

/** Samples within this share of the range count as on the rail: a little noise of a fine converter. */
const railShare = 2e-4;
/** The band below the rail that is compared with it. */
const bandShare = 0.02;
const samplesMin = 6;
const sampleShareMin = 5e-4;
const runsMin = 2;
/** Samples on the rail over those in the band below it; a sine's own dwelling reaches 1. */
const crowding = 2;
/** Values closer than this share of the range are one level of the converter. */
const levelApart = 1e-6;
/** A slow crest fills the band as well, yet a sine has a quarter only of what lies in sixteen rail widths in the first of them. */
const nearBand = 16;
const nearShare = 0.6;
/** Two equal samples a crest come of sampling in step with it; three, or a rail with noise on it, don't. */
const longRun = 3;

/**
 * Whether the instrument cut the record off: it clips every excursion at one and the same value, so
 * that the extreme value is crowded, in runs, while the band just below it is not. A machine that
 * truncates its motion does not stop at one raw value.
 *
 * @param samples - as recorded; non-finite ones are passed over
 */
export function findClipping(samples: Float64Array): Clipping {
  let [low, high] = [Infinity, -Infinity];
  for (const value of samples) {
    if (!Number.isFinite(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const range = high - low;
  if (!(range > 0)) return { upper: false, lower: false, share: 0 };
  const upper = rail(samples, high, range);
  const lower = rail(samples, low, -range);
  return {
    upper: upper.clipped,
    lower: lower.clipped,
    share: ((upper.clipped ? upper.count : 0) + (lower.clipped ? lower.count : 0)) / samples.length,
  };
}

/** @param range - signed: from the rail back to the other extreme, taken away from `extreme` */
function rail(samples: Float64Array, extreme: number, range: number) {
  let [count, runs, run, longest, same] = [0, 0, 0, 0, 0];
  const levels = [1, 1, 1];
  const [first, second, third] = [0, 1, 2];
  for (let i = 0; i < samples.length; i += 1) {
    const away = (extreme - (samples[i] ?? NaN)) / range;
    if (away <= railShare) {
      count += 1;
      if (away === 0) same += 1;
      run += 1;
      if (run === 2) runs += 1;
      longest = Math.max(longest, run);
      continue;
    }
    run = 0;
    // The nearest levels in use below the rail: a coarse converter has few within the band.
    if (!(away < (levels[third] ?? 1))) continue;
    if (away < (levels[first] ?? 1) - levelApart) levels.unshift(away);
    else if (away > (levels[first] ?? 1) + levelApart) {
      if (away < (levels[second] ?? 1) - levelApart) levels.splice(1, 0, away);
      else if (away > (levels[second] ?? 1) + levelApart) levels.splice(2, 0, away);
    }
    levels.length = 3;
  }
  if (count < Math.max(samplesMin, sampleShareMin * samples.length) || runs < runsMin) {
    return { clipped: false, count };
  }
  const band = Math.max(bandShare, (levels[third] ?? 1) + levelApart);
  const nearEnd = Math.min(0.5, nearBand * Math.max(railShare, levels[first] ?? 1));
  let [below, near] = [0, 0];
  for (let i = 0; i < samples.length; i += 1) {
    const away = (extreme - (samples[i] ?? NaN)) / range;
    if (away > railShare && away <= band) below += 1;
    if (away <= nearEnd) near += 1;
  }
  const inStep = longest < longRun && 2 * same > count;
  const crowded = count > crowding * below || (!inStep && count > nearShare * near);
  return { clipped: crowded, count };
}

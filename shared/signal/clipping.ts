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
  let [count, runs, run] = [0, 0, 0];
  const levels = [1, 1, 1];
  const [first, second, third] = [0, 1, 2];
  for (let i = 0; i < samples.length; i += 1) {
    const away = (extreme - (samples[i] ?? NaN)) / range;
    if (away <= railShare) {
      count += 1;
      run += 1;
      if (run === 2) runs += 1;
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
  let below = 0;
  for (let i = 0; i < samples.length; i += 1) {
    const away = (extreme - (samples[i] ?? NaN)) / range;
    if (away > railShare && away <= band) below += 1;
  }
  return { clipped: count > crowding * below, count };
}

const slopeRailShare = 0.03;
const slopeSamplesMin = 0.03;
const slopeCrowding = 8;

/**
 * Whether the record was cut off before the instrument integrated it: then its steps from sample to
 * sample crowd at one extreme value, which integration and its high-pass leave nearly even.
 *
 * Displacement is left alone: its second differences show the converter's steps.
 *
 * @param values - prepared samples in velocity
 */
export function clippedBeforeIntegration(values: Float64Array): boolean {
  const steps = differences(values);
  const sorted = steps.slice().sort();
  const [low, high] = [sorted[0] ?? 0, sorted[sorted.length - 1] ?? 0];
  const range = high - low;
  if (!(range > 0)) return false;
  const near = (from: number, to: number, up: boolean) => {
    let count = 0;
    for (const step of steps) {
      const away = (up ? high - step : step - low) / range;
      if (away >= from && away < to) count += 1;
    }
    return count / steps.length;
  };
  return [true, false].some((up) => {
    const share = near(0, slopeRailShare, up);
    return (
      share > slopeSamplesMin &&
      share > slopeCrowding * near(slopeRailShare, 2 * slopeRailShare, up)
    );
  });
}

function differences(values: Float64Array): Float64Array {
  const out = new Float64Array(Math.max(0, values.length - 1));
  for (let i = 0; i < out.length; i += 1) out[i] = (values[i + 1] ?? 0) - (values[i] ?? 0);
  return out;
}

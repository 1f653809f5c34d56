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

/** On the rail: this near to the extreme step, over the range of steps; the integrator's high-pass lets the rail drift. */
const stepRailShare = 0.075;
/** A step counts as held where it differs from the one before by less than this share of the usual. */
const heldShare = 0.1;
const heldMin = 0.45;
/** Steps so near to their extreme are this much more than those beside them where wide noise was cut off. */
const crowdShare = 0.02;
const crowdMin = 0.08;
const crowdFactor = 8;
const stepsMin = 8;
const stepShareMin = 1e-3;
/** Differences below this share of the peak are rounding. */
const roundingShare = 1e-9;
/** With fewer of the converter's own steps in the largest one, equal steps mean nothing. */
const quantaMin = 120;

/**
 * Whether the record was cut off before the instrument integrated it. Its steps from sample to
 * sample (their differences, if integrated twice) then stand still at the rail, where those of a
 * sound record pass their extreme. The high-pass of the integrator tilts the rail, so that standing
 * still tells it, not one value.
 *
 * @param values - prepared samples in velocity (once integrated) or displacement (twice)
 */
export function clippedBeforeIntegration(values: Float64Array, times: 1 | 2 = 1): boolean {
  const steps = times === 1 ? differences(values) : differences(differences(values));
  let [low, high, smallest, squares, peak] = [Infinity, -Infinity, Infinity, 0, 0];
  for (let i = 0; i < values.length; i += 1) peak = Math.max(peak, Math.abs(values[i] ?? 0));
  for (let i = 1; i < steps.length; i += 1) {
    const step = steps[i] ?? 0;
    if (step > high) high = step;
    if (step < low) low = step;
    const change = Math.abs(step - (steps[i - 1] ?? 0));
    if (change < smallest && change > roundingShare * peak) smallest = change;
    squares += change * change;
  }
  if (!(high - low > quantaMin * smallest)) return false;
  const reach = stepRailShare * (high - low);
  const crowdReach = crowdShare * (high - low);
  const held = heldShare * Math.sqrt(squares / steps.length);
  return [high, low].some((rail) => {
    let [onRail, still, crowd, beside] = [0, 0, 0, 0];
    for (let i = 1; i < steps.length; i += 1) {
      const step = steps[i] ?? 0;
      const away = Math.abs(step - rail);
      if (away > reach) continue;
      if (away < crowdReach) crowd += 1;
      else if (away < 2 * crowdReach) beside += 1;
      onRail += 1;
      if (Math.abs(step - (steps[i - 1] ?? 0)) < held) still += 1;
    }
    return (
      (onRail >= Math.max(stepsMin, stepShareMin * steps.length) && still > heldMin * onRail) ||
      (crowd > crowdMin * steps.length && crowd > crowdFactor * beside)
    );
  });
}

function differences(values: Float64Array): Float64Array {
  const out = new Float64Array(Math.max(0, values.length - 1));
  for (let i = 0; i < out.length; i += 1) out[i] = (values[i + 1] ?? 0) - (values[i] ?? 0);
  return out;
}

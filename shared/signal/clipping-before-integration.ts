import { differentiate, type IntegrationRule } from './differentiate.ts';

/** On the rail: this near to the extreme step, over the range of steps; the integrator's high-pass lets the rail drift. */
const stepRailShare = 0.075;
/** A step counts as held where it differs from the one before by less than this share of the usual. */
const heldShare = 0.1;
const heldMin = 0.45;
/**
 * Distances from the extreme, over the range, within which values may crowd. A smooth crest has twice
 * as many within four times the distance, a tail of noise more; a rail hardly any more.
 */
const crowdDistances: readonly number[] = [0.004, 0.008, 0.016, 0.03];
const crowdGrowth = 1.6;
/** Standard deviations by which the crowd must exceed half of what lies within four times the distance. */
const crowdSigmas = 5;
/** Where so many of all crests are the highest, the record is a sine sampled in step with it. */
const crestShareMax = 0.9;
const stepsMin = 8;
const stepShareMin = 1e-3;
/** Differences below this share of the peak are rounding. */
const roundingShare = 1e-9;
/** With fewer of the converter's own steps in the largest one, equal steps mean nothing. */
const quantaMin = 120;
const rules: readonly IntegrationRule[] = ['spectral', 'trapezoidal'];
const endShare = 0.02;

/**
 * Whether the record was cut off before the instrument integrated it. Its steps from sample to
 * sample (their differences, if integrated twice) then stand still at the rail, where those of a
 * sound record pass their extreme. The high-pass of the integrator tilts the rail, so that standing
 * still tells it, not one value.
 *
 * @param values - prepared samples in velocity (once integrated) or displacement (twice)
 */
export function clippedBeforeIntegration(values: Float64Array, times: 1 | 2 = 1): boolean {
  let peak = 0;
  for (let i = 0; i < values.length; i += 1) peak = Math.max(peak, Math.abs(values[i] ?? 0));
  const steps = times === 1 ? differences(values) : differences(differences(values));
  if (!isFine(steps, peak)) return false;
  if (standsAtRail(steps)) return true;
  return rules.some((rule) => {
    let undone = differentiate(values, rule);
    if (times === 2) undone = differentiate(undone, rule);
    // The ends ring.
    const end = Math.round(endShare * undone.length);
    return standsAtRail(undone.subarray(end, undone.length - end));
  });
}

/** Whether the converter's own steps are small beside those of the record. */
function isFine(steps: Float64Array, peak: number): boolean {
  let [low, high, smallest] = [Infinity, -Infinity, Infinity];
  for (let i = 1; i < steps.length; i += 1) {
    const step = steps[i] ?? 0;
    if (step > high) high = step;
    if (step < low) low = step;
    const change = Math.abs(step - (steps[i - 1] ?? 0));
    if (change < smallest && change > roundingShare * peak) smallest = change;
  }
  return high - low > quantaMin * smallest;
}

/** Whether the values at one extreme stand still there, or crowd there. */
function standsAtRail(steps: Float64Array): boolean {
  let [low, high, squares] = [Infinity, -Infinity, 0];
  for (let i = 0; i < steps.length; i += 1) {
    const step = steps[i] ?? 0;
    if (step > high) high = step;
    if (step < low) low = step;
    const change = i > 0 ? step - (steps[i - 1] ?? 0) : 0;
    squares += change * change;
  }
  const held = heldShare * Math.sqrt(squares / steps.length);
  return [high, low].some(
    (rail) => holdsStill(steps, rail, high - low, held) || crowdsAt(steps, rail, high - low),
  );
}

function holdsStill(steps: Float64Array, rail: number, range: number, held: number): boolean {
  let [onRail, still] = [0, 0];
  for (let i = 1; i < steps.length; i += 1) {
    const step = steps[i] ?? 0;
    if (Math.abs(step - rail) > stepRailShare * range) continue;
    onRail += 1;
    if (Math.abs(step - (steps[i - 1] ?? 0)) < held) still += 1;
  }
  return onRail >= Math.max(stepsMin, stepShareMin * steps.length) && still > heldMin * onRail;
}

function crowdsAt(steps: Float64Array, rail: number, range: number): boolean {
  const counts = new Float64Array(crowdDistances.length);
  const wider = new Float64Array(crowdDistances.length);
  let [crests, highest] = [0, 0];
  for (let i = 1; i + 1 < steps.length; i += 1) {
    const away = Math.abs((steps[i] ?? 0) - rail) / range;
    const isCrest =
      away < 0.5 &&
      away <= Math.abs((steps[i - 1] ?? 0) - rail) / range &&
      away <= Math.abs((steps[i + 1] ?? 0) - rail) / range;
    if (isCrest) crests += 1;
    if (isCrest && away < (crowdDistances[0] ?? 0)) highest += 1;
    crowdDistances.forEach((distance, i) => {
      if (away < distance) counts[i] = (counts[i] ?? 0) + 1;
      if (away < 4 * distance) wider[i] = (wider[i] ?? 0) + 1;
    });
  }
  return crowdDistances.some((_, i) => {
    const [near, far] = [counts[i] ?? 0, wider[i] ?? 0];
    return (
      far < crowdGrowth * near &&
      near - far / 2 > (crowdSigmas * Math.sqrt(far)) / 2 &&
      highest < crestShareMax * crests
    );
  });
}

function differences(values: Float64Array): Float64Array {
  const out = new Float64Array(Math.max(0, values.length - 1));
  for (let i = 0; i < out.length; i += 1) out[i] = (values[i + 1] ?? 0) - (values[i] ?? 0);
  return out;
}

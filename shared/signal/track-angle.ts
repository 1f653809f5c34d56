import type { BandVelocity } from './band-velocity.ts';
import { medianInPlace } from './noise-floor.ts';
import { orderSegments, segmentTurns, type OrderSegments } from './order-spectra.ts';
import { pointsPerTurn, steadyRunning, toShaftAngle, type AngleDeviation } from './shaft-angle.ts';

/** The record over the shaft angle, with slow changes of speed followed. */
export interface TrackedRecord {
  /** Mean speed over the record, Hz. */
  speedHz: number;
  /** mm/s, `pointsPerTurn` a turn. */
  velocity: Float64Array;
  deviation: AngleDeviation;
  /** Order whose phase was followed; null where none was strong and steady enough. */
  trackedOrder: number | null;
  /** Standard deviation of the speed inside the record, relative. */
  wander: number;
}

interface Phase {
  order: number;
  /** Turns the shaft is ahead, segment by segment. */
  turns: Float64Array;
  /** Standard deviation that noise alone gives one of them, turns. */
  noiseTurns: number;
}

const fineTurns = 8;
const hopTurns = 2;
const followedMost = 150;
const segmentsMin = 5;
const highestTracked = 10;
/** Power over noise in a segment from which a phase can be followed. */
const followRatio = 25;
/** Phase steps from segment to segment above which the unwrapping is not to be trusted, rad. */
const stepMax = 1.2;
const rounds = 2;
/** A correction of the mean speed by more lines of the whole record follows some other line. */
const shiftMaxLines = 1.2;
/** By how much the family must gain, in nepers of power over all orders, for the following to be believed. */
const gainMin = 0.15;
const sharpOrders = 20;
/** Deviations this much larger than noise alone gives are wander. */
const wanderOverNoise = 5;
/** Turns of the highest order followed that cost it less than a hundredth of its power. */
const worthTurns = 0.03;

/**
 * Follows the phase of the strongest low order from segment to segment (demodulation), takes what
 * it tells of the shaft angle out, and once more with a higher order: so that the tenth order is as
 * sharp as the first.
 *
 * @param speedHz - the speed as found from the spectrum of the whole record
 */
export function trackAngle(band: BandVelocity, speedHz: number): TrackedRecord {
  let deviation = steadyRunning;
  let velocity = toShaftAngle(band, speedHz, deviation);
  let trackedOrder: number | null = null;
  let current = speedHz;
  let noiseTurns = Infinity;
  let sharp: number | null = null;
  const durationS = band.mmPerS.length / band.rateHz;
  for (let round = 0; round < rounds; round += 1) {
    const turnsInAll = velocity.length / pointsPerTurn;
    if (turnsInAll < fineTurns + (segmentsMin - 1) * hopTurns) break;
    // Long records in longer steps: the store of segments is limited.
    const hop = Math.max(hopTurns, Math.ceil(turnsInAll / followedMost));
    const phase = bestPhase(
      orderSegments(halved(velocity), fineTurns, hop, pointsPerTurn / 2),
      round === 0 ? 3 : highestTracked,
    );
    if (phase === null) break;
    const added = smooth(phase.turns);
    const stepS = hop / current;
    const fromS = fineTurns / 2 / current;
    const base = deviation;
    const total = new Float64Array(added.length);
    for (let s = 0; s < total.length; s += 1) {
      total[s] = (added[s] ?? 0) + at(base, fromS + s * stepS);
    }
    const { slope, rest } = takeLine(total);
    const tried = current + slope / stepS;
    if (Math.abs(tried - speedHz) * durationS > shiftMaxLines) break;
    // Where even the tenth order loses nothing, there is nothing to gain.
    const most = total.reduce((peak, turn) => Math.max(peak, Math.abs(turn - (total[0] ?? 0))), 0);
    if (most * highestTracked < worthTurns) break;
    sharp ??= sharpness(velocity);
    const followed = { fromS, stepS, turns: rest };
    const resampled = toShaftAngle(band, tried, followed);
    const sharper = sharpness(resampled);
    if (sharper < sharp + gainMin) break;
    [current, deviation, velocity, sharp] = [tried, followed, resampled, sharper];
    trackedOrder = phase.order;
    noiseTurns = phase.noiseTurns;
  }
  return {
    speedHz: current + meanDriftHz(deviation, noiseTurns),
    velocity,
    deviation,
    trackedOrder,
    wander: wanderOf(deviation, current),
  };
}

/** How far the family stands out as a whole: the sum over orders of ln(power over the lines beside). */
function sharpness(velocity: Float64Array): number {
  const turns = segmentTurns(velocity.length / pointsPerTurn);
  const segments = orderSegments(velocity, turns, turns);
  let sum = 0;
  for (let order = 1; order <= sharpOrders; order += 1) {
    sum += Math.log(Math.max(1, signalRatio(segments, order)));
  }
  return sum;
}

/**
 * Half as many points a turn: what orders above the sixteenth fold down to whole orders keeps its
 * phase to the shaft, and so tells no drift.
 */
function halved(velocity: Float64Array): Float64Array {
  const out = new Float64Array(velocity.length >> 1);
  for (let i = 0; i < out.length; i += 1) {
    out[i] = 0.5 * ((velocity[2 * i] as number) + (velocity[2 * i + 1] as number));
  }
  return out;
}

/** The order whose phase is known best; an order's phase is worth the more the higher it is. */
function bestPhase(fine: OrderSegments, highest: number): Phase | null {
  if (fine.segments.length < segmentsMin) return null;
  let best: Phase | null = null;
  for (let order = 1; order <= highest; order += 1) {
    const ratio = signalRatio(fine, order);
    if (ratio < followRatio) continue;
    const phase = followPhase(fine, order);
    if (phase === null) continue;
    const noiseTurns = 1 / (2 * Math.PI * order * Math.sqrt(2 * ratio));
    if (best === null || noiseTurns < best.noiseTurns) best = { order, turns: phase, noiseTurns };
  }
  return best;
}

/** Power of an order over that of the lines beside it, averaged over the segments. */
function signalRatio({ segments, linesPerOrder }: OrderSegments, order: number): number {
  const centre = order * linesPerOrder;
  const beside = new Float64Array(linesPerOrder);
  let power = 0;
  let count = 0;
  for (let k = centre - linesPerOrder / 2; k <= centre + linesPerOrder / 2; k += 1) {
    let sum = 0;
    for (const lines of segments) sum += (lines[2 * k] ?? 0) ** 2 + (lines[2 * k + 1] ?? 0) ** 2;
    if (k === centre) power = sum;
    else if (Math.abs(k - centre) > 1) beside[count++] = sum;
  }
  const floor = medianInPlace(beside, count);
  return floor > 0 ? power / floor : power > 0 ? 1e12 : 0;
}

/** Unwrapped phase of an order in turns of the shaft; null where its steps are too large. */
function followPhase(
  { segments, linesPerOrder }: OrderSegments,
  order: number,
): Float64Array | null {
  const at = 2 * order * linesPerOrder;
  const turns = new Float64Array(segments.length);
  let [last, phase, steps] = [0, 0, 0];
  segments.forEach((lines, s) => {
    const here = Math.atan2(lines[at + 1] ?? 0, lines[at] ?? 0);
    if (s > 0) {
      let step = here - last;
      step -= 2 * Math.PI * Math.round(step / (2 * Math.PI));
      phase += step;
      steps += step * step;
    }
    last = here;
    turns[s] = phase / (2 * Math.PI * order);
  });
  return Math.sqrt(steps / Math.max(1, segments.length - 1)) > stepMax ? null : turns;
}

function smooth(values: Float64Array): Float64Array {
  return values.map((value, i) => {
    const [before, after] = [values[i - 1] ?? value, values[i + 1] ?? value];
    return i === 0 || i === values.length - 1 ? value : (before + 2 * value + after) / 4;
  });
}

/** Takes the least-squares line out; its slope is a correction of the mean speed. */
function takeLine(values: Float64Array): { slope: number; rest: Float64Array } {
  const middle = (values.length - 1) / 2;
  let [sum, above, below] = [0, 0, 0];
  values.forEach((value, i) => {
    sum += value;
    above += (i - middle) * value;
    below += (i - middle) ** 2;
  });
  const slope = below > 0 ? above / below : 0;
  const mean = sum / Math.max(1, values.length);
  return { slope, rest: values.map((value, i) => value - mean - slope * (i - middle)) };
}

/**
 * The least-squares line through a shaft angle that wanders is not its mean speed, which is what the
 * record's turns over its duration give; where nothing but noise is left, the line is the better.
 */
function meanDriftHz({ stepS, turns }: AngleDeviation, noiseTurns: number): number {
  if (turns.length < segmentsMin) return 0;
  const rms = Math.sqrt(turns.reduce((sum, turn) => sum + turn * turn, 0) / turns.length);
  if (!(rms > wanderOverNoise * noiseTurns)) return 0;
  return ((turns.at(-1) ?? 0) - (turns[0] ?? 0)) / ((turns.length - 1) * stepS);
}

function at({ fromS, stepS, turns }: AngleDeviation, timeS: number): number {
  if (turns.length < 2) return 0;
  const place = Math.max(0, Math.min(turns.length - 1, (timeS - fromS) / stepS));
  const left = Math.min(turns.length - 2, Math.floor(place));
  const [a, b] = [turns[left] ?? 0, turns[left + 1] ?? 0];
  return a + (b - a) * (place - left);
}

function wanderOf({ stepS, turns }: AngleDeviation, speedHz: number): number {
  if (turns.length < 3) return 0;
  let sum = 0;
  for (let s = 1; s < turns.length; s += 1) {
    sum += (((turns[s] ?? 0) - (turns[s - 1] ?? 0)) / stepS / speedHz) ** 2;
  }
  return Math.sqrt(sum / (turns.length - 1));
}

import type { MachineFacts, SpeedReading } from './screening-types.ts';
import { peakNear, type SpectrumView } from './spectrum-view.ts';

const defaultTolerance = 0.03;
const flankShare = 0.03;
/** Base-2 logarithm that the strongest of three noise lines passes once in ten times. */
const noiseSays = 2.2;
const ordersUsed = 12;
const orderWeights = Array.from(
  { length: ordersUsed + 1 },
  (_, order) => 1 / Math.sqrt(order || 1),
);
const scanStepsMax = 40_000;
/** A line's say in the family is capped: one strong line of something else must not decide. */
const sayMax = Math.log2(1 + 300);
/** A refined line further than this from its place belongs to something else, lines. */
const outlierLines = 0.6;
/** Standard error of an interpolated Hann line at a power ratio of 1, lines (close to the Cramér–Rao bound times 1.2). */
const lineErrorAtUnity = 0.55;
/** Speeds a line apart are as many independent ones to the family: its middle order moves so many lines. */
const independentPerLine = 6;
const supportRatio = 12;

/** Every line's say: the logarithm of the strongest of three lines over the floor, capped. */
function sayings(view: SpectrumView): Float64Array {
  const { ratio } = view;
  const say = new Float64Array(ratio.length);
  for (let i = 1; i < ratio.length - 1; i += 1) {
    const best = Math.max(ratio[i - 1] ?? 0, ratio[i] ?? 0, ratio[i + 1] ?? 0);
    // Above the cap a line still says a little: the middle of a strong line must beat its flanks.
    // What noise says as a rule is taken off: over many orders it would outweigh one strong line.
    const said = Math.max(0, Math.log2(1 + best) - noiseSays);
    say[i] = Math.min(sayMax, said) + flankShare * said;
  }
  return say;
}

/** How well a speed explains the spectrum's lines: the family of its orders, early ones more. */
function familyScore(say: Float64Array, view: SpectrumView, speedHz: number): number {
  let score = 0;
  const orders = Math.min(ordersUsed, Math.floor(view.usableHz / speedHz));
  for (let order = 1; order <= orders; order += 1) {
    score += (say[Math.round((order * speedHz) / view.stepHz)] ?? 0) * (orderWeights[order] ?? 0);
  }
  return score;
}

function bestIn(
  say: Float64Array,
  view: SpectrumView,
  fromHz: number,
  toHz: number,
): { speedHz: number; score: number } {
  // Fine enough for the tenth order to stay within a line.
  const step = Math.max(view.stepHz / 12, (toHz - fromHz) / scanStepsMax);
  let best = { speedHz: (fromHz + toHz) / 2, score: -1 };
  for (let speedHz = fromHz; speedHz <= toHz; speedHz += step) {
    const score = familyScore(say, view, speedHz);
    if (score > best.score) best = { speedHz, score };
  }
  return best;
}

/** Refines by weighted least squares over every order's interpolated line. */
function refine(view: SpectrumView, speedHz: number) {
  let current = speedHz;
  let spread = view.stepHz;
  let support = 0;
  for (let round = 0; round < 3; round += 1) {
    let [weights, sum] = [0, 0];
    support = 0;
    for (let order = 1; order <= 20; order += 1) {
      if (order * current > view.usableHz) break;
      const peak = peakNear(view, order * current, 1.5);
      if (peak === null) continue;
      const ratio = view.ratio[peak.index] ?? 0;
      const missLines = Math.abs(peak.frequencyHz - order * current) / view.stepHz;
      if (ratio < supportRatio || (round > 0 && missLines > outlierLines)) continue;
      const error = (lineErrorAtUnity * view.stepHz) / Math.sqrt(Math.min(ratio, 1e8)) / order;
      weights += 1 / error ** 2;
      sum += peak.frequencyHz / order / error ** 2;
      support += 1;
    }
    if (weights === 0) break;
    current = sum / weights;
    spread = 1 / Math.sqrt(weights);
  }
  return { speedHz: current, spread, support };
}

const notFound = {
  speedHz: null,
  source: 'none',
  intervalHz: null,
  alternatives: [],
  supported: false,
  speedsTried: 1,
} as const;

/**
 * Running speed of the position's shaft from the whole family of its orders: a told speed refined
 * within its tolerance, or one estimated within the machine's range; where no line tells, the told
 * or else the nominal speed stands.
 *
 * @param toldSpeedRpm - of the machine; the position's shaft turns at that times its ratio
 * @returns also whether lines support the speed, and how many independent speeds it was chosen from
 */
export function findSpeed(
  view: SpectrumView,
  toldSpeedRpm: number | undefined,
  tolerance: number | undefined,
  machine: MachineFacts | undefined,
): SpeedReading & { supported: boolean; speedsTried: number } {
  const ratio = machine?.shaftRatio ?? 1;
  const told = toldSpeedRpm !== undefined && toldSpeedRpm > 0 ? (toldSpeedRpm / 60) * ratio : null;
  const range = rangeOf(told, tolerance, machine, view);
  if (range === null) return notFound;
  const say = sayings(view);
  const toldBest = bestIn(say, view, range[0], range[1]);
  if (told !== null) {
    const own = rangeOf(null, undefined, machine, view);
    if (own !== null && knowsItsSpeed(machine) && (told < own[0] || told > own[1])) {
      // A told speed the machine can't run at is a slip of the pen, unless the lines say otherwise.
      const ownBest = bestIn(say, view, own[0], own[1]);
      if (ownBest.score > toldBest.score) {
        const found = findSpeed(view, undefined, undefined, machine);
        const reason = `the told speed lies outside the machine’s range of ${(own[0] * 60).toFixed(0)} to ${(own[1] * 60).toFixed(0)} r/min, and the lines say less for it`;
        return { ...found, alternatives: [...found.alternatives, { speedHz: told, reason }] };
      }
    }
  }
  const { speedHz, spread, support } = refine(view, toldBest.speedHz);
  const inside = speedHz >= range[0] * 0.999 && speedHz <= range[1] * 1.001;
  const supported = support > 0 && inside;
  if (!supported) {
    const nominalRpm = machine?.nominalSpeedRpm;
    const assumed = told ?? (nominalRpm === undefined ? null : (nominalRpm / 60) * ratio);
    if (assumed === null) {
      return notFound;
    }
    const width = assumed * (tolerance ?? defaultTolerance);
    return {
      ...notFound,
      speedHz: assumed,
      source: told === null ? 'estimated' : 'told',
      intervalHz: told === null ? range : [assumed - width, assumed + width],
    };
  }
  return {
    speedHz,
    source: told === null ? 'estimated' : 'refined',
    intervalHz: [speedHz - 1.96 * spread, speedHz + 1.96 * spread],
    alternatives: alternativesOf(say, view, speedHz, machine, told === null),
    supported,
    speedsTried: Math.max(1, ((range[1] - range[0]) / view.stepHz) * independentPerLine),
  };
}

const knowsItsSpeed = (machine: MachineFacts | undefined) =>
  machine?.nominalSpeedRpm !== undefined ||
  (machine?.speedMinRpm !== undefined && machine.speedMaxRpm !== undefined);

function rangeOf(
  told: number | null,
  tolerance: number | undefined,
  machine: MachineFacts | undefined,
  view: SpectrumView,
): [number, number] | null {
  const ratio = machine?.shaftRatio ?? 1;
  if (told !== null) {
    const share = tolerance ?? defaultTolerance;
    return [told * (1 - share), told * (1 + share)];
  }
  if (machine?.speedMinRpm !== undefined && machine.speedMaxRpm !== undefined) {
    return [(machine.speedMinRpm / 60) * ratio * 0.98, (machine.speedMaxRpm / 60) * ratio * 1.02];
  }
  if (machine?.nominalSpeedRpm !== undefined) {
    return [
      (machine.nominalSpeedRpm / 60) * ratio * 0.9,
      (machine.nominalSpeedRpm / 60) * ratio * 1.05,
    ];
  }
  const top = Math.min(130, view.usableHz / 5);
  const bottom = Math.max(4, 8 * view.stepHz);
  return bottom < top ? [bottom, top] : null;
}

function alternativesOf(
  say: Float64Array,
  view: SpectrumView,
  speedHz: number,
  machine: MachineFacts | undefined,
  estimated: boolean,
): SpeedReading['alternatives'] {
  const found: { speedHz: number; reason: string }[] = [];
  if (estimated) {
    const own = familyScore(say, view, speedHz);
    for (const [factor, words] of [
      [0.5, 'half'],
      [2, 'double'],
    ] as const) {
      if (familyScore(say, view, speedHz * factor) > 0.85 * own) {
        found.push({
          speedHz: speedHz * factor,
          reason: `${words} the speed explains the lines about as well`,
        });
      }
    }
  }
  const line = machine?.lineFrequencyHz;
  if (line !== undefined && Math.abs(speedHz - line) < 2 * view.stepHz) {
    found.push({ speedHz: line, reason: 'the line frequency stands next to 1×' });
  }
  return found;
}

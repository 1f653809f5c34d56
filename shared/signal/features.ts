import type { AveragedRevolution } from './averaged-revolution.ts';
import { standsOut } from './harmonic-run.ts';
import { medianInPlace } from './noise-floor.ts';
import type { OrderSpectrum } from './order-spectra.ts';
import type { HarmonicRun, MachineFacts, OrderLine, Truncation } from './screening-types.ts';
import { momentsOf } from './turn-shape.ts';

/** The numbers that the score is made of; each also stands in a sentence of the evidence. */
export interface ScreeningFeatures {
  /** Whole orders 2–10 that stand out and nothing else explains. */
  openOrdersOut: number;
  /** Whole orders 11–20 that stand out and nothing else explains. */
  highOrdersOut: number;
  /** Of orders 4–10, those at least a tenth as strong as the strongest order. */
  strongHighOrders: number;
  /** Longest run of whole orders that stand out, of the first ten. */
  runLength: number;
  /** Velocity of orders 2–10 together over that of 1×. */
  runOverFirst: number;
  /** Level of orders 2 and 3, and of 4 to 10, over that of 1× to 3×, dB; −60 at the least. */
  lowOrdersDb: number;
  highOverLowDb: number;
  /** Median of how far orders 2–10 stand out, dB. */
  medianProminenceDb: number;
  /** Mean of how far orders 1–10 stand out, 0 to 30 dB each, and how far 1× does. */
  meanProminenceDb: number;
  firstProminenceDb: number;
  /** Mean size of the second differences of the levels from order to order, dB: a process or a resonance lifts single orders. */
  unevennessDb: number;
  /** How far the levels of orders 1–10 scatter about a straight line over order, dB rms. */
  roughnessDb: number;
  /** How far the strongest order stands above the stronger of the two beside it, dB. */
  aloneDb: number;
  /** Velocity of 3×, mm/s rms. */
  thirdMmPerS: number;
  /** Half and third orders that stand out, and the level of the strongest against the strongest order, dB. */
  fractions: number;
  halfDb: number;
  thirdDb: number;
  /** Share of the velocity power up to order 20 that is synchronous with the shaft, 0–1. */
  synchronousShare: number;
  /** Power of orders 2–10 that keeps its phase to the shaft, over all at these orders, 0–1. */
  steadiness: number;
  /** Strongest line that belongs to no whole, half or third order, against the strongest order, dB. */
  strangerDb: number;
  /** Noise between the orders up to the tenth against the strongest order, a line, dB. */
  floorDb: number;
  /** Velocity of all orders together, and of orders 2 to 10, mm/s rms. */
  familyMmPerS: number;
  runMmPerS: number;
  /** 1 where the averaged revolution is flattened by the machine. */
  truncated: number;
  /** Skewness (size) and excess kurtosis of the averaged turn in displacement and acceleration. */
  displacementSkew: number;
  displacementKurtosis: number;
  accelerationSkew: number;
  accelerationKurtosis: number;
  /** 1 for a machine whose process itself gives running-speed families (reciprocating). */
  familyByNature: number;
  /** Share of the orders' power that known sources explain, 0–1. */
  explainedShare: number;
}

const strongShare = 0.1;
/** Some thirty fractions are looked at: one of a thousand by luck would come up in every thirtieth record. */
const fractionBelowP = 3e-5;
const leastDb = -60;
const isWhole = (order: number) => Number.isInteger(order);
const isHalf = (order: number) => Number.isInteger(order * 2) && !isWhole(order);
/** Noise alone leaves so many times a line's floor in an order: three lines over the window's lobe. */
const noiseInOrder = 2;
/** An order of a larger chance than this says nothing of its level. */
const levelBelowP = 3e-3;
/** Power of an order beyond what the noise under it gives: loud noise is no strong order. */
const excess = (line: OrderLine) =>
  line.pNoise > levelBelowP
    ? 0
    : Math.max(0, line.velocityMmPerSRms ** 2 - noiseInOrder * line.floorMmPerSRms ** 2);
const powerOf = (lines: readonly OrderLine[]) => lines.reduce((sum, line) => sum + excess(line), 0);
const db = (power: number, over: number, least = leastDb) =>
  over > 0 && power > 0 ? Math.max(least, 10 * Math.log10(power / over)) : least;

/** What the steps before have found, for the features to be taken from. */
export interface FeatureSources {
  spectrum: OrderSpectrum;
  usableOrders: number;
  orders: readonly OrderLine[];
  run: HarmonicRun;
  truncation: Truncation;
  revolution: AveragedRevolution;
  machine?: MachineFacts;
}

/** Words in a machine's kind that tell of cranks and pistons. */
const reciprocating = /reciprocating|piston|plunger|engine|diesel|crank/i;

/** Takes the features from what the steps before have found. */
export function featuresOf(sources: FeatureSources): ScreeningFeatures {
  const { spectrum, orders, run, truncation, revolution } = sources;
  const whole = orders.filter((line) => isWhole(line.order));
  const strongest = Math.max(1e-9, ...whole.map((line) => line.velocityMmPerSRms));
  const within = (from: number, to: number) => (line: OrderLine) =>
    line.order >= from && line.order <= to;
  const counts = (line: OrderLine) => line.explainedBy === null && standsOut(line, strongest);
  const open = whole.filter(counts);
  const run2to10 = open.filter(within(2, 10));
  const fractionsOf = (test: (order: number) => boolean) =>
    orders.filter(
      (line) =>
        test(line.order) &&
        line.order < 10 &&
        counts(line) &&
        line.pNoise < fractionBelowP &&
        isSharp(spectrum, line.order),
    );
  const halves = fractionsOf(isHalf);
  const thirds = fractionsOf((order) => !isWhole(order) && !isHalf(order));
  const top = (lines: readonly OrderLine[]) =>
    lines.reduce((most, line) => Math.max(most, excess(line)), 0);
  const levelOf = (order: number) =>
    Math.sqrt(powerOf(whole.filter((line) => line.order === order)));
  const first = levelOf(1);
  const low = powerOf(whole.filter(within(1, 3)));
  const prominences = Float64Array.from(whole.filter(within(2, 10)), (line) => line.prominenceDb);
  const displacement = momentsOf(revolution.displacementUm);
  const acceleration = momentsOf(revolution.accelerationMPerS2);
  const all = powerOf(whole);
  return {
    openOrdersOut: run2to10.length,
    highOrdersOut: open.filter(within(11, 20)).length,
    strongHighOrders: run2to10.filter(
      (line) => line.order >= 4 && line.velocityMmPerSRms >= strongShare * strongest,
    ).length,
    runLength: Math.min(10, run.length),
    runOverFirst: Math.min(20, Math.sqrt(powerOf(run2to10)) / Math.max(first, 1e-3 * strongest)),
    lowOrdersDb: db(powerOf(run2to10.filter(within(2, 3))), first ** 2),
    highOverLowDb: db(powerOf(run2to10.filter(within(4, 10))), low),
    medianProminenceDb: Math.max(-10, medianInPlace(prominences, prominences.length)),
    meanProminenceDb: meanOf(
      Array.from({ length: 10 }, (_, i) =>
        clamp(whole.find((line) => line.order === i + 1)?.prominenceDb ?? 0, 0, 30),
      ),
    ),
    firstProminenceDb: clamp(whole[0]?.order === 1 ? whole[0].prominenceDb : 0, -10, 60),
    unevennessDb: unevenness(whole.filter(within(1, 10))),
    roughnessDb: roughness(whole.filter(within(1, 10))),
    aloneDb: alone(whole),
    thirdMmPerS: levelOf(3),
    fractions: halves.length + thirds.length,
    halfDb: db(top(halves), strongest ** 2),
    thirdDb: db(top(thirds), strongest ** 2),
    ...sharesOf(spectrum, sources.usableOrders),
    strangerDb: strangerDb(spectrum, sources.usableOrders, strongest),
    floorDb: floorDb(whole.filter(within(1, 10)), strongest),
    familyMmPerS: Math.sqrt(all),
    runMmPerS: Math.sqrt(powerOf(run2to10)),
    truncated: truncation.side !== 'none' && !truncation.instrument ? 1 : 0,
    displacementSkew: Math.abs(displacement.skewness),
    displacementKurtosis: displacement.kurtosis,
    accelerationSkew: Math.abs(acceleration.skewness),
    accelerationKurtosis: acceleration.kurtosis,
    familyByNature: reciprocating.test(sources.machine?.assetKind ?? '') ? 1 : 0,
    explainedShare:
      all > 0
        ? powerOf(whole.filter((line) => line.explainedBy !== null && standsOut(line, strongest))) /
          all
        : 0,
  };
}

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));
const meanOf = (values: readonly number[]) =>
  values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length);

const levelsDb = (lines: readonly OrderLine[]) =>
  lines.map((line) => 20 * Math.log10(Math.max(line.velocityMmPerSRms, 1e-9)));

function roughness(lines: readonly OrderLine[]): number {
  const levels = levelsDb(lines);
  if (levels.length < 4) return 10;
  const middle = (levels.length - 1) / 2;
  const mean = meanOf(levels);
  const [above, below] = [0, 1].map((power) =>
    levels.reduce(
      (sum, level, i) => sum + (i - middle) ** (power + 1) * (power ? 1 : level - mean),
      0,
    ),
  ) as [number, number];
  return Math.sqrt(
    meanOf(levels.map((level, i) => (level - mean - (above / below) * (i - middle)) ** 2)),
  );
}

function alone(lines: readonly OrderLine[]): number {
  const levels = levelsDb(lines);
  const top = Math.max(...levels, -180);
  const at = levels.indexOf(top);
  const beside = Math.max(levels[at - 1] ?? -180, levels[at + 1] ?? -180);
  return Math.min(60, top - beside);
}

function unevenness(lines: readonly OrderLine[]): number {
  const levels = levelsDb(lines);
  if (levels.length < 4) return 10;
  return meanOf(
    levels
      .slice(2)
      .map((level, i) => Math.abs(level - 2 * (levels[i + 1] ?? 0) + (levels[i] ?? 0))),
  );
}

/** Synchronous power over all up to order 20, and steady over all power at orders 2 to 10. */
function sharesOf(spectrum: OrderSpectrum, usableOrders: number) {
  const { power, coherentPower, linesPerOrder } = spectrum;
  const last = Math.min(power.length - 1, Math.floor(Math.min(20.5, usableOrders) * linesPerOrder));
  let [all, synchronous, steady, atOrders] = [0, 0, 0, 0];
  for (let k = Math.ceil(0.3 * linesPerOrder); k <= last; k += 1) all += power[k] ?? 0;
  for (let order = 1; order * linesPerOrder <= last; order += 1) {
    const at = order * linesPerOrder;
    for (let k = at - 1; k <= at + 1; k += 1) {
      synchronous += coherentPower[k] ?? 0;
      if (order < 2 || order > 10) continue;
      steady += coherentPower[k] ?? 0;
      atOrders += power[k] ?? 0;
    }
  }
  return {
    synchronousShare: all > 0 ? Math.min(1, synchronous / all) : 0,
    steadiness: atOrders > 0 ? Math.min(1, steady / atOrders) : 0,
  };
}

/** Power of a line over the median of those a few lines away on both sides that tells it from a hump. */
const sharpFactor = 5;
const besideLines = [3, 4, 5];
/** With fewer lines to an order a few lines away are the next order. */
const linesToTell = 14;

/** Whether an order is a line, and not the top of a resonance in noise. */
function isSharp({ power, linesPerOrder }: OrderSpectrum, order: number): boolean {
  if (linesPerOrder < linesToTell) return true;
  const at = Math.round(order * linesPerOrder);
  const beside = Float64Array.from(
    besideLines.flatMap((away) => [power[at - away] ?? 0, power[at + away] ?? 0]),
  );
  const best = Math.max(power[at - 1] ?? 0, power[at] ?? 0, power[at + 1] ?? 0);
  return best > sharpFactor * medianInPlace(beside, beside.length);
}

/** The strongest line away from every multiple of a half and a third. */
function strangerDb(spectrum: OrderSpectrum, usableOrders: number, strongest: number): number {
  const { power, linesPerOrder } = spectrum;
  const last = Math.min(power.length - 1, Math.floor(Math.min(20.5, usableOrders) * linesPerOrder));
  const reach = 2.2 / linesPerOrder;
  const grid = linesPerOrder >= 8 ? 0.5 : 1;
  let most = 0;
  for (let k = Math.ceil(0.4 * linesPerOrder); k <= last; k += 1) {
    const order = k / linesPerOrder;
    if (Math.abs(order - Math.round(order / grid) * grid) < reach) continue;
    if (linesPerOrder >= 32 && Math.abs(order - Math.round(order * 3) / 3) < reach) continue;
    most = Math.max(most, power[k] ?? 0);
  }
  return db(most, strongest ** 2);
}

function floorDb(lines: readonly OrderLine[], strongest: number): number {
  const floors = Float64Array.from(lines, (line) => line.floorMmPerSRms ** 2);
  return db(medianInPlace(floors, floors.length), strongest ** 2, -100);
}

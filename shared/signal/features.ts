import type { AveragedRevolution } from './averaged-revolution.ts';
import { standsOut } from './harmonic-run.ts';
import type { HarmonicRun, OrderLine, Truncation } from './screening-types.ts';
import type { SpectrumView } from './spectrum-view.ts';

/** The numbers that the score is made of; each also stands in a sentence of the evidence. */
export interface ScreeningFeatures {
  /** Whole orders 2–10 that stand out and nothing else explains. */
  openOrdersOut: number;
  /** Of orders 4–10, those at least a tenth as strong as the strongest order. */
  strongHighOrders: number;
  /** Velocity of orders 2–10 together over that of 1×. */
  runOverFirst: number;
  /** Half and third orders that stand out. */
  fractions: number;
  /** Share of the velocity power up to order 20 that is synchronous with the shaft, 0–1. */
  synchronousShare: number;
  /** Strongest line that belongs to no whole or half order, against the strongest order, dB. */
  strangerDb: number;
  /** Velocity of all orders together, mm/s rms. */
  familyMmPerS: number;
  /** 1 where the averaged revolution is flattened by the machine. */
  truncated: number;
}

const strongShare = 0.1;
const isWhole = (order: number) => Number.isInteger(order);
const rms = (lines: readonly OrderLine[]) =>
  Math.sqrt(lines.reduce((sum, line) => sum + line.velocityMmPerSRms ** 2, 0));

/** Takes the features from what the steps before have found. */
export function extractFeatures(
  view: SpectrumView,
  speedHz: number,
  orders: readonly OrderLine[],
  run: HarmonicRun,
  truncation: Truncation,
  revolution: AveragedRevolution,
): ScreeningFeatures {
  const whole = orders.filter((line) => isWhole(line.order));
  const strongest = Math.max(1e-9, ...whole.map((line) => line.velocityMmPerSRms));
  const open = whole.filter((line) => line.explainedBy === null && standsOut(line, strongest));
  const run2to10 = open.filter((line) => line.order >= 2 && line.order <= 10);
  const first = whole.find((line) => line.order === 1)?.velocityMmPerSRms ?? 0;
  return {
    openOrdersOut: run2to10.length,
    strongHighOrders: run2to10.filter(
      (line) => line.order >= 4 && line.velocityMmPerSRms >= strongShare * strongest,
    ).length,
    runOverFirst: Math.min(20, rms(run2to10) / Math.max(first, 1e-3 * strongest)),
    fractions: run.halfOrderCount + run.thirdOrderCount,
    synchronousShare: synchronousShare(view, speedHz, revolution),
    strangerDb: strangerDb(view, speedHz, strongest),
    familyMmPerS: rms(whole),
    truncated: truncation.side !== 'none' && !truncation.instrument ? 1 : 0,
  };
}

function synchronousShare(view: SpectrumView, speedHz: number, revolution: AveragedRevolution) {
  const from = Math.ceil((0.3 * speedHz) / view.stepHz);
  const to = Math.min(
    view.velocity.length - 1,
    Math.floor(Math.min(20.5 * speedHz, view.usableHz) / view.stepHz),
  );
  let power = 0;
  for (let i = from; i <= to; i += 1) power += (view.velocity[i] ?? 0) ** 2;
  power /= 1.5; // equivalent noise bandwidth of the Hann window (Harris 1978)
  return power > 0 ? Math.min(1, revolution.synchronousPower / power) : 0;
}

/** The strongest line away from every multiple of half the speed. */
function strangerDb(view: SpectrumView, speedHz: number, strongest: number): number {
  const keepAway = 3;
  const from = Math.ceil((0.6 * speedHz) / view.stepHz);
  const to = Math.min(
    view.velocity.length - 1,
    Math.floor(Math.min(20.5 * speedHz, view.usableHz) / view.stepHz),
  );
  let most = 0;
  for (let i = from; i <= to; i += 1) {
    const halves = (i * view.stepHz) / (speedHz / 2);
    const away = (Math.abs(halves - Math.round(halves)) * speedHz) / 2 / view.stepHz;
    if (away > keepAway) most = Math.max(most, view.velocity[i] ?? 0);
  }
  return 20 * Math.log10(Math.max(most, 1e-9) / strongest);
}

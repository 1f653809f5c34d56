import type { ScreeningFeatures } from './features.ts';
import { scoreConstants, type ScoreConstants } from './score-constants.ts';

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));
const logOver = (value: number, unit: number) => Math.log(Math.max(value, 1e-9) / unit);
const longestRun = 10;

/**
 * Log-odds of looseness as a sum of named parts, so that each can be told in a sentence. Every part
 * is limited: no single number can make or break a verdict.
 *
 * @returns parts in log-odds; their sum is the argument of the logistic function
 */
export function scoreParts(
  features: ScreeningFeatures,
  constants: ScoreConstants = scoreConstants,
): Readonly<Record<string, number>> {
  const f = features;
  const c = constants;
  const run = Math.min(f.runLength, longestRun);
  return {
    base: c.base,
    familyLevel: (c.perFamilyLevel * clamp(logOver(f.familyMmPerS, 1), -4, 2)) / 2,
    prominence: (c.perProminence * f.meanProminenceDb) / 10,
    firstProminence: (c.perFirstProminence * clamp(f.firstProminenceDb, 0, 40)) / 12,
    floor: (c.perFloor * clamp(f.floorDb + 60, 0, 40)) / 15,
    lowOrders: (c.perLowOrders * (clamp(f.lowOrdersDb, -40, 10) + 40)) / 15,
    stranger: (-c.perStranger * clamp(f.strangerDb, -30, 15)) / 15,
    uneven: (-c.perUneven * Math.min(f.unevennessDb, 30)) / 8,
    half: (c.perHalf * clamp(f.halfDb + 40, 0, 50)) / 20,
    steadyRun: (c.perSteadyRun * 2 * run * f.synchronousShare) / 5,
    strongRun: (c.perStrongRun * run * clamp(logOver(f.runMmPerS, 0.05), 0, 4)) / 10,
    third: (c.perThird * clamp(logOver(f.thirdMmPerS, 1) + 6, 0, 7)) / 2,
    alone: (-c.perAlone * clamp(f.aloneDb - 10, 0, 30)) / 10,
    rough: (-c.perRough * Math.min(f.roughnessDb, 20)) / 5,
    nature: -c.perNature * f.familyByNature,
    explained: -c.perUnexplained * f.explainedShare,
  };
}

/** Score between 0 and 1: the logistic function of the parts' sum. */
export function scoreFromFeatures(
  features: ScreeningFeatures,
  constants: ScoreConstants = scoreConstants,
): number {
  const sum = Object.values(scoreParts(features, constants)).reduce((a, b) => a + b, 0);
  return 1 / (1 + Math.exp(-sum));
}

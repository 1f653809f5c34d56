import type { ScreeningFeatures } from './features.ts';
import { scoreConstants, type ScoreConstants } from './score-constants.ts';

/**
 * Log-odds of looseness as a sum of named parts, so that each can be told in a sentence.
 *
 * @returns parts in log-odds; their sum is the argument of the logistic function
 */
export function scoreParts(
  features: ScreeningFeatures,
  constants: ScoreConstants = scoreConstants,
): Readonly<Record<string, number>> {
  const c = constants;
  return {
    base: c.base,
    openOrders: c.perOpenOrder * Math.min(features.openOrdersOut, c.openOrdersMax),
    strongHighOrders:
      c.perStrongHighOrder * Math.min(features.strongHighOrders, c.strongHighOrdersMax),
    runOverFirst: c.perRunOverFirst * Math.min(features.runOverFirst, c.runOverFirstMax),
    fractions: c.perFraction * Math.min(features.fractions, c.fractionsMax),
    truncated: c.truncated * features.truncated,
    synchronous: c.synchronous * (features.synchronousShare - c.synchronousMiddle),
    stranger: -c.perStrangerDb * Math.max(0, features.strangerDb - c.strangerFreeDb),
    weak:
      -c.perWeak * Math.max(0, Math.log(c.weakBelowMmPerS / Math.max(features.familyMmPerS, 1e-6))),
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

import { scoreConstants, type ScoreConstants } from '#shared/signal/score-constants.ts';
import { scoreParts } from '#shared/signal/score.ts';
import type { CaseOutcome } from './case-outcome.ts';
import type { FeatureValues } from './case-features.ts';
import { fitLogistic, type FitCase } from './fit-logistic.ts';
import { looseCases, tightCases } from './measures.ts';
import type { RealOutcome } from './real-recordings.ts';

type ConstantName = keyof ScoreConstants;

/** Set by judgement: the set holds too few machines that show families by nature. */
const held: readonly ConstantName[] = ['perNature'];

/** The constants the log-odds are linear in. */
const fitted = (Object.keys(scoreConstants) as ConstantName[]).filter(
  (name) => /^per[A-Z]/.test(name) && !held.includes(name),
);

/** Ridge penalty on scaled weights. */
const penalty = 4;

/** What each constant multiplies, by setting it to 1 and the others to 0. */
function termsOf(features: FeatureValues): number[] {
  const none = { ...scoreConstants, base: 0 } as Record<ConstantName, number>;
  for (const name of held) none[name] = 0;
  for (const name of fitted) none[name] = 0;
  return fitted.map((name) => {
    const parts = scoreParts(features, { ...none, [name]: 1 });
    return Object.values(parts).reduce((sum, part) => sum + part, 0);
  });
}

/**
 * Fits the score's constants to labelled waveforms. Loose machines whose looseness does not reach
 * the record are left out: they would teach that a sound record is loose.
 *
 * @param negatives - real recordings without looseness that join in, if any
 */
export function fitScore(
  cases: readonly CaseOutcome[],
  negatives: readonly RealOutcome[] = [],
): ScoreConstants {
  const loose = looseCases(cases);
  const tight = tightCases(cases);
  const fitCases: FitCase[] = [];
  const add = (features: FeatureValues | null, isLoose: boolean, weight: number) => {
    if (features !== null && features.familyByNature === 0)
      fitCases.push({ terms: termsOf(features), loose: isLoose, weight });
  };
  for (const one of loose) add(one.features, true, 1);
  for (const one of tight) add(one.features, false, 1);
  // A few dozen recordings must not drown among thousands: together they weigh a third of the rest.
  const realWeight = negatives.length === 0 ? 0 : tight.length / 3 / negatives.length;
  for (const one of negatives) add(one.features, false, realWeight);
  const fit = fitLogistic(fitCases, { penalty, signs: fitted.map(() => 1 as const) });
  const constants = { ...scoreConstants, base: fit.base } as Record<ConstantName, number>;
  fitted.forEach((name, index) => (constants[name] = fit.weights[index] ?? 0));
  return constants as ScoreConstants;
}

import type { ScoreConstants } from '#shared/signal/score-constants.ts';
import { scoreFromFeatures } from '#shared/signal/score.ts';
import type { CaseOutcome } from './case-outcome.ts';
import { fitScore } from './fit-score.ts';
import type { RealOutcome } from './real-recordings.ts';

const limit = 0.5;

/**
 * Fits the score, and says what the fit does on real recordings: constants of the simulated machines
 * alone, and constants into whose fit the other sources' recordings joined as negatives (each source
 * left out in turn, so that none is judged by constants that have seen it).
 */
export function fitReport(
  cases: readonly CaseOutcome[],
  real: readonly RealOutcome[],
  joinReal: boolean,
): { constants: ScoreConstants; text: string } {
  const tight = real.filter(({ loose }) => !loose);
  const alone = fitScore(cases);
  const constants = joinReal ? fitScore(cases, tight) : alone;
  const lines = [
    `Fitted on ${cases.length} waveforms of ${new Set(cases.map((one) => one.machineId)).size} machines`,
    ...Object.entries(constants).map(([name, value]) => `  ${name}: ${value.toPrecision(5)}`),
  ];
  const sources = [...new Set(tight.map(({ source }) => source))].sort();
  if (sources.length > 0) lines.push(`Real recordings scored ${limit} and above, not loose`);
  for (const source of sources) {
    const mine = tight.filter((one) => one.source === source);
    const others = tight.filter((one) => one.source !== source);
    const leftOut = fitScore(cases, others);
    const count = (by: ScoreConstants) =>
      mine.filter(({ features }) => features && scoreFromFeatures(features, by) >= limit).length;
    lines.push(
      `  ${source}: ${count(alone)} of ${mine.length} by simulated machines alone, ` +
        `${count(leftOut)} where other sources joined the fit`,
    );
  }
  return { constants, text: `${lines.join('\n')}\n` };
}

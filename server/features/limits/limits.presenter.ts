import type { VerdictLimits } from '#server/screening/limits.repository.ts';
import { shownMax, type ChangedFlag, type LimitsTrialResponse } from '#shared/contracts/limits.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import type { Verdict } from '#shared/signal/screening-types.ts';
import type { TrialRow } from './limits-trial.repository.ts';

/** The verdict of a score, as the method gives it where the record can be judged. */
export const verdictOfScore = (score: number, limits: VerdictLimits): Verdict =>
  score >= limits.likelyScore ? 'likely' : score >= limits.suspectedScore ? 'suspected' : 'none';

interface Trial {
  now: VerdictLimits;
  tried: VerdictLimits;
  counts: Pick<
    LimitsTrialResponse,
    'screeningCount' | 'flagsNowCount' | 'flagsThenCount' | 'changingCount' | 'otherMethodCount'
  >;
  rows: readonly TrialRow[];
}

export function presentTrial({ now, tried, counts, rows }: Trial): LimitsTrialResponse {
  const changes = rows.map((row): ChangedFlag => {
    const { outcome, reportedAt } = row;
    return {
      screeningId: row.screeningId,
      surveyId: row.surveyId,
      surveyedOn: row.surveyedOn,
      machineTag: row.machineTag,
      positionName: row.positionName,
      pointLabel: pointLabel(row.machineTag, row.positionCode, row.direction),
      score: row.score,
      verdictNow: verdictOfScore(row.score, now),
      verdictThen: verdictOfScore(row.score, tried),
      verdictGiven: row.verdict,
      decision: row.decision,
      inspection:
        outcome === null || reportedAt === null
          ? null
          : { outcome, reportedOn: reportedAt.toISOString().slice(0, 10) },
    };
  });
  return {
    now: { ...now },
    tried: { ...tried },
    ...counts,
    coming: countOf(changes.filter(({ verdictNow }) => verdictNow === 'none')),
    going: countOf(changes.filter(({ verdictThen }) => verdictThen === 'none')),
    changes: changes.slice(0, shownMax),
  };
}

const countOf = (changes: readonly ChangedFlag[]) => ({
  flagCount: changes.length,
  looseCount: changes.filter(({ inspection }) => inspection?.outcome === 'loose').length,
  notLooseCount: changes.filter(({ inspection }) => inspection?.outcome === 'not loose').length,
});

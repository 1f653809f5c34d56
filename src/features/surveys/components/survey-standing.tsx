import type { SurveyCounts } from '#shared/contracts/survey.ts';
import { isScreening } from '../api/surveys.ts';

/** The verdicts of a survey in words, worst first, and what is still to come. */
export function SurveyStanding({ counts }: { counts: SurveyCounts }) {
  if (counts.waveformCount === 0) return <span className="text-ink-soft">No waveforms yet</span>;
  const parts: [number, string][] = [
    [counts.likelyCount, 'likely'],
    [counts.suspectedCount, 'suspected'],
    [counts.retakeCount, 'to retake'],
    [counts.noneCount, 'without signs'],
    [counts.failedCount, 'failed'],
  ];
  const running = counts.queuedCount + counts.runningCount;
  return (
    <span className="flex flex-wrap gap-x-3">
      {parts
        .filter(([count]) => count > 0)
        .map(([count, words]) => (
          <span
            key={words}
            className={words === 'likely' || words === 'suspected' ? 'text-evidence' : undefined}
          >
            <span className="figures">{count}</span> {words}
          </span>
        ))}
      {isScreening(counts) && (
        <span className="text-ink-soft">
          <span className="figures">{running}</span> being screened
        </span>
      )}
    </span>
  );
}

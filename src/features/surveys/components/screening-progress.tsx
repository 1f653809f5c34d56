import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { SurveyCounts } from '#shared/contracts/survey.ts';
import { ProgressBar } from '#src/components/progress-bar.tsx';
import { isScreening, progressQuery, surveyQuery } from '../api/surveys.ts';

/** What the table shows has changed when one of these has. */
const changeKey = (counts: SurveyCounts) =>
  [counts.waveformCount, counts.runningCount, counts.doneCount, counts.failedCount].join();

/** Follows the screening; the survey itself is asked for again when something has come of it. */
export function ScreeningProgress({
  siteId,
  surveyId,
  counts,
}: {
  siteId: number;
  surveyId: number;
  /** As the page shows them. */
  counts: SurveyCounts;
}) {
  const client = useQueryClient();
  const { data = counts } = useQuery(progressQuery(siteId, surveyId));
  const hasNews = changeKey(data) !== changeKey(counts);
  useEffect(() => {
    if (hasNews) void client.invalidateQueries(surveyQuery(siteId, surveyId));
  }, [client, hasNews, siteId, surveyId, data]);
  if (!isScreening(data)) return null;
  const ended = data.doneCount + data.failedCount;
  return (
    <div role="status">
      <ProgressBar
        label="Screening"
        value={ended}
        max={data.waveformCount}
        text={`${ended} of ${data.waveformCount} screened`}
      />
    </div>
  );
}

import type { MonitoringResponse } from '#shared/contracts/finding.ts';
import { formatDay } from '#src/lib/dates.ts';

/** Until when a finding is monitored, and whether the lead has to decide again. */
export function MonitoringEnd({ monitoring }: { monitoring: MonitoringResponse }) {
  const { untilOn, surveyLimit, surveyCount, overdue } = monitoring;
  const ends = [
    ...(untilOn === null ? [] : [`until ${formatDay(untilOn)}`]),
    ...(surveyLimit === null
      ? []
      : [`${surveyCount} of ${surveyLimit} ${surveyLimit === 1 ? 'survey' : 'surveys'}`]),
  ];
  return (
    <>
      {ends.length === 0 ? 'no end set' : ends.join(', ')}
      {overdue && <strong className="text-ink"> – decide again</strong>}
    </>
  );
}

import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { MonitoringResponse } from '#shared/contracts/finding.ts';

const halfDayMs = 12 * 3600 * 1000;

/** The calendar day that is still "today" somewhere: a day is past once it is past everywhere. */
export const dayPastEverywhere = (now: Date): string =>
  new Date(now.getTime() - halfDayMs).toISOString().slice(0, 10);

/**
 * How the monitoring of a finding stands; null where it isn't monitored.
 *
 * @param surveyCount - surveys of its position since
 * @param today - YYYY-MM-DD
 */
export function monitoringOf(
  finding: Finding,
  surveyCount: number,
  today: string,
): MonitoringResponse | null {
  if (finding.state !== 'monitoring') return null;
  const { monitoredSince, monitorUntilOn, monitorSurveys } = finding;
  return {
    since: monitoredSince?.toISOString() ?? null,
    untilOn: monitorUntilOn,
    surveyLimit: monitorSurveys,
    surveyCount,
    overdue:
      (monitorUntilOn !== null && monitorUntilOn < today) ||
      (monitorSurveys !== null && surveyCount >= monitorSurveys),
  };
}

import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { dateValue, escapedText, icalText, utcValue } from './ical-text.ts';

const msPerDay = 24 * 3600 * 1000;

const nextDay = (day: string) =>
  new Date(Date.parse(`${day}T00:00:00Z`) + msPerDay).toISOString().slice(0, 10);

function eventOf(inspection: Inspection, siteAddress: string): string[] {
  const { id, dueOn, version, assignedAt, workOrderReference, assignee } = inspection;
  const position = inspection.finding?.bearingPosition;
  const machine = position?.machine;
  const link = `${siteAddress}/inspections/${id}`;
  const description = [
    `${machine?.tag ?? ''} ${machine?.name ?? ''}, ${position?.name ?? ''}`,
    `Work order: ${workOrderReference ?? 'none given'}`,
    `Asset owner: ${assignee?.name ?? ''} (${inspection.state})`,
    link,
  ].join('\n');
  return [
    'BEGIN:VEVENT',
    // The same inspection is the same event in every reading, also on another day.
    `UID:inspection-${id}@fretline.invalid`,
    `DTSTAMP:${utcValue(assignedAt)}`,
    `SEQUENCE:${version}`,
    `DTSTART;VALUE=DATE:${dateValue(dueOn)}`,
    // The end of a whole day is the day after, which is not part of it.
    `DTEND;VALUE=DATE:${dateValue(nextDay(dueOn))}`,
    `SUMMARY:${escapedText(`Fit inspection due: ${machine?.tag ?? ''} ${position?.name ?? ''}`)}`,
    `DESCRIPTION:${escapedText(description)}`,
    `URL:${link}`,
    'STATUS:CONFIRMED',
    // A due day blocks nobody's time.
    'TRANSP:TRANSPARENT',
    'END:VEVENT',
  ];
}

/** The inspections due, as a calendar of whole days. */
export function inspectionCalendar(
  name: string,
  siteAddress: string,
  inspections: readonly Inspection[],
): string {
  return icalText([
    'BEGIN:VCALENDAR',
    'VERSION:2.0',
    'PRODID:-//Fretline//Inspections due//EN',
    'CALSCALE:GREGORIAN',
    // RFC 7986: the calendar's name, and how often it is worth reading.
    `NAME:${escapedText(name)}`,
    'REFRESH-INTERVAL;VALUE=DURATION:PT1H',
    ...inspections.flatMap((inspection) => eventOf(inspection, siteAddress)),
    'END:VCALENDAR',
  ]);
}

import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { MailItem } from '#server/mail/mail-body.ts';
import {
  checksOf,
  factsOf,
  mailFactsOf,
  type InspectionMailFacts,
  type MailText,
} from './inspection-mails.ts';

const days = (count: number) => (count === 1 ? '1 day' : `${count} days`);
const many = (count: number, one: string, more: string) => `${count} ${count === 1 ? one : more}`;

/** To the owner, a few days before. */
export function dueSoonMail(mail: InspectionMailFacts, daysLeft: number): MailText {
  const { inspection, machine, position, link } = mail;
  const when = daysLeft === 0 ? 'today' : `in ${days(daysLeft)}`;
  return {
    subject: `Due ${when}: fit inspection of ${machine}, ${position}`,
    parts: [
      { text: `This inspection is due ${when} and not reported yet.` },
      factsOf(mail),
      { heading: 'What to check', list: checksOf(inspection) },
      { link, label: 'Open the inspection' },
    ],
  };
}

/** To the owner and to the lead who assigned it, when the day has passed. */
export function overdueMail(
  mail: InspectionMailFacts,
  daysOver: number,
  reader: 'assignee' | 'lead',
): MailText {
  const { inspection, machine, position, link } = mail;
  const whose =
    reader === 'lead'
      ? `It is with ${inspection.assignee?.name ?? 'its owner'} (${inspection.state}).`
      : 'If it can’t be done, tell the reliability lead, who can set another date.';
  return {
    subject: `Overdue by ${days(daysOver)}: fit inspection of ${machine}, ${position}`,
    parts: [
      { text: `This inspection was due ${days(daysOver)} ago and is not reported. ${whose}` },
      factsOf(mail),
      { link, label: 'Open the inspection' },
    ],
  };
}

/** To the owner, when the lead asks for it. */
export function reminderMail(mail: InspectionMailFacts, lead: string): MailText {
  const { inspection, machine, position, link } = mail;
  return {
    subject: `Reminder: fit inspection of ${machine}, ${position}, due ${inspection.dueOn}`,
    parts: [
      { text: `${lead} reminds you of this inspection.` },
      factsOf(mail),
      { heading: 'What to check', list: checksOf(inspection) },
      { link, label: 'Open the inspection' },
    ],
  };
}

export interface WeekFacts {
  siteId: number;
  siteName: string;
  findings: readonly Finding[];
  overdue: readonly Inspection[];
  flagsWaiting: number;
}

const linesShown = 20;
const shortened = (items: readonly MailItem[]): MailItem[] =>
  items.length <= linesShown
    ? [...items]
    : [...items.slice(0, linesShown), `and ${items.length - linesShown} more`];

/** To a lead: what waits at the site. */
export function weeklyMail(publicUrl: string, week: WeekFacts): MailText {
  const { siteId, siteName, findings, overdue, flagsWaiting } = week;
  const site = `${publicUrl}/sites/${siteId}`;
  const nameOf = ({ bearingPosition }: Finding) =>
    `${bearingPosition?.machine?.tag ?? ''} ${bearingPosition?.name ?? ''}`.trim();
  const openItems = findings.map((finding) => ({
    text: `${nameOf(finding)}, open since ${finding.openedAt.toISOString().slice(0, 10)}`,
    link: `${site}/findings/${finding.id}`,
  }));
  const overdueItems = overdue.map((inspection) => {
    const { machine, position, link } = mailFactsOf(publicUrl, siteId, inspection);
    const workOrder = inspection.workOrderReference;
    return {
      text: `${machine}, ${position}: was due ${inspection.dueOn}, with ${inspection.assignee?.name ?? 'nobody'}${workOrder === null ? '' : `, work order ${workOrder}`}`,
      link,
    };
  });
  return {
    subject: `${siteName}: ${many(findings.length, 'open finding', 'open findings')}, ${many(overdue.length, 'overdue inspection', 'overdue inspections')}, ${many(flagsWaiting, 'flag', 'flags')} waiting`,
    parts: [
      { text: `What waits at ${siteName} this week.` },
      {
        facts: [
          ['Findings to decide on', String(findings.length)],
          ['Inspections overdue', String(overdue.length)],
          ['Flags waiting for review', String(flagsWaiting)],
        ],
      },
      ...(openItems.length > 0
        ? [{ heading: 'Findings to decide on, oldest first', list: shortened(openItems) }]
        : []),
      ...(overdueItems.length > 0
        ? [{ heading: 'Overdue inspections', list: shortened(overdueItems) }]
        : []),
      { link: `${site}/desk`, label: 'Open the desk' },
      ...(flagsWaiting > 0 ? [{ link: `${site}/review`, label: 'Review the flags' }] : []),
    ],
  };
}

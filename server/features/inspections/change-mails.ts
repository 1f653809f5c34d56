import { factsOf, type InspectionMailFacts, type MailText } from './inspection-mails.ts';

const reasonOf = (reason: string) => (reason === '' ? [] : [{ heading: 'Reason', text: reason }]);

/** To the former owner: the task is somebody else's now. */
export function handedOnMail(
  mail: InspectionMailFacts,
  lead: string,
  assignee: string,
  reason: string,
): MailText {
  const { machine, position } = mail;
  return {
    subject: `Inspection of ${machine}, ${position} now with ${assignee}`,
    parts: [
      {
        text: `${lead} has given the inspection to ${assignee}. You need not do it any more; readings you have begun to enter can't be reported.`,
      },
      factsOf(mail),
      ...reasonOf(reason),
    ],
  };
}

/** To the owner: another day. */
export function dueChangedMail(
  mail: InspectionMailFacts,
  lead: string,
  before: string,
  reason: string,
): MailText {
  const { inspection, machine, position, link } = mail;
  return {
    subject: `Now due ${inspection.dueOn}: fit inspection of ${machine}, ${position}`,
    parts: [
      { text: `${lead} has moved the due date from ${before} to ${inspection.dueOn}.` },
      factsOf(mail),
      ...reasonOf(reason),
      { link, label: 'Open the inspection' },
    ],
  };
}

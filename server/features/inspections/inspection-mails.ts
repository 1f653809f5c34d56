import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { MailPart } from '#server/mail/mail-body.ts';
import type { PersonalMail } from '#server/mail/mailer.ts';
import type { InspectionReport } from '#shared/contracts/inspection.ts';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';

export interface InspectionMailFacts {
  inspection: Inspection;
  machine: string;
  position: string;
  link: string;
}

/** The facts every mail names, from an inspection loaded with its finding. */
export function mailFactsOf(
  publicUrl: string,
  siteId: number,
  inspection: Inspection,
): InspectionMailFacts {
  const position = inspection.finding?.bearingPosition;
  const machine = position?.machine;
  return {
    inspection,
    machine: `${machine?.tag ?? ''} ${machine?.name ?? ''}`.trim(),
    position: position?.name ?? '',
    link: `${publicUrl}/sites/${siteId}/inspections/${inspection.id}`,
  };
}

/** What is to be checked, in words. */
export function checksOf(
  inspection: Pick<Inspection, 'checkShaftSeat' | 'checkHousingSeat' | 'checkInPlace'>,
): string[] {
  return [
    ...(inspection.checkInPlace
      ? [
          'in place, before anything is opened: bolts, feet, shims, grout, movement across the joint',
        ]
      : []),
    ...(inspection.checkShaftSeat ? ['shaft seat: shaft and inner ring'] : []),
    ...(inspection.checkHousingSeat ? ['housing seat: housing bore and outer ring'] : []),
  ];
}

function limitsOf(inspection: Inspection, seats: SeatAssessmentsResponse): string[] {
  const wanted = { shaft: inspection.checkShaftSeat, housing: inspection.checkHousingSeat };
  return seats.seats
    .filter(({ seat }) => wanted[seat])
    .map(({ seat, seatLimitsMm, toleranceClass }) =>
      seatLimitsMm === null
        ? `${seat} seat: no limits on record; measure and report what is there`
        : `${seat} seat ${toleranceClass ?? ''}: ${seatLimitsMm[0].toFixed(3)} to ${seatLimitsMm[1].toFixed(3)} mm at 20 °C`,
    );
}

/** What a mail says; who gets it and when is the caller's. */
export type MailText = Pick<PersonalMail, 'subject' | 'parts'>;

export const factsOf = ({ inspection, machine, position }: InspectionMailFacts): MailPart => ({
  facts: [
    ['Machine', machine],
    ['Bearing position', position],
    ['Due', inspection.dueOn],
    ['Work order', inspection.workOrderReference ?? 'none given'],
  ],
});

/** Tells the owner what to check, by when and with which cautions. */
export function assignedMail(
  mail: InspectionMailFacts,
  assigneeName: string,
  summary: string,
  seats: SeatAssessmentsResponse,
): MailText {
  const { inspection, machine, position, link } = mail;
  const limits = limitsOf(inspection, seats);
  return {
    subject: `Fit inspection of ${machine}, ${position}: due ${inspection.dueOn}`,
    parts: [
      { text: `${assigneeName}, you are asked to inspect a bearing fit.` },
      factsOf(mail),
      { text: summary },
      { heading: 'What to check', list: checksOf(inspection) },
      ...(limits.length > 0 ? [{ heading: 'Limits', list: limits }] : []),
      ...(inspection.instructions === null
        ? []
        : [{ heading: 'Instructions', text: inspection.instructions }]),
      { link, label: 'Open the inspection' },
      { heading: 'Before you start', list: [...safetyCautions] },
      { text: 'A screening is a hint, not a diagnosis and not a release to run.' },
    ],
  };
}

const outcomeWords: Readonly<Record<InspectionReport['outcome'], string>> = {
  loose: 'found loose',
  'not loose': 'found not loose',
  'not clear': 'not clear',
};

/** Tells the lead who assigned it what was found. */
export function reportedMail(
  mail: InspectionMailFacts,
  reporter: string,
  report: InspectionReport,
): MailText {
  const { machine, position, link } = mail;
  return {
    subject: `Inspection of ${machine}, ${position} reported: ${outcomeWords[report.outcome]}`,
    parts: [
      { text: `${reporter} has reported the inspection.` },
      factsOf(mail),
      {
        facts: [
          ['Result', outcomeWords[report.outcome]],
          ['Repaired', report.repaired ? 'yes' : 'no'],
        ],
      },
      ...report.seats.map(({ seat, stage, condition, readings }) => ({
        text: `The ${seat} seat ${stage}: ${condition}; ${readings.length} readings.`,
      })),
      { heading: 'Work done', text: report.workDone },
      { link, label: 'Read the report' },
    ],
  };
}

/** Tells the owner that the task is off. */
export function cancelledMail(
  mail: InspectionMailFacts,
  canceller: string,
  reason: string,
): MailText {
  const { machine, position, link } = mail;
  return {
    subject: `Inspection of ${machine}, ${position} cancelled`,
    parts: [
      { text: `${canceller} has cancelled the inspection.` },
      factsOf(mail),
      { heading: 'Reason', text: reason },
      { link, label: 'Open the inspection' },
    ],
  };
}

/** Tells the owner that the lead has looked at the report and the task is done with. */
export function closedMail(mail: InspectionMailFacts, closer: string, remark: string): MailText {
  const { machine, position, link } = mail;
  return {
    subject: `Inspection of ${machine}, ${position} closed`,
    parts: [
      { text: `${closer} has read your report and closed the inspection.` },
      factsOf(mail),
      ...(remark === '' ? [] : [{ heading: 'Remark', text: remark }]),
      { text: 'The next survey of the point shows whether the looseness is gone.' },
      { link, label: 'Open the inspection' },
    ],
  };
}

import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Product } from '#server/compose.ts';
import { findingListQuery } from '#shared/contracts/finding.ts';
import { inspectionReport } from '#shared/contracts/inspection.ts';
import { reviewQueueQuery } from '#shared/contracts/review.ts';
import type { DemoClock } from './demo-clock.ts';

type Services = Product['services'];

/** Machines of the demo plant that have a loose joint; the analyst of the story knows their sound. */
const looseTags = ['P-201', 'A-802', 'F-301', 'V-901'];

/** Works the review queue of a survey to its end, as the story's analyst did. */
export async function reviewSurvey(
  { review }: Services,
  analyst: SitePrincipal,
  surveyId: number,
): Promise<void> {
  const { rows } = await review.queue(analyst, reviewQueueQuery.parse({ surveyId, pageSize: 200 }));
  for (const screening of rows) {
    const tag = screening.waveform?.measuringPoint?.bearingPosition?.machine?.tag ?? '';
    const loose = looseTags.includes(tag);
    const decision = screening.verdict === 'retake' ? 'retake' : loose ? 'accepted' : 'rejected';
    const reasons = {
      accepted: 'The run of orders was not there when the machine was last overhauled.',
      rejected: 'The lines belong to the process and were the same last year.',
      retake: 'The record could not be judged; measure again with the range set wider.',
    };
    await review.decide(analyst, screening.id, { decision, reason: reasons[decision] });
  }
}

const findingAt = async (services: Services, lead: SitePrincipal, tag: string) => {
  const { rows } = await services.findings.list(lead, findingListQuery.parse({ search: tag }));
  return rows[0]?.finding;
};

/** The agitator's worn shaft seat: inspected, restored, and waiting for the next survey's proof. */
export async function repairAgitator(
  services: Services,
  people: { lead: SitePrincipal; owner: SitePrincipal },
  clock: DemoClock,
): Promise<void> {
  const finding = await findingAt(services, people.lead, 'A-802');
  if (finding === undefined) return;
  clock.set('2026-09-30T08:10:00Z');
  const { inspection } = await services.inspections.assign(people.lead, finding.id, {
    assigneeUserId: people.owner.userId,
    dueOn: '2026-10-12',
    checkShaftSeat: true,
    checkHousingSeat: true,
    checkInPlace: false,
    workOrderReference: 'WO 48213',
    instructions: 'The stock chest is empty from 7 October; the bearing can be opened then.',
    version: finding.version,
  });
  const { id } = inspection;
  clock.set('2026-10-01T06:45:00Z');
  await services.inspections.accept(people.owner, id, 1);
  clock.set('2026-10-08T13:20:00Z');
  const readings = [0, 45, 90, 135].flatMap((directionDeg) =>
    [1, 2].map((plane) => ({
      part: 'seat' as const,
      plane,
      directionDeg,
      diameterMm: 79.962 + plane * 0.003 + (directionDeg % 90 === 0 ? 0.002 : 0),
    })),
  );
  await services.inspections.report(
    people.owner,
    id,
    2,
    inspectionReport.parse({
      cautionsRead: true,
      outcome: 'loose',
      seats: [
        { seat: 'shaft', stage: 'as found', condition: 'creep marks', readings },
        { seat: 'housing', stage: 'as found', condition: 'sound', readings: [] },
      ],
      inPlaceResult: null,
      inPlaceChecks: [],
      causeInPlace: false,
      workDone:
        'Shaft seat sprayed with metal and ground back to m6; bearing and sleeve of the seal replaced.',
      repaired: true,
    }),
  );
  clock.set('2026-10-09T07:30:00Z');
  await services.inspections.close(people.lead, id, 3, 'Readings and work are clear.');
}

/** The survey after the repair shows no looseness at the agitator any more. */
export async function verifyAgitator(
  services: Services,
  lead: SitePrincipal,
  clock: DemoClock,
): Promise<void> {
  const finding = await findingAt(services, lead, 'A-802');
  if (finding?.state !== 'repaired') return;
  clock.set('2026-10-27T09:00:00Z');
  await services.findings.decide(lead, finding.id, {
    action: 'verify',
    reason: 'The run of orders is gone at both points of the bearing, at the same speed.',
    version: finding.version,
  });
}

/** The fan's pedestal: the lead watches it until the planned stop. */
export async function monitorFan(
  services: Services,
  lead: SitePrincipal,
  clock: DemoClock,
): Promise<void> {
  const finding = await findingAt(services, lead, 'F-301');
  if (finding === undefined) return;
  clock.set('2026-10-28T10:40:00Z');
  await services.findings.decide(lead, finding.id, {
    action: 'monitor',
    reason: 'Can run until the stop of 12 January; measure every month and open the bearing then.',
    monitorUntilOn: '2027-01-12',
    version: finding.version,
  });
}

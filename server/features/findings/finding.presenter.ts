import type { SitePrincipal } from '#server/auth/principal.ts';
import type { FindingScreening } from '#server/db/entities/finding-screening.entity.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import type { StateChange } from '#server/db/entities/state-change.entity.ts';
import {
  findingActions,
  type FindingAction,
  type FindingListItem,
  type FindingResponse,
  type FindingScreeningResponse,
  type MonitoringResponse,
  type StateChangeResponse,
} from '#shared/contracts/finding.ts';
import type { InspectionListItem } from '#shared/contracts/inspection.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import type { FindingVerification } from './finding-verification.ts';
import { nextFindingState } from './finding-transitions.ts';
import { presentVerification } from './verification.presenter.ts';

/** The screening that shows the finding most clearly; the newer one where two score the same. */
export function clearestScreening(links: readonly FindingScreening[]): Screening | null {
  let clearest: Screening | null = null;
  for (const { screening } of links) {
    if (screening && (screening.score ?? -1) >= (clearest?.score ?? -1)) clearest = screening;
  }
  return clearest;
}

export function presentFindingItem(
  finding: Finding,
  links: readonly FindingScreening[],
  monitoring: MonitoringResponse | null,
): FindingListItem {
  const clearest = clearestScreening(links);
  const position = finding.bearingPosition;
  const machine = position?.machine;
  return {
    id: finding.id,
    state: finding.state,
    openedAt: finding.openedAt.toISOString(),
    machineId: machine?.id ?? 0,
    machineTag: machine?.tag ?? '',
    machineName: machine?.name ?? '',
    positionCode: position?.code ?? '',
    positionName: position?.name ?? '',
    ownerName: machine?.owner?.name ?? null,
    verdict: clearest?.verdict ?? 'suspected',
    score: clearest?.score ?? null,
    kind: clearest?.result.kind ?? null,
    orders: clearest === null ? [] : orderCellsOf(clearest.result.orders),
    screeningCount: links.length,
    monitoring,
  };
}

function presentScreening(finding: Finding, link: FindingScreening): FindingScreeningResponse[] {
  const { screening } = link;
  const waveform = screening?.waveform;
  const point = waveform?.measuringPoint;
  const position = finding.bearingPosition;
  if (!screening || !waveform?.survey || !point || !position) return [];
  return [
    {
      screeningId: screening.id,
      waveformId: waveform.id,
      surveyedOn: waveform.survey.surveyedOn,
      pointLabel: pointLabel(position.machine?.tag ?? '', position.code, point.direction),
      direction: point.direction,
      verdict: screening.verdict,
      score: screening.score,
      speedRpm: screening.speedHz === null ? null : screening.speedHz * 60,
      overallMmPerSRms: screening.overallMmPerSRms,
      orders: orderCellsOf(screening.result.orders),
      decisionReason: screening.decisionReason,
      decidedByName: screening.decidedBy?.name ?? null,
      evidence: screening.result.evidence.map((sentence) => ({
        for: sentence.for,
        text: sentence.text,
      })),
    },
  ];
}

const presentStateChange = (change: StateChange): StateChangeResponse => ({
  id: change.id,
  subject: change.inspectionId === null ? 'finding' : 'inspection',
  fromState: change.fromState,
  toState: change.toState,
  reason: change.reason,
  changedByName: change.changedBy?.name ?? '',
  changedAt: change.changedAt.toISOString(),
});

export interface FindingWhole {
  finding: Finding;
  links: FindingScreening[];
  history: StateChange[];
  seats: SeatAssessmentsResponse;
  inspections: InspectionListItem[];
  verification: FindingVerification | null;
  monitoring: MonitoringResponse | null;
}

export function presentFinding(principal: SitePrincipal, whole: FindingWhole): FindingResponse {
  const { finding, links } = whole;
  const can = (action: FindingAction) =>
    nextFindingState(finding.state, action, principal.role) !== null;
  return {
    ...presentFindingItem(finding, links, whole.monitoring),
    bearingPositionId: finding.bearingPositionId,
    ownerUserId: finding.bearingPosition?.machine?.ownerUserId ?? null,
    version: finding.version,
    screenings: links.flatMap((link) => presentScreening(finding, link)),
    seats: whole.seats,
    inspections: whole.inspections,
    history: whole.history.map(presentStateChange),
    verification: whole.verification && presentVerification(whole.verification),
    can: Object.fromEntries(
      findingActions.map((action) => [action, can(action)]),
    ) as FindingResponse['can'],
  };
}

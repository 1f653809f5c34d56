import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { InspectionPhoto } from '#server/db/entities/inspection-photo.entity.ts';
import type { InspectionListItem, InspectionResponse } from '#shared/contracts/inspection.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { nextInspectionState, type InspectionAction } from './inspection-transitions.ts';
import { presentPhoto } from './inspection-photo.presenter.ts';
import { isAssignee, maySeeFindingOf } from './inspection.policy.ts';

const waitingStates: readonly Inspection['state'][] = ['assigned', 'accepted'];

export function presentInspectionItem(inspection: Inspection, today: string): InspectionListItem {
  const position = inspection.finding?.bearingPosition;
  const machine = position?.machine;
  return {
    id: inspection.id,
    findingId: inspection.findingId,
    state: inspection.state,
    machineId: machine?.id ?? 0,
    machineTag: machine?.tag ?? '',
    machineName: machine?.name ?? '',
    positionCode: position?.code ?? '',
    positionName: position?.name ?? '',
    assigneeName: inspection.assignee?.name ?? '',
    assignedByName: inspection.assignedBy?.name ?? '',
    assignedAt: inspection.assignedAt.toISOString(),
    dueOn: inspection.dueOn,
    overdue: waitingStates.includes(inspection.state) && inspection.dueOn < today,
    workOrderReference: inspection.workOrderReference,
    checkShaftSeat: inspection.checkShaftSeat,
    checkHousingSeat: inspection.checkHousingSeat,
    checkInPlace: inspection.checkInPlace,
  };
}

export interface InspectionWhole {
  inspection: Inspection;
  summary: string;
  seats: SeatAssessmentsResponse;
  photos: InspectionPhoto[];
  today: string;
}

export function presentInspection(
  principal: SitePrincipal,
  { inspection, summary, seats, photos, today }: InspectionWhole,
): InspectionResponse {
  const can = (action: InspectionAction) =>
    nextInspectionState(inspection.state, action, principal.role) !== null;
  const isOwn = isAssignee(principal, inspection);
  return {
    ...presentInspectionItem(inspection, today),
    instructions: inspection.instructions,
    summary,
    seats,
    report: inspection.report,
    reportedAt: inspection.reportedAt?.toISOString() ?? null,
    photos: photos.map(presentPhoto),
    version: inspection.version,
    can: {
      accept: isOwn && can('accept'),
      report: isOwn && can('report'),
      close: can('close'),
      cancel: can('cancel'),
      seeFinding: maySeeFindingOf(principal, inspection),
    },
  };
}

import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Db } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { AppError } from '#server/http/app-error.ts';
import { nextInspectionState, type InspectionAction } from './inspection-transitions.ts';
import { InspectionRepository } from './inspection.repository.ts';

export interface InspectionStep {
  principal: SitePrincipal;
  /** As the person read it; `version` is the one they decided on. */
  inspection: Inspection;
  action: InspectionAction;
  version: number;
  reason: string;
  changes?: Partial<
    Pick<Inspection, 'report' | 'reportedAt' | 'assigneeUserId' | 'dueOn' | 'assignedAt'>
  >;
}

/**
 * Moves an inspection one step, in the transaction of the caller: state, version, the record of who,
 * when and why, and the activity entry go together.
 */
export async function moveInspection(db: Db, step: InspectionStep, now: Date): Promise<void> {
  const { principal, inspection, action, version, reason, changes = {} } = step;
  if (inspection.version !== version) throw changedMeanwhile(inspection);
  const next = nextInspectionState(inspection.state, action, principal.role);
  if (next === null) throw wrongState(inspection, action);
  const repository = new InspectionRepository(db);
  const isWritten = await repository.update(inspection.id, version, { ...changes, state: next });
  if (!isWritten) throw changedMeanwhile(inspection);
  await repository.addStateChange({
    findingId: inspection.findingId,
    inspectionId: inspection.id,
    fromState: inspection.state,
    toState: next,
    reason: reason === '' ? null : reason,
    changedByUserId: principal.userId,
    changedAt: now,
  });
  await recordInspectionActivity(
    db,
    principal,
    inspection.id,
    next,
    { findingId: inspection.findingId, from: inspection.state, reason },
    now,
  );
}

export const recordInspectionActivity = (
  db: Db,
  principal: SitePrincipal,
  inspectionId: number,
  action: string,
  details: Record<string, unknown>,
  now: Date,
) =>
  recordActivity(
    db,
    {
      siteId: principal.siteId,
      userId: principal.userId,
      action: `inspection.${action}`,
      objectType: 'inspection',
      objectId: inspectionId,
      details,
    },
    now,
  );

const wrongState = (inspection: Inspection, action: InspectionAction) =>
  new AppError(
    'wrong_state',
    action === 'report' && inspection.state === 'assigned'
      ? 'Accept the inspection before reporting it.'
      : `An inspection that is ${inspection.state} can't be changed like this.`,
  );

export const changedMeanwhile = (inspection: Inspection) =>
  new AppError(
    'conflict',
    `This inspection was changed meanwhile (it was ${inspection.state} when read). Read it again; what you typed is not lost.`,
  );

import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Db } from '#server/db/database.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { FindingState } from '#shared/contracts/finding.ts';
import {
  finishedFindingStates,
  nextFindingState,
  type FindingEvent,
} from './finding-transitions.ts';
import { FindingRepository, type FindingChange } from './finding.repository.ts';

export interface FindingStep {
  principal: SitePrincipal;
  findingId: number;
  event: FindingEvent;
  reason: string;
  /** The version the person decided on; absent where an inspection's own version guards the step. */
  version?: number;
  /** How long it is monitored, where that is the step. */
  monitor?: { untilOn: string | null; surveys: number | null };
}

const eventWords: Readonly<Record<FindingEvent, string>> = {
  assign: 'be sent to inspection',
  monitor: 'be put under monitoring',
  dismiss: 'be dismissed',
  reopen: 'be reopened',
  verify: 'be verified',
  'inspection-repaired': 'be marked as repaired',
  'inspection-not-loose': 'be put under monitoring',
  'inspection-unsettled': 'be given back to the lead',
  'inspection-cancelled': 'be given back to the lead',
};

/**
 * Moves a finding one step, in the transaction of the caller: state, version, the record of who,
 * when and why, and the activity entry go together.
 */
export async function moveFinding(db: Db, step: FindingStep, now: Date): Promise<void> {
  const { principal, findingId, event, reason, version } = step;
  const repository = new FindingRepository(db);
  const finding = await repository.lock(findingId);
  if (finding === null) throw notFound('finding');
  if (version !== undefined && finding.version !== version) {
    throw changedMeanwhile(finding, await repository.lastChangeOf(finding));
  }
  const next = nextFindingState(finding.state, event, principal.role);
  if (next === null) {
    throw new AppError(
      'wrong_state',
      `A finding that is ${finding.state} can't ${eventWords[event]}.`,
    );
  }
  if (finishedFindingStates.includes(finding.state)) {
    await refuseSecondActive(repository, finding);
  }
  await repository.write(finding, next, monitoringFields(step, next, now));
  await repository.addStateChange({
    findingId,
    fromState: finding.state,
    toState: next,
    reason: reason === '' ? null : reason,
    changedByUserId: principal.userId,
    changedAt: now,
  });
  await recordFindingActivity(
    db,
    principal,
    findingId,
    event,
    { from: finding.state, to: next },
    now,
  );
}

/** An inspection that found the fit sound leaves the next survey the last word. */
function monitoringFields({ monitor }: FindingStep, next: FindingState, now: Date) {
  if (next !== 'monitoring') {
    return { monitoredSince: null, monitorUntilOn: null, monitorSurveys: null };
  }
  const { untilOn, surveys } = monitor ?? { untilOn: null, surveys: 1 };
  return { monitoredSince: now, monitorUntilOn: untilOn, monitorSurveys: surveys };
}

/** One position has one active finding: new evidence must know where it belongs. */
async function refuseSecondActive(repository: FindingRepository, finding: Finding): Promise<void> {
  const other = await repository.lockActiveOf(finding.bearingPositionId, finding.id);
  if (other === null) return;
  throw new AppError(
    'wrong_state',
    `This bearing position has a newer finding (${other.id}). Go on with that one.`,
  );
}

/** Tells who came first, with what and why: the second decides anew or leaves it. */
const changedMeanwhile = ({ state }: Finding, last: FindingChange | null) =>
  new AppError(
    'conflict',
    `This finding was changed meanwhile and is now ${state}. ${last === null ? '' : `${last.userName} ${changeWords[last.event] ?? 'changed it'} on ${last.at.toISOString().slice(0, 16).replace('T', ' ')} UTC${last.reason === null ? '' : `: “${last.reason}”`}. `}Your decision was not saved; read the finding again before deciding.`,
  );

const changeWords: Readonly<Record<string, string>> = {
  assign: 'assigned an inspection',
  monitor: 'put it under monitoring',
  dismiss: 'dismissed it',
  reopen: 'reopened it',
  verify: 'closed it as verified',
  'inspection-repaired': 'reported the repair',
  'inspection-not-loose': 'reported that the fit is not loose',
  'inspection-unsettled': 'reported the inspection',
  'inspection-cancelled': 'cancelled the inspection',
  extended: 'accepted another flag for it',
  reduced: 'took a flag back from it',
};

export const recordFindingActivity = (
  db: Db,
  principal: SitePrincipal,
  findingId: number,
  action: string,
  details: Record<string, unknown>,
  now: Date,
) =>
  recordActivity(
    db,
    {
      siteId: principal.siteId,
      userId: principal.userId,
      action: `finding.${action}`,
      objectType: 'finding',
      objectId: findingId,
      details,
    },
    now,
  );

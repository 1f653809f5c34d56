import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Db } from '#server/db/database.ts';
import { AppError } from '#server/http/app-error.ts';
import { recordFindingActivity } from './finding-progress.ts';
import { FindingRepository } from './finding.repository.ts';

interface Evidence {
  principal: SitePrincipal;
  positionId: number;
  screeningId: number;
  reason: string;
}

/** Makes the position's finding or extends the active one; the caller holds the position's row. */
async function take(db: Db, evidence: Evidence, now: Date) {
  const { principal, positionId, screeningId, reason } = evidence;
  const repository = new FindingRepository(db);
  const active = await repository.lockActiveOf(positionId);
  if (active !== null) {
    // New evidence counts as a change: who was about to dismiss the finding must see it first.
    await repository.write(active, active.state);
    await repository.link(active.id, screeningId);
    await recordFindingActivity(db, principal, active.id, 'extended', { screeningId }, now);
    return { findingId: active.id, isNew: false };
  }
  const findingId = await repository.insert({
    siteId: principal.siteId,
    bearingPositionId: positionId,
    state: 'open',
    openedAt: now,
  });
  await repository.link(findingId, screeningId);
  await repository.addStateChange({
    findingId,
    fromState: null,
    toState: 'open',
    reason: reason === '' ? null : reason,
    changedByUserId: principal.userId,
    changedAt: now,
  });
  await recordFindingActivity(db, principal, findingId, 'opened', { screeningId, positionId }, now);
  return { findingId, isNew: true };
}

/** Takes a screening out of its finding again; a finding left without any is removed. */
async function giveBack(
  db: Db,
  { principal, screeningId, since }: { principal: SitePrincipal; screeningId: number; since: Date },
  now: Date,
): Promise<void> {
  const repository = new FindingRepository(db);
  const link = await repository.lockLinkOf(screeningId);
  const finding = link === null ? null : await repository.lock(link.findingId);
  if (finding === null) return;
  if ((await repository.changesSince(finding.id, since)) > 0) {
    throw new AppError(
      'wrong_state',
      `The finding has moved on since (it is ${finding.state}), so the decision stands. The reliability lead can dismiss the finding.`,
    );
  }
  await repository.unlink(finding.id, screeningId);
  if ((await repository.linkCount(finding.id)) === 0) {
    await repository.remove(finding.id);
    await recordFindingActivity(db, principal, finding.id, 'withdrawn', { screeningId }, now);
    return;
  }
  await repository.write(finding, finding.state);
  await recordFindingActivity(db, principal, finding.id, 'reduced', { screeningId }, now);
}

/** What the review desk hands over and takes back. */
export const findingEvidence = { take, giveBack };

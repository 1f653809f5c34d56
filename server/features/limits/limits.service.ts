import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database, Db } from '#server/db/database.ts';
import type { LimitsChange } from '#server/db/entities/limits-change.entity.ts';
import { AppError } from '#server/http/app-error.ts';
import {
  LimitsRepository,
  methodLimits,
  type VerdictLimits,
} from '#server/screening/limits.repository.ts';
import type {
  LimitsResponse,
  LimitsTrialResponse,
  SetLimitsRequest,
  TryLimitsQuery,
} from '#shared/contracts/limits.ts';
import { machineKinds, type MachineKind } from '#shared/contracts/machine.ts';
import { LimitsTrialRepository } from './limits-trial.repository.ts';
import { presentTrial } from './limits.presenter.ts';

/** Limits of the verdict: what is in force, what another pair would do, and setting them. */
export class LimitsService {
  private readonly database: Database;
  private readonly now: () => Date;

  constructor(database: Database, now: () => Date = () => new Date()) {
    this.database = database;
    this.now = now;
  }

  async limits({ siteId }: SitePrincipal): Promise<LimitsResponse> {
    const { db } = this.database;
    const repository = new LimitsRepository(db);
    const [history, counts] = await Promise.all([
      repository.history(siteId),
      new LimitsTrialRepository(db).machineCounts(siteId),
    ]);
    const countOf = (kind: MachineKind) =>
      counts.find(({ machineKind }) => machineKind === kind)?.count ?? 0;
    const siteOwn = newestOf(history, null);
    const site = siteOwn ?? methodLimits;
    const kinds = machineKinds.filter(
      (kind) => countOf(kind) > 0 || newestOf(history, kind) !== null,
    );
    return {
      site: {
        machineKind: null,
        ...site,
        own: siteOwn !== null,
        machineCount: counts.reduce((sum, { count }) => sum + count, 0),
      },
      kinds: kinds.map((machineKind) => {
        const own = newestOf(history, machineKind);
        return {
          machineKind,
          ...(own ?? site),
          own: own !== null,
          machineCount: countOf(machineKind),
        };
      }),
      method: methodLimits,
      history: history.map((change) => ({
        id: change.id,
        machineKind: change.machineKind,
        suspectedScore: change.suspectedScore,
        likelyScore: change.likelyScore,
        reason: change.reason,
        changedByName: change.changedBy?.name ?? '',
        changedAt: change.changedAt.toISOString(),
      })),
      version: history[0]?.id ?? 0,
    };
  }

  /** What other limits would have made of the past surveys; nothing is changed. */
  async trial({ siteId }: SitePrincipal, query: TryLimitsQuery): Promise<LimitsTrialResponse> {
    const { db } = this.database;
    const repository = new LimitsRepository(db);
    const { machineKind = null, suspectedScore, likelyScore } = query;
    const now = await repository.inForce(siteId, machineKind);
    const tried =
      suspectedScore === undefined || likelyScore === undefined
        ? machineKind === null
          ? methodLimits
          : await repository.inForce(siteId, null)
        : { suspectedScore, likelyScore };
    const history = await repository.history(siteId);
    const exceptKinds = machineKinds.filter((kind) => newestOf(history, kind) !== null);
    const scope = { siteId, machineKind, exceptKinds };
    const trials = new LimitsTrialRepository(db);
    const [counts, rows] = await Promise.all([
      trials.counts(scope, now, tried),
      trials.changes(scope, now, tried),
    ]);
    return presentTrial({ now, tried, counts, rows });
  }

  async set(principal: SitePrincipal, request: SetLimitsRequest): Promise<LimitsResponse> {
    const { siteId, userId } = principal;
    const { machineKind, suspectedScore, likelyScore, reason, version } = request;
    const now = this.now();
    await this.database.transaction(async (db) => {
      const repository = new LimitsRepository(db);
      await repository.lockSite(siteId);
      await refuseChanged(repository, siteId, version);
      const before = await repository.ownOf(siteId, machineKind);
      if (
        (before?.suspectedScore ?? null) === suspectedScore &&
        (before?.likelyScore ?? null) === likelyScore
      ) {
        throw new AppError('wrong_state', 'These limits are in force already.');
      }
      await repository.add({
        siteId,
        machineKind,
        suspectedScore,
        likelyScore,
        reason,
        changedByUserId: userId,
        changedAt: now,
      });
      await record(db, principal, request, before, now);
    });
    return this.limits(principal);
  }
}

function newestOf(history: readonly LimitsChange[], kind: MachineKind | null) {
  const newest = history.find(({ machineKind }) => machineKind === kind);
  const { suspectedScore = null, likelyScore = null } = newest ?? {};
  return suspectedScore === null || likelyScore === null ? null : { suspectedScore, likelyScore };
}

/** Who tried other limits than those in force now must see what they would do to these. */
async function refuseChanged(repository: LimitsRepository, siteId: number, version: number) {
  const [newest] = await repository.history(siteId);
  if ((newest?.id ?? 0) === version) return;
  throw new AppError(
    'conflict',
    `${newest?.changedBy?.name ?? 'Somebody'} changed the limits of ${newest?.machineKind ?? 'the whole site'} meanwhile: “${newest?.reason ?? ''}”. Yours were not saved; try them again on what is in force now.`,
  );
}

const record = (
  db: Db,
  { siteId, userId }: SitePrincipal,
  { machineKind, suspectedScore, likelyScore, reason }: SetLimitsRequest,
  before: VerdictLimits | null,
  now: Date,
) =>
  recordActivity(
    db,
    {
      siteId,
      userId,
      action: 'limits.changed',
      objectType: 'site',
      objectId: siteId,
      details: { machineKind, from: before, to: { suspectedScore, likelyScore }, reason },
    },
    now,
  );

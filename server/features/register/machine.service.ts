import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  CreateMachineRequest,
  MachineListQuery,
  UpdateMachineRequest,
} from '#shared/contracts/machine.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { MachineListRepository } from './machine-list.repository.ts';
import { maySeeMachine } from './machine.policy.ts';
import { MachineRepository } from './machine.repository.ts';
import { PositionRepository } from './position.repository.ts';
import type { MachineWhole } from './register.presenter.ts';

interface Accounts {
  roleAt: (userId: number, siteId: number) => Promise<SiteRole | null>;
}

/** The machine register. */
export class MachineService {
  private readonly database: Database;
  private readonly accounts: Accounts;

  constructor(database: Database, accounts: Accounts) {
    this.database = database;
    this.accounts = accounts;
  }

  list(principal: SitePrincipal, query: MachineListQuery) {
    const ownerUserId = principal.role === 'owner' ? principal.userId : null;
    return new MachineListRepository(this.database.db).list(principal.siteId, ownerUserId, query);
  }

  async whole(principal: SitePrincipal, machineId: number): Promise<MachineWhole> {
    const machines = new MachineRepository(this.database.db);
    const machine = await machines.find(principal.siteId, machineId);
    if (machine === null || !maySeeMachine(principal, machine)) throw notFound('machine');
    const repository = new PositionRepository(this.database.db);
    const positions = await repository.ofMachine(machineId);
    const ids = positions.map((position) => position.id);
    const [points, fitRecords, findings] = await Promise.all([
      repository.pointsOf(ids),
      repository.fitRecordsOf(ids),
      machines.findings(machineId),
    ]);
    return { machine, positions, points, fitRecords, findings };
  }

  async create(principal: SitePrincipal, request: CreateMachineRequest): Promise<MachineWhole> {
    await this.checkOwner(principal.siteId, request.ownerUserId);
    const id = await this.database.transaction(async (db) => {
      const created = await new MachineRepository(db)
        .insert({ ...request, siteId: principal.siteId })
        .catch(refuseTakenTag(request.tag));
      await recordActivity(db, {
        ...entryOf(principal, created),
        action: 'machine.created',
        details: { tag: request.tag },
      });
      return created;
    });
    return this.whole(principal, id);
  }

  async update(
    principal: SitePrincipal,
    machineId: number,
    request: UpdateMachineRequest,
  ): Promise<MachineWhole> {
    const { version, ...changes } = request;
    const { machine } = await this.whole(principal, machineId);
    if (changes.ownerUserId !== undefined) {
      await this.checkOwner(principal.siteId, changes.ownerUserId);
    }
    const speedMinRpm = changes.speedMinRpm ?? machine.speedMinRpm;
    const speedMaxRpm = changes.speedMaxRpm ?? machine.speedMaxRpm;
    if (speedMinRpm !== null && speedMaxRpm !== null && speedMinRpm > speedMaxRpm) {
      throw new AppError('validation', 'The highest speed is below the lowest.', {
        fields: [{ path: 'speedMaxRpm', message: 'The highest speed is below the lowest.' }],
      });
    }
    await this.database.transaction(async (db) => {
      const written = await new MachineRepository(db)
        .update(principal.siteId, machineId, version, changes)
        .catch(refuseTakenTag(changes.tag ?? machine.tag));
      if (!written) {
        throw new AppError(
          'conflict',
          'Somebody else has changed this machine since you opened it. Your changes were not saved: reload to see theirs.',
        );
      }
      await recordActivity(db, {
        ...entryOf(principal, machineId),
        action: 'machine.changed',
        details: { fields: Object.keys(changes) },
      });
    });
    return this.whole(principal, machineId);
  }

  private async checkOwner(siteId: number, ownerUserId: number | null): Promise<void> {
    if (ownerUserId === null) return;
    if ((await this.accounts.roleAt(ownerUserId, siteId)) !== 'owner') {
      const message = 'The owner must be an asset owner of this site.';
      throw new AppError('validation', message, { fields: [{ path: 'ownerUserId', message }] });
    }
  }
}

const entryOf = (principal: SitePrincipal, machineId: number) => ({
  siteId: principal.siteId,
  userId: principal.userId,
  objectType: 'machine',
  objectId: machineId,
});

const refuseTakenTag = (tag: string) => (error: unknown) => {
  if (!isDuplicateKey(error)) throw error;
  const message = `The tag ${tag} is taken at this site.`;
  throw new AppError('conflict', message, { cause: error, fields: [{ path: 'tag', message }] });
};

import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  CreateBearingPositionRequest,
  UpdateBearingPositionRequest,
} from '#shared/contracts/bearing-position.ts';
import type { AddFitRecordRequest, CreateFitRecordRequest } from '#shared/contracts/fit-record.ts';
import type { CreateMeasuringPointRequest } from '#shared/contracts/measuring-point.ts';
import { maySeeMachine } from './machine.policy.ts';
import { MachineRepository } from './machine.repository.ts';
import { PositionRepository } from './position.repository.ts';

/** What the fit functions say of the numbers of a position or record before it is written. */
export interface FitChecks {
  /** Faults of a designation or of dimensions that contradict it. */
  positionFaults: (position: {
    designation: string | null;
    boreMm: number | null;
    outsideMm: number | null;
    shaftBoreMm?: number | null;
  }) => { path: string; message: string }[];
  /** Faults of a fit record: unknown class, a diameter a factor off. */
  recordFaults: (
    position: Pick<
      BearingPosition,
      'designation' | 'boreMm' | 'outsideMm' | 'shaftSeatForm' | 'seatTaper'
    >,
    record: CreateFitRecordRequest,
  ) => { path: string; message: string }[];
}

/** Bearing positions, their measuring points and fit records. */
export class PositionService {
  private readonly database: Database;
  private readonly checks: FitChecks;
  private readonly now: () => Date;

  constructor(database: Database, checks: FitChecks, now: () => Date = () => new Date()) {
    this.database = database;
    this.checks = checks;
    this.now = now;
  }

  async create(principal: SitePrincipal, machineId: number, request: CreateBearingPositionRequest) {
    const machine = await new MachineRepository(this.database.db).find(principal.siteId, machineId);
    if (machine === null || !maySeeMachine(principal, machine)) throw notFound('machine');
    refuse(this.checks.positionFaults(request));
    const id = await this.database.transaction(async (db) => {
      const created = await new PositionRepository(db)
        .insert({ ...request, machineId })
        .catch(refuseTaken('code', `The machine already has a position ${request.code}.`));
      await recordActivity(db, {
        ...entryOf(principal, created),
        action: 'position.created',
        details: { machineId, code: request.code },
      });
      return created;
    });
    return this.whole(principal, id);
  }

  async update(
    principal: SitePrincipal,
    positionId: number,
    changes: UpdateBearingPositionRequest,
  ) {
    const position = await this.seen(principal, positionId);
    refuse(this.checks.positionFaults({ ...position, ...changes }));
    await this.database.transaction(async (db) => {
      if (Object.keys(changes).length > 0) {
        await new PositionRepository(db)
          .update(positionId, changes)
          .catch(
            refuseTaken(
              'code',
              `The machine already has a position ${changes.code ?? position.code}.`,
            ),
          );
      }
      await recordActivity(db, {
        ...entryOf(principal, positionId),
        action: 'position.changed',
        details: { fields: Object.keys(changes) },
      });
    });
    return this.whole(principal, positionId);
  }

  async addPoint(
    principal: SitePrincipal,
    positionId: number,
    { direction }: CreateMeasuringPointRequest,
  ) {
    await this.seen(principal, positionId);
    await this.database.transaction(async (db) => {
      await new PositionRepository(db)
        .insertPoint(positionId, direction)
        .catch(refuseTaken('direction', `The position already has a ${direction} point.`));
      await recordActivity(db, {
        ...entryOf(principal, positionId),
        action: 'point.created',
        details: { direction },
      });
    });
    return this.whole(principal, positionId);
  }

  async addFitRecord(
    principal: SitePrincipal,
    positionId: number,
    { correctsSameDay, ...request }: AddFitRecordRequest,
  ) {
    const position = await this.seen(principal, positionId);
    if (position.kind === 'plain') {
      throw new AppError('validation', 'A plain bearing has no seats to record a fit for.');
    }
    const now = this.now();
    if (request.recordedOn > now.toISOString().slice(0, 10)) {
      refuse([{ path: 'recordedOn', message: 'The date lies in the future.' }]);
    }
    refuse(this.checks.recordFaults(position, request));
    await this.database.transaction(async (db) => {
      const repository = new PositionRepository(db);
      // Held until the end: two people who record the same seat at once are told apart.
      await repository.lock(positionId);
      const sameDay = await repository.fitRecordCount(positionId, request);
      if (sameDay > 0 && !correctsSameDay) refuseSecond(request);
      await repository.insertFitRecord({
        ...request,
        bearingPositionId: positionId,
        stage: null,
        inspectionId: null,
        recordedByUserId: principal.userId,
        createdAt: now,
      });
      await recordActivity(db, {
        ...entryOf(principal, positionId),
        action: 'fit-record.added',
        details: { seat: request.seat, source: request.source },
      });
    });
    return this.whole(principal, positionId);
  }

  private async whole(principal: SitePrincipal, positionId: number) {
    const repository = new PositionRepository(this.database.db);
    const position = await this.seen(principal, positionId);
    const [points, fitRecords] = await Promise.all([
      repository.pointsOf([positionId]),
      repository.fitRecordsOf([positionId]),
    ]);
    return { position, machineTag: position.machine?.tag ?? '', points, fitRecords };
  }

  private async seen(principal: SitePrincipal, positionId: number): Promise<BearingPosition> {
    const position = await new PositionRepository(this.database.db).find(
      principal.siteId,
      positionId,
    );
    if (!position?.machine || !maySeeMachine(principal, position.machine)) {
      throw notFound('bearing position');
    }
    return position;
  }
}

const entryOf = (principal: SitePrincipal, positionId: number) => ({
  siteId: principal.siteId,
  userId: principal.userId,
  objectType: 'bearing-position',
  objectId: positionId,
});

function refuse(faults: { path: string; message: string }[]): void {
  const first = faults[0];
  if (first !== undefined) throw new AppError('validation', first.message, { fields: faults });
}

function refuseSecond({ seat, recordedOn }: CreateFitRecordRequest): never {
  const message = `The ${seat} seat already has a record of ${recordedOn}. Give the new one its own date, or say that it corrects that one.`;
  throw new AppError('conflict', message, { fields: [{ path: 'recordedOn', message }] });
}

const refuseTaken = (path: string, message: string) => (error: unknown) => {
  if (!isDuplicateKey(error)) throw error;
  throw new AppError('conflict', message, { cause: error, fields: [{ path, message }] });
};

import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';

export type NewPosition = Omit<BearingPosition, 'id' | 'machine'>;
export type NewFitRecord = Omit<FitRecord, 'id' | 'bearingPosition' | 'recordedBy'>;

/** Bearing positions with their points and fit records. */
export class PositionRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  ofMachine(machineId: number): Promise<BearingPosition[]> {
    return this.db.find(BearingPosition, {
      where: { machineId },
      order: { sequence: 'ASC', code: 'ASC' },
    });
  }

  /** The position with its machine, if it belongs to the site. */
  find(siteId: number, id: number): Promise<BearingPosition | null> {
    return this.db.findOne(BearingPosition, {
      where: { id, machine: { siteId } },
      relations: { machine: true },
    });
  }

  async insert(position: NewPosition): Promise<number> {
    const result = await this.db.insert(BearingPosition, position);
    return (result.identifiers[0] as { id: number }).id;
  }

  async update(id: number, changes: Partial<NewPosition>): Promise<void> {
    await this.db.update(BearingPosition, { id }, changes);
  }

  pointsOf(positionIds: number[]): Promise<MeasuringPoint[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.find(MeasuringPoint, {
      where: { bearingPositionId: In(positionIds) },
      order: { id: 'ASC' },
    });
  }

  async insertPoint(bearingPositionId: number, direction: Direction): Promise<number> {
    const result = await this.db.insert(MeasuringPoint, { bearingPositionId, direction });
    return (result.identifiers[0] as { id: number }).id;
  }

  fitRecordsOf(positionIds: number[]): Promise<FitRecord[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.find(FitRecord, {
      where: { bearingPositionId: In(positionIds) },
      relations: { recordedBy: true },
      order: { recordedOn: 'DESC', id: 'DESC' },
    });
  }

  /** Keeps the position's row for this transaction. */
  async lock(id: number): Promise<void> {
    await this.db.findOne(BearingPosition, { where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  fitRecordCount(
    bearingPositionId: number,
    { seat, recordedOn }: Pick<FitRecord, 'seat' | 'recordedOn'>,
  ): Promise<number> {
    return this.db.count(FitRecord, { where: { bearingPositionId, seat, recordedOn } });
  }

  async insertFitRecord(record: NewFitRecord): Promise<number> {
    const result = await this.db.insert(FitRecord, record);
    return (result.identifiers[0] as { id: number }).id;
  }
}

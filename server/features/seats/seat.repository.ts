import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';

/** What the assessment of a position's seats is made from. */
export class SeatRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  find(positionId: number): Promise<BearingPosition | null> {
    return this.db.findOne(BearingPosition, {
      where: { id: positionId },
      relations: { machine: true },
    });
  }

  /** All positions of a machine along the train. */
  ofMachine(machineId: number): Promise<BearingPosition[]> {
    return this.db.find(BearingPosition, {
      where: { machineId },
      relations: { machine: true },
      order: { sequence: 'ASC', code: 'ASC' },
    });
  }

  /** Newest first. */
  recordsOf(positionIds: number[]): Promise<FitRecord[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.find(FitRecord, {
      where: { bearingPositionId: In(positionIds) },
      order: { recordedOn: 'DESC', id: 'DESC' },
    });
  }
}

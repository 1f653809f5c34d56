import type { Db } from '#server/db/database.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { SeatName } from '#shared/contracts/fit-record.ts';

/** Everything that was ever said of one seat and its position. */
export class SeatHistoryRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** Oldest first; of two records of one day the later word last. */
  records(bearingPositionId: number, seat: SeatName): Promise<FitRecord[]> {
    return this.db.find(FitRecord, {
      where: { bearingPositionId, seat },
      relations: { recordedBy: true },
      order: { recordedOn: 'ASC', id: 'ASC' },
    });
  }

  findings(bearingPositionId: number): Promise<Finding[]> {
    return this.db.find(Finding, { where: { bearingPositionId }, order: { id: 'ASC' } });
  }

  inspections(bearingPositionId: number): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: { finding: { bearingPositionId } },
      order: { id: 'ASC' },
    });
  }
}

import type { SelectQueryBuilder } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { StateChange } from '#server/db/entities/state-change.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import type { InspectionListQuery } from '#shared/contracts/inspection.ts';

const sortColumns: Record<InspectionListQuery['sort'], string> = {
  dueOn: 'inspection.due_on',
  state: "FIELD(inspection.state, 'assigned', 'accepted', 'reported', 'closed', 'cancelled')",
  machineTag: 'machine.tag',
};

export type NewInspection = Omit<
  Inspection,
  'id' | 'version' | 'finding' | 'assignee' | 'assignedBy' | 'report' | 'reportedAt'
>;

/** Inspections and the fit records they bring. */
export class InspectionRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** One page; `ownerUserId` narrows it to what this asset owner may see. */
  async list(siteId: number, ownerUserId: number | null, query: InspectionListQuery) {
    const found = this.joined().where('finding.siteId = :siteId', { siteId });
    if (ownerUserId !== null) {
      found.andWhere(
        '(inspection.assigneeUserId = :ownerUserId OR machine.ownerUserId = :ownerUserId)',
        { ownerUserId },
      );
    }
    if (query.state !== undefined) {
      found.andWhere('inspection.state = :state', { state: query.state });
    }
    if (query.active === true) {
      found.andWhere("inspection.state NOT IN ('closed', 'cancelled')");
    }
    if (query.search) {
      found.andWhere(
        '(machine.tag LIKE :pattern OR machine.name LIKE :pattern OR position.name LIKE :pattern OR inspection.workOrderReference LIKE :pattern)',
        { pattern: likePattern(query.search) },
      );
    }
    const total = await found.clone().getCount();
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    const rows = await found
      .addSelect(sortColumns[query.sort], 'sort_key')
      .orderBy('sort_key', direction)
      .addOrderBy('inspection.id', direction)
      .limit(query.pageSize)
      .offset((query.page - 1) * query.pageSize)
      .getMany();
    return { rows, total };
  }

  find(siteId: number, id: number): Promise<Inspection | null> {
    return this.joined()
      .where('inspection.id = :id', { id })
      .andWhere('finding.siteId = :siteId', { siteId })
      .getOne();
  }

  /** Newest first. */
  ofFinding(findingId: number): Promise<Inspection[]> {
    return this.joined()
      .where('inspection.findingId = :findingId', { findingId })
      .orderBy('inspection.id', 'DESC')
      .getMany();
  }

  async insert(inspection: NewInspection): Promise<number> {
    const result = await this.db.insert(Inspection, {
      ...inspection,
      report: null,
      reportedAt: null,
      version: 1,
    });
    return (result.identifiers[0] as { id: number }).id;
  }

  /** Writes the changes if nobody else has since; false if somebody has. */
  async update(id: number, version: number, changes: Partial<Inspection>): Promise<boolean> {
    const result = await this.db.update(
      Inspection,
      { id, version },
      // TypeORM's type for JSON columns does not take the report's nested arrays.
      { ...changes, version: version + 1 } as never,
    );
    return result.affected === 1;
  }

  async addStateChange(change: Omit<StateChange, 'id' | 'finding' | 'changedBy'>): Promise<void> {
    await this.db.insert(StateChange, change);
  }

  async addFitRecords(
    records: Omit<FitRecord, 'id' | 'bearingPosition' | 'recordedBy'>[],
  ): Promise<void> {
    // One after the other: of two records of one day the later id is the later word.
    for (const record of records) await this.db.insert(FitRecord, record);
  }

  private joined(): SelectQueryBuilder<Inspection> {
    return this.db
      .createQueryBuilder(Inspection, 'inspection')
      .innerJoinAndSelect('inspection.finding', 'finding')
      .innerJoinAndSelect('finding.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .innerJoinAndSelect('inspection.assignee', 'assignee')
      .innerJoinAndSelect('inspection.assignedBy', 'assignedBy');
  }
}

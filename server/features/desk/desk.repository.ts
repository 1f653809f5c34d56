import { IsNull } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import type { InspectionState } from '#shared/contracts/inspection.ts';

interface LoadRow {
  userId: number;
  openCount: string | number;
  overdueCount: string | number;
}

/** The site's inspections as the lead's board counts and shows them. */
export class DeskRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** Those of one state, in the order given, at most `limit`; `total` counts all. */
  async column(siteId: number, state: InspectionState, order: 'due' | 'newest', limit: number) {
    const found = this.db
      .createQueryBuilder(Inspection, 'inspection')
      .innerJoinAndSelect('inspection.finding', 'finding')
      .innerJoinAndSelect('finding.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .innerJoinAndSelect('inspection.assignee', 'assignee')
      .innerJoinAndSelect('inspection.assignedBy', 'assignedBy')
      .where('finding.siteId = :siteId', { siteId })
      .andWhere('inspection.state = :state', { state });
    const total = await found.clone().getCount();
    if (order === 'due') found.orderBy('inspection.dueOn', 'ASC').addOrderBy('inspection.id');
    else found.orderBy('inspection.id', 'DESC');
    return { total, inspections: await found.limit(limit).getMany() };
  }

  /** Open and overdue tasks of each person who has any. */
  async loads(siteId: number, today: string) {
    const rows = await this.db
      .createQueryBuilder(Inspection, 'inspection')
      .innerJoin('inspection.finding', 'finding')
      .select('inspection.assigneeUserId', 'userId')
      .addSelect('COUNT(*)', 'openCount')
      .addSelect('SUM(inspection.dueOn < :today)', 'overdueCount')
      .where('finding.siteId = :siteId', { siteId })
      .andWhere("inspection.state IN ('assigned', 'accepted')")
      .setParameter('today', today)
      .groupBy('inspection.assigneeUserId')
      .getRawMany<LoadRow>();
    return rows.map(({ userId, openCount, overdueCount }) => ({
      userId,
      openCount: Number(openCount),
      overdueCount: Number(overdueCount),
    }));
  }

  /** How many machines each owner has. */
  async machineCounts(siteId: number): Promise<Map<number, number>> {
    const rows = await this.db
      .createQueryBuilder(Machine, 'machine')
      .select('machine.ownerUserId', 'userId')
      .addSelect('COUNT(*)', 'count')
      .where('machine.siteId = :siteId', { siteId })
      .andWhere('machine.ownerUserId IS NOT NULL')
      .groupBy('machine.ownerUserId')
      .getRawMany<{ userId: number; count: string | number }>();
    return new Map(rows.map(({ userId, count }) => [userId, Number(count)]));
  }

  async machinesWithoutOwner(siteId: number, limit: number) {
    const [machines, total] = await this.db.findAndCount(Machine, {
      where: { siteId, ownerUserId: IsNull() },
      select: { id: true, tag: true, name: true },
      order: { tag: 'ASC' },
      take: limit,
    });
    return { machines, total };
  }
}

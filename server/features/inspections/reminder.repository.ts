import { Between, In, LessThan } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { Membership } from '#server/db/entities/membership.entity.ts';

const relations = {
  finding: { bearingPosition: { machine: true } },
  assignee: true,
  assignedBy: true,
} as const;
const waiting = In(['assigned', 'accepted']);

/** What reminders and summaries are written from. */
export class ReminderRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  dueBetween(first: string, last: string): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: { state: waiting, dueOn: Between(first, last) },
      relations,
      order: { id: 'ASC' },
    });
  }

  dueBefore(day: string, siteId?: number): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: {
        state: waiting,
        dueOn: LessThan(day),
        ...(siteId === undefined ? {} : { finding: { siteId } }),
      },
      relations,
      order: { dueOn: 'ASC', id: 'ASC' },
    });
  }

  leads(): Promise<Membership[]> {
    return this.db.find(Membership, {
      where: { role: 'lead' },
      relations: { user: true, site: true },
      order: { siteId: 'ASC', userId: 'ASC' },
    });
  }

  openFindings(siteId: number): Promise<Finding[]> {
    return this.db.find(Finding, {
      where: { siteId, state: 'open' },
      relations: { bearingPosition: { machine: true } },
      order: { openedAt: 'ASC', id: 'ASC' },
    });
  }
}

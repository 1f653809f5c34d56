import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { CalendarFeed } from '#server/db/entities/calendar-feed.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';

export class CalendarRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  of(userId: number, siteId: number): Promise<CalendarFeed | null> {
    return this.db.findOneBy(CalendarFeed, { userId, siteId });
  }

  byHash(tokenHash: string): Promise<CalendarFeed | null> {
    return this.db.findOne(CalendarFeed, { where: { tokenHash }, relations: { site: true } });
  }

  async revoke(userId: number, siteId: number): Promise<boolean> {
    const result = await this.db.delete(CalendarFeed, { userId, siteId });
    return (result.affected ?? 0) > 0;
  }

  async add(feed: Pick<CalendarFeed, 'userId' | 'siteId' | 'tokenHash' | 'createdAt'>) {
    await this.db.insert(CalendarFeed, { ...feed, lastReadAt: null });
  }

  async markRead(id: number, now: Date): Promise<void> {
    await this.db.update(CalendarFeed, { id }, { lastReadAt: now });
  }

  /** Tasks under way; of one owner, or (null) of the whole site. */
  due(siteId: number, assigneeUserId: number | null): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: {
        state: In(['assigned', 'accepted']),
        finding: { siteId },
        ...(assigneeUserId === null ? {} : { assigneeUserId }),
      },
      relations: { finding: { bearingPosition: { machine: true } }, assignee: true },
      order: { dueOn: 'ASC', id: 'ASC' },
    });
  }
}

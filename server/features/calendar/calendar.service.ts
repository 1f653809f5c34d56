import { createHash, randomBytes } from 'node:crypto';
import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database, Db } from '#server/db/database.ts';
import { notFound } from '#server/http/app-error.ts';
import type { CalendarAddressResponse, CalendarFeedResponse } from '#shared/contracts/calendar.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { CalendarRepository } from './calendar.repository.ts';
import { inspectionCalendar } from './inspection-calendar.ts';

const hashOf = (token: string) => createHash('sha256').update(token).digest('hex');

interface Neighbours {
  roleAt: (userId: number, siteId: number) => Promise<SiteRole | null>;
  publicUrl: () => string;
}

/** Calendar addresses: secret, one for each person and site, made anew or taken back at will. */
export class CalendarService {
  private readonly database: Database;
  private readonly neighbours: Neighbours;
  private readonly now: () => Date;

  constructor(database: Database, neighbours: Neighbours, now: () => Date = () => new Date()) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  async standing({ userId, siteId }: SitePrincipal): Promise<CalendarFeedResponse> {
    const feed = await new CalendarRepository(this.database.db).of(userId, siteId);
    return {
      createdAt: feed?.createdAt.toISOString() ?? null,
      lastReadAt: feed?.lastReadAt?.toISOString() ?? null,
    };
  }

  /** A new address; the one before, if there was one, is dead. */
  async make(principal: SitePrincipal): Promise<CalendarAddressResponse> {
    const { userId, siteId } = principal;
    const token = randomBytes(32).toString('base64url');
    const createdAt = this.now();
    await this.database.transaction(async (db) => {
      const feeds = new CalendarRepository(db);
      await feeds.revoke(userId, siteId);
      await feeds.add({ userId, siteId, tokenHash: hashOf(token), createdAt });
      await this.record(db, principal, 'calendar.made');
    });
    return { address: `${this.neighbours.publicUrl()}/api/calendar/${token}.ics` };
  }

  async revoke(principal: SitePrincipal): Promise<void> {
    await this.database.transaction(async (db) => {
      const { userId, siteId } = principal;
      if (await new CalendarRepository(db).revoke(userId, siteId)) {
        await this.record(db, principal, 'calendar.revoked');
      }
    });
  }

  /** What the address shows now: it follows the role its owner has now, and ends with it. */
  async read(token: string): Promise<string> {
    const feeds = new CalendarRepository(this.database.db);
    const feed = await feeds.byHash(hashOf(token));
    const role = feed === null ? null : await this.neighbours.roleAt(feed.userId, feed.siteId);
    if (feed === null || (role !== 'lead' && role !== 'owner')) throw notFound('calendar');
    const inspections = await feeds.due(feed.siteId, role === 'owner' ? feed.userId : null);
    await feeds.markRead(feed.id, this.now());
    return inspectionCalendar(
      `Inspections due, ${feed.site?.name ?? ''}`,
      `${this.neighbours.publicUrl()}/sites/${feed.siteId}`,
      inspections,
    );
  }

  private record(db: Db, { userId, siteId }: SitePrincipal, action: string): Promise<void> {
    const entry = { siteId, userId, action, objectType: 'user', objectId: userId };
    return recordActivity(db, entry, this.now());
  }
}

import type { Db } from '#server/db/database.ts';
import { Membership } from '#server/db/entities/membership.entity.ts';
import { Site } from '#server/db/entities/site.entity.ts';
import { User } from '#server/db/entities/user.entity.ts';
import type { SiteRole } from '#shared/contracts/session.ts';

/** Sites, people and who holds which role where. */
export class AdministrationRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async sites() {
    const rows = await this.db.query<
      { id: number; name: string; memberCount: string; machineCount: string }[]
    >(
      `SELECT site.id, site.name,
              (SELECT COUNT(*) FROM membership m WHERE m.site_id = site.id) AS memberCount,
              (SELECT COUNT(*) FROM machine WHERE machine.site_id = site.id) AS machineCount
         FROM site ORDER BY site.name`,
    );
    return rows.map((row) => ({
      id: row.id,
      name: row.name,
      memberCount: Number(row.memberCount),
      machineCount: Number(row.machineCount),
    }));
  }

  async insertSite(name: string, now: Date): Promise<number> {
    const result = await this.db.insert(Site, { name, createdAt: now });
    return (result.identifiers[0] as { id: number }).id;
  }

  siteExists(id: number): Promise<boolean> {
    return this.db.existsBy(Site, { id });
  }

  users(): Promise<User[]> {
    return this.db.find(User, { order: { name: 'ASC' } });
  }

  userExists(id: number): Promise<boolean> {
    return this.db.existsBy(User, { id });
  }

  userCount(): Promise<number> {
    return this.db.count(User);
  }

  memberships(): Promise<Membership[]> {
    return this.db.find(Membership, { relations: { site: true }, order: { siteId: 'ASC' } });
  }

  async insertUser(user: Omit<User, 'id'>): Promise<number> {
    const result = await this.db.insert(User, user);
    return (result.identifiers[0] as { id: number }).id;
  }

  async setMembership(userId: number, siteId: number, role: SiteRole | null): Promise<void> {
    if (role === null) await this.db.delete(Membership, { userId, siteId });
    else await this.db.upsert(Membership, { userId, siteId, role }, ['userId', 'siteId']);
  }
}

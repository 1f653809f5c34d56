import type { DataSource } from 'typeorm';
import { Membership } from '#server/db/entities/membership.entity.ts';
import { User } from '#server/db/entities/user.entity.ts';
import type { MembershipResponse, SiteRole } from '#shared/contracts/session.ts';

/** Reads accounts and who belongs where. */
export class AccountRepository {
  private readonly dataSource: DataSource;

  constructor(dataSource: DataSource) {
    this.dataSource = dataSource;
  }

  findByEmail(email: string): Promise<User | null> {
    return this.dataSource.getRepository(User).findOneBy({ email });
  }

  findById(id: number): Promise<User | null> {
    return this.dataSource.getRepository(User).findOneBy({ id });
  }

  async setPasswordHash(id: number, passwordHash: string): Promise<void> {
    await this.dataSource.getRepository(User).update({ id }, { passwordHash });
  }

  async roleAt(userId: number, siteId: number): Promise<SiteRole | null> {
    const membership = await this.dataSource
      .getRepository(Membership)
      .findOneBy({ userId, siteId });
    return membership?.role ?? null;
  }

  async membershipsOf(userId: number): Promise<MembershipResponse[]> {
    const memberships = await this.dataSource
      .getRepository(Membership)
      .find({ where: { userId }, relations: { site: true }, order: { siteId: 'ASC' } });
    return memberships.map((membership) => ({
      siteId: membership.siteId,
      siteName: membership.site?.name ?? '',
      role: membership.role,
    }));
  }

  async membersOf(siteId: number) {
    const memberships = await this.dataSource
      .getRepository(Membership)
      .find({ where: { siteId }, relations: { user: true } });
    return memberships
      .flatMap(({ user, role }) =>
        user ? [{ userId: user.id, name: user.name, email: user.email, role }] : [],
      )
      .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  }
}

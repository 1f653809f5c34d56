import { randomBytes } from 'node:crypto';
import { hashPassword } from '#server/auth/passwords.ts';
import type { Principal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  AdministeredPerson,
  CreatePersonRequest,
  CreateSiteRequest,
} from '#shared/contracts/administration.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { AdministrationRepository } from './administration.repository.ts';

type Actor = Pick<Principal, 'userId'> | null;

/** Sites and people, for administrators; `null` acts for the command line and the demo loader. */
export class AdministrationService {
  private readonly database: Database;
  private readonly now: () => Date;

  constructor(database: Database, now: () => Date = () => new Date()) {
    this.database = database;
    this.now = now;
  }

  sites() {
    return new AdministrationRepository(this.database.db).sites();
  }

  async people(): Promise<AdministeredPerson[]> {
    const repository = new AdministrationRepository(this.database.db);
    const [users, memberships] = await Promise.all([repository.users(), repository.memberships()]);
    return users.map((user) => ({
      userId: user.id,
      name: user.name,
      email: user.email,
      isAdministrator: user.isAdministrator,
      memberships: memberships
        .filter((membership) => membership.userId === user.id)
        .map(({ siteId, site, role }) => ({ siteId, siteName: site?.name ?? '', role })),
    }));
  }

  /** True where nobody can sign in yet. */
  async isEmpty(): Promise<boolean> {
    return (await new AdministrationRepository(this.database.db).userCount()) === 0;
  }

  /**
   * Makes the account that an empty installation begins with, with a password made for it.
   *
   * @returns null where there are people already
   */
  async createFirstAdministrator(): Promise<{ email: string; password: string } | null> {
    if (!(await this.isEmpty())) return null;
    const email = 'administrator@fretline.local';
    const password = randomBytes(12).toString('base64url');
    await this.createPerson(null, {
      name: 'First administrator',
      email,
      password,
      isAdministrator: true,
    });
    return { email, password };
  }

  createSite(actor: Actor, request: CreateSiteRequest): Promise<number> {
    return this.database.transaction(async (db) => {
      const id = await new AdministrationRepository(db)
        .insertSite(request.name, this.now())
        .catch(refuseTaken('name', `There is already a site named ${request.name}.`));
      await recordActivity(db, {
        siteId: id,
        userId: actor?.userId ?? null,
        action: 'site.created',
        objectType: 'site',
        objectId: id,
      });
      return id;
    });
  }

  async createPerson(actor: Actor, request: CreatePersonRequest): Promise<number> {
    const { password, ...person } = request;
    const passwordHash = await hashPassword(password);
    return this.database.transaction(async (db) => {
      const id = await new AdministrationRepository(db)
        .insertUser({ ...person, passwordHash, createdAt: this.now() })
        .catch(refuseTaken('email', `There is already an account for ${person.email}.`));
      await recordActivity(db, {
        siteId: null,
        userId: actor?.userId ?? null,
        action: 'person.created',
        objectType: 'user',
        objectId: id,
      });
      return id;
    });
  }

  async setMembership(
    actor: Actor,
    siteId: number,
    userId: number,
    role: SiteRole | null,
  ): Promise<void> {
    await this.database.transaction(async (db) => {
      const repository = new AdministrationRepository(db);
      if (!(await repository.siteExists(siteId))) throw notFound('site');
      if (!(await repository.userExists(userId))) throw notFound('person');
      await repository.setMembership(userId, siteId, role);
      await recordActivity(db, {
        siteId,
        userId: actor?.userId ?? null,
        action: role === null ? 'membership.removed' : 'membership.set',
        objectType: 'user',
        objectId: userId,
        details: { role },
      });
    });
  }
}

const refuseTaken = (path: string, message: string) => (error: unknown) => {
  if (!isDuplicateKey(error)) throw error;
  throw new AppError('conflict', message, { cause: error, fields: [{ path, message }] });
};

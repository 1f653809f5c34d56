import type { Db } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { MailOptOut } from '#server/db/entities/mail-opt-out.entity.ts';
import { User } from '#server/db/entities/user.entity.ts';
import type { MailKind } from '#shared/contracts/mail.ts';

/** Which kinds of mail a person has switched off. */
export class MailChoiceRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** Whether the account still exists. */
  isKnown(userId: number): Promise<boolean> {
    return this.db.existsBy(User, { id: userId });
  }

  async isWanted(userId: number, kind: MailKind): Promise<boolean> {
    return !(await this.db.existsBy(MailOptOut, { userId, kind }));
  }

  async unwantedOf(userId: number): Promise<Set<MailKind>> {
    const rows = await this.db.findBy(MailOptOut, { userId });
    return new Set(rows.map(({ kind }) => kind));
  }

  async set(userId: number, kind: MailKind, wanted: boolean, now: Date): Promise<void> {
    if (wanted) {
      await this.db.delete(MailOptOut, { userId, kind });
      return;
    }
    try {
      await this.db.insert(MailOptOut, { userId, kind, optedOutAt: now });
    } catch (error) {
      if (!isDuplicateKey(error)) throw error;
    }
  }
}

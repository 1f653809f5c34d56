import type { Principal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import type { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import { notFound } from '#server/http/app-error.ts';
import { OutboxRepository } from '#server/mail/outbox.repository.ts';
import type { OutboxItem, OutboxQuery, OutboxResponse } from '#shared/contracts/mail.ts';

const mailsShown = 200;

/** Whom, when and what about; what a mail says is its reader's. */
const presentMail = (mail: OutboxMail): OutboxItem => ({
  id: mail.id,
  kind: mail.kind,
  toAddress: mail.toAddress,
  subject: mail.subject,
  state: mail.state,
  attempts: mail.attempts,
  lastError: mail.lastError,
  createdAt: mail.createdAt.toISOString(),
  sentAt: mail.sentAt?.toISOString() ?? null,
  nextAttemptAt: mail.state === 'waiting' ? mail.nextAttemptAt.toISOString() : null,
});

/** What became of the mails: for the lead those of the site, for the administrator all. */
export class OutboxService {
  private readonly database: Database;
  private readonly now: () => Date;

  constructor(database: Database, now: () => Date = () => new Date()) {
    this.database = database;
    this.now = now;
  }

  /** @param siteId - null for all sites */
  async list(siteId: number | null, query: OutboxQuery): Promise<OutboxResponse> {
    const outbox = new OutboxRepository(this.database.db);
    return {
      mails: (await outbox.newest(siteId, query.faulty, mailsShown)).map(presentMail),
      waitingCount: await outbox.count(siteId, 'waiting'),
      failedCount: await outbox.count(siteId, 'failed'),
    };
  }

  async sendAgain({ userId }: Principal, siteId: number | null, mailId: number): Promise<void> {
    const now = this.now();
    await this.database.transaction(async (db) => {
      const isWaiting = await new OutboxRepository(db).sendAgain(siteId, mailId, now);
      if (!isWaiting) throw notFound('mail');
      const entry = { siteId, userId, action: 'mail.sent-again', objectType: 'mail' };
      await recordActivity(db, { ...entry, objectId: mailId }, now);
    });
  }
}

import { In, IsNull, LessThanOrEqual, MoreThan } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import type { MailKind, OutboxState } from '#shared/contracts/mail.ts';

export interface NewMail {
  kind: MailKind;
  siteId: number;
  toUserId: number;
  /** Names the occasion; the same occasion never makes two mails. */
  occasion: string;
  toAddress: string;
  subject: string;
  textBody: string;
  htmlBody: string;
}

/** Mails to be sent. Written in the transaction that calls for them, so neither is without the other. */
export class OutboxRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async add(mail: NewMail, now: Date): Promise<void> {
    try {
      await this.db.insert(OutboxMail, {
        ...mail,
        state: 'waiting',
        attempts: 0,
        nextAttemptAt: now,
        lastError: null,
        createdAt: now,
        sentAt: null,
      });
    } catch (error) {
      if (!isDuplicateKey(error)) throw error;
    }
  }

  /** Those of the occasions that have their mail already. */
  async written(occasions: readonly string[]): Promise<Set<string>> {
    if (occasions.length === 0) return new Set();
    const rows = await this.db.find(OutboxMail, {
      select: { occasion: true },
      where: { occasion: In(occasions) },
    });
    return new Set(rows.map(({ occasion }) => occasion));
  }

  /** Newest first; of one site, or (null) of all. */
  newest(siteId: number | null, isFaultyOnly: boolean, limit: number): Promise<OutboxMail[]> {
    const site = siteId === null ? {} : { siteId };
    return this.db.find(OutboxMail, {
      where: isFaultyOnly
        ? [
            { ...site, state: 'failed' },
            { ...site, state: 'waiting', attempts: MoreThan(0) },
          ]
        : site,
      order: { id: 'DESC' },
      take: limit,
    });
  }

  count(siteId: number | null, state: OutboxState): Promise<number> {
    return this.db.countBy(OutboxMail, siteId === null ? { state } : { siteId, state });
  }

  /** Lets a mail that isn't sent yet begin anew with its attempts; false where there is none such. */
  async sendAgain(siteId: number | null, id: number, now: Date): Promise<boolean> {
    const result = await this.db.update(
      OutboxMail,
      { id, state: In(['failed', 'waiting']), ...(siteId === null ? {} : { siteId }) },
      { state: 'waiting', attempts: 0, nextAttemptAt: now },
    );
    return result.affected === 1;
  }

  due(now: Date, limit: number): Promise<OutboxMail[]> {
    return this.db.find(OutboxMail, {
      where: { state: 'waiting', nextAttemptAt: LessThanOrEqual(now), sentAt: IsNull() },
      order: { id: 'ASC' },
      take: limit,
    });
  }

  /** Takes a mail for one attempt; false if another process took it. `until` is when others may try. */
  async claim(mail: OutboxMail, until: Date): Promise<boolean> {
    const result = await this.db.update(
      OutboxMail,
      { id: mail.id, state: 'waiting', attempts: mail.attempts },
      { attempts: mail.attempts + 1, nextAttemptAt: until },
    );
    return result.affected === 1;
  }

  async markSent(id: number, now: Date): Promise<void> {
    await this.db.update(OutboxMail, { id }, { state: 'sent', sentAt: now, lastError: null });
  }

  async markTried(id: number, error: string, next: Date | null): Promise<void> {
    await this.db.update(
      OutboxMail,
      { id },
      next === null
        ? { state: 'failed', lastError: error }
        : { lastError: error, nextAttemptAt: next },
    );
  }
}

import type { Database } from '#server/db/database.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import { notFound } from '#server/http/app-error.ts';
import { MailChoiceRepository } from '#server/mail/mail-choice.repository.ts';
import { readUnsubscribeToken } from '#server/mail/unsubscribe-token.ts';
import type { Principal } from '#server/auth/principal.ts';
import {
  mailKinds,
  type MailChoiceRequest,
  type MailChoicesResponse,
  type UnsubscribeResponse,
} from '#shared/contracts/mail.ts';

/** Which mails a person gets: chosen signed in, or switched off by the link in a mail. */
export class MailChoicesService {
  private readonly database: Database;
  private readonly authSecret: string;
  private readonly now: () => Date;

  constructor(database: Database, authSecret: string, now: () => Date = () => new Date()) {
    this.database = database;
    this.authSecret = authSecret;
    this.now = now;
  }

  async choicesOf({ userId, email }: Principal): Promise<MailChoicesResponse> {
    const unwanted = await new MailChoiceRepository(this.database.db).unwantedOf(userId);
    return {
      email,
      choices: mailKinds.map((kind) => ({ kind, wanted: !unwanted.has(kind) })),
    };
  }

  async choose(principal: Principal, choice: MailChoiceRequest): Promise<MailChoicesResponse> {
    await this.set(principal.userId, choice, 'on the account page');
    return this.choicesOf(principal);
  }

  /** Reading a link changes nothing: mail scanners follow links too. */
  async standingOf(token: string): Promise<UnsubscribeResponse> {
    const { userId, kind } = this.read(token);
    const wanted = await new MailChoiceRepository(this.database.db).isWanted(userId, kind);
    return { kind, wanted };
  }

  async unsubscribe(token: string): Promise<UnsubscribeResponse> {
    const { userId, kind } = this.read(token);
    await this.set(userId, { kind, wanted: false }, 'by the link in a mail');
    return { kind, wanted: false };
  }

  private read(token: string) {
    const read = readUnsubscribeToken(token, this.authSecret);
    if (read === null) throw notFound('link');
    return read;
  }

  private set(userId: number, { kind, wanted }: MailChoiceRequest, how: string): Promise<void> {
    const now = this.now();
    return this.database.transaction(async (db) => {
      const choices = new MailChoiceRepository(db);
      if (!(await choices.isKnown(userId))) throw notFound('link');
      await choices.set(userId, kind, wanted, now);
      await recordActivity(
        db,
        {
          siteId: null,
          userId,
          action: 'account.mail-chosen',
          objectType: 'user',
          objectId: userId,
          details: { kind, wanted, how },
        },
        now,
      );
    });
  }
}

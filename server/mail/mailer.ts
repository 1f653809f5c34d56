import type { Db } from '#server/db/database.ts';
import { mailKindWords, type MailKind } from '#shared/contracts/mail.ts';
import { mailBody, type MailPart } from './mail-body.ts';
import { MailChoiceRepository } from './mail-choice.repository.ts';
import { OutboxRepository } from './outbox.repository.ts';
import { signUnsubscribeToken } from './unsubscribe-token.ts';

/** A mail to one person, by the occasion it is written for. */
export interface PersonalMail {
  kind: MailKind;
  siteId: number;
  to: { userId: number; email: string };
  /** Names the occasion and, where several get it, the reader: the same one never makes two mails. */
  occasion: string;
  subject: string;
  parts: readonly MailPart[];
}

const subjectMax = 200;

export interface MailerOptions {
  publicUrl: () => string;
  authSecret: string;
}

/** Writes mails into the outbox, each in the product's look and with its way to get no more of them. */
export class Mailer {
  private readonly options: MailerOptions;

  constructor(options: MailerOptions) {
    this.options = options;
  }

  /** @returns whether the mail is to be sent; false where its reader has switched the kind off */
  async add(db: Db, mail: PersonalMail, now: Date): Promise<boolean> {
    const { kind, siteId, to, occasion, subject, parts } = mail;
    if (!(await new MailChoiceRepository(db).isWanted(to.userId, kind))) return false;
    const foot = {
      why: `This kind of mail is switched on for you: ${mailKindWords[kind]}.`,
      unsubscribeLink: this.unsubscribePage(to.userId, kind),
      choicesLink: `${this.options.publicUrl()}/account`,
    };
    await new OutboxRepository(db).add(
      {
        kind,
        siteId,
        toUserId: to.userId,
        occasion,
        toAddress: to.email,
        subject: subject.length > subjectMax ? `${subject.slice(0, subjectMax - 1)}…` : subject,
        ...mailBody(parts, foot),
      },
      now,
    );
    return true;
  }

  /** The page with the button. */
  private unsubscribePage(userId: number, kind: MailKind): string {
    return `${this.options.publicUrl()}/unsubscribe/${this.token(userId, kind)}`;
  }

  /** What a mail program posts to by itself (RFC 8058); opened in a browser it leads to the page. */
  unsubscribeAddress(userId: number, kind: MailKind): string {
    return `${this.options.publicUrl()}/api/unsubscribe/${this.token(userId, kind)}`;
  }

  private token(userId: number, kind: MailKind): string {
    return signUnsubscribeToken(userId, kind, this.options.authSecret);
  }
}

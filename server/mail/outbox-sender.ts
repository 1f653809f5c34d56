import type { Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import type { Database } from '#server/db/database.ts';
import type { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import type { MailKind } from '#shared/contracts/mail.ts';
import { OutboxRepository } from './outbox.repository.ts';

const pollIntervalMs = 1_000;
const batchSize = 20;
/** How long a claimed mail is left to the process that claimed it. */
const claimMs = 60_000;
/** Back-off of the attempts: half a minute, doubled up to an hour, given up after about a day. */
const firstRetryMs = 30_000;
const longestRetryMs = 3_600_000;
const attemptsMax = 30;

export interface OutboxSenderOptions {
  database: Database;
  transport: Pick<Transporter, 'sendMail'>;
  from: string;
  logger: Logger;
  /** Where a mail program posts to on its reader's "unsubscribe". */
  unsubscribeAddress: (userId: number, kind: MailKind) => string;
  now?: () => Date;
}

/**
 * Sends what lies in the outbox. A mail is claimed before it is handed over and marked afterwards;
 * its Message-ID is made from its id, so that the one repeat a crash between the two can cause is
 * recognisable as the same mail.
 */
export class OutboxSender {
  private readonly options: OutboxSenderOptions;
  private timer: NodeJS.Timeout | undefined;
  private running: Promise<void> = Promise.resolve();
  private stopped = false;

  constructor(options: OutboxSenderOptions) {
    this.options = options;
  }

  start(): void {
    const tick = () => {
      this.running = this.sendDue().catch((error: unknown) =>
        this.options.logger.error({ err: error }, 'the outbox could not be read'),
      );
      void this.running.then(() => {
        if (!this.stopped) this.timer = setTimeout(tick, pollIntervalMs);
      });
    };
    tick();
  }

  async stop(): Promise<void> {
    this.stopped = true;
    clearTimeout(this.timer);
    await this.running;
  }

  /** Sends every mail that is due now. */
  async sendDue(): Promise<void> {
    const { database, transport, from, logger, now = () => new Date() } = this.options;
    const outbox = new OutboxRepository(database.db);
    for (const mail of await outbox.due(now(), batchSize)) {
      if (this.stopped) return;
      if (!(await outbox.claim(mail, new Date(now().getTime() + claimMs)))) continue;
      try {
        await transport.sendMail({
          messageId: `<outbox-${mail.id}-${mail.createdAt.getTime()}@fretline.invalid>`,
          from,
          to: mail.toAddress,
          subject: mail.subject,
          text: mail.textBody,
          html: mail.htmlBody,
          headers: this.headersOf(mail),
        });
        await outbox.markSent(mail.id, now());
      } catch (error) {
        const message = error instanceof Error ? error.message : String(error);
        const attempt = mail.attempts + 1;
        const waitMs = Math.min(firstRetryMs * 2 ** (attempt - 1), longestRetryMs);
        const next = attempt >= attemptsMax ? null : new Date(now().getTime() + waitMs);
        await outbox.markTried(mail.id, message, next);
        logger.warn({ mailId: mail.id, attempt, error: message }, 'a mail could not be sent');
      }
    }
  }

  /** RFC 8058: unsubscribing by one click in the mail program, without opening anything. */
  private headersOf({ toUserId, kind }: OutboxMail): Record<string, string> {
    if (toUserId === null || kind === null) return {};
    return {
      'List-Unsubscribe': `<${this.options.unsubscribeAddress(toUserId, kind)}>`,
      'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
      'Auto-Submitted': 'auto-generated',
    };
  }
}

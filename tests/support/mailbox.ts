import { createTransport, type Transporter } from 'nodemailer';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { onTestFinished } from 'vitest';
import { Database } from '#server/db/database.ts';
import { DemoMailRepository } from '#server/mail/demo-mail.repository.ts';
import { FakeSmtpServer } from '#server/mail/fake-smtp-server.ts';
import { Mailer } from '#server/mail/mailer.ts';
import { OutboxSender } from '#server/mail/outbox-sender.ts';
import { testAuthSecret, testPublicUrl } from './test-app.ts';

const logger = pino({ level: 'silent' });

/** A sender over the test database, at the time that `now` tells. */
export function buildSender(
  dataSource: DataSource,
  transport: Pick<Transporter, 'sendMail'>,
  now?: () => Date,
): OutboxSender {
  const mailer = new Mailer({ publicUrl: () => testPublicUrl, authSecret: testAuthSecret });
  return new OutboxSender({
    database: new Database(dataSource),
    transport,
    from: 'Fretline <fretline@plant.example>',
    logger,
    unsubscribeAddress: mailer.unsubscribeAddress.bind(mailer),
    now,
  });
}

/** The local fake SMTP server, its mailbox, and a sender that delivers to it. */
export async function openMailbox(dataSource: DataSource, now?: () => Date) {
  const mailbox = new DemoMailRepository(new Database(dataSource).db);
  const server = new FakeSmtpServer((mail) => mailbox.add(mail), logger);
  const url = await server.listen();
  onTestFinished(() => server.close());
  const sender = buildSender(dataSource, createTransport(url), now);
  return {
    url,
    deliver: () => sender.sendDue(),
    /** Delivers what is due and reads all that has come, oldest first. */
    received: async () => {
      await sender.sendDue();
      return (await mailbox.newest(100)).reverse();
    },
  };
}

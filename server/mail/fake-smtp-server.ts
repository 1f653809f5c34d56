import { simpleParser, type AddressObject } from 'mailparser';
import type { AddressInfo } from 'node:net';
import type { Logger } from 'pino';
import { SMTPServer } from 'smtp-server';
import type { ReceivedMail } from './demo-mail.repository.ts';

const addressesOf = (addresses: AddressObject | AddressObject[] | undefined) =>
  [addresses ?? []]
    .flat()
    .map((address) => address.text)
    .join(', ');

/**
 * A real SMTP server on loopback that delivers nowhere: every mail goes to `receive`. Used where no
 * SMTP_URL is given, so that the mails of the demo can be read without any service.
 */
export class FakeSmtpServer {
  private readonly server: SMTPServer;

  constructor(receive: (mail: ReceivedMail) => Promise<void>, logger: Logger) {
    this.server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      onData(stream, _session, done) {
        simpleParser(stream)
          .then((mail) =>
            receive({
              toAddress: addressesOf(mail.to),
              fromAddress: addressesOf(mail.from),
              subject: mail.subject ?? '',
              textBody: mail.text ?? '',
              htmlBody: mail.html || '',
              receivedAt: new Date(),
            }),
          )
          .then(() => done())
          .catch((error: Error) => done(error));
      },
    });
    this.server.on('error', (error) => logger.error({ err: error }, 'fake SMTP server'));
  }

  /** Listens on a free loopback port and tells its address. */
  listen(): Promise<string> {
    return new Promise((resolve, reject) => {
      this.server.once('error', reject);
      this.server.listen(0, '127.0.0.1', () => {
        const { port } = this.server.server.address() as AddressInfo;
        resolve(`smtp://127.0.0.1:${port}`);
      });
    });
  }

  close(): Promise<void> {
    return new Promise((resolve) => this.server.close(() => resolve()));
  }
}

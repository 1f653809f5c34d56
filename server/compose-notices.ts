import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import type { AccountRepository } from './auth/account.repository.ts';
import type { Config } from './config/config.ts';
import type { Database } from './db/database.ts';
import { accountRoutes } from './features/account/account.routes.ts';
import { MailChoicesService } from './features/account/mail-choices.service.ts';
import { calendarRoutes } from './features/calendar/calendar.routes.ts';
import { CalendarService } from './features/calendar/calendar.service.ts';
import { demoMailboxRoutes } from './features/demo-mailbox/demo-mailbox.routes.ts';
import { deskRoutes } from './features/desk/desk.routes.ts';
import { DeskService } from './features/desk/desk.service.ts';
import { ChangeInspection } from './features/inspections/change-inspection.ts';
import { DueReminders } from './features/inspections/due-reminders.ts';
import type { InspectionNeighbours } from './features/inspections/inspection-neighbours.ts';
import { presentInspectionItem } from './features/inspections/inspection.presenter.ts';
import { todayAnywhere } from './features/inspections/today-anywhere.ts';
import { outboxRoutes } from './features/outbox/outbox.routes.ts';
import { OutboxService } from './features/outbox/outbox.service.ts';
import { ReviewRepository } from './features/review/review.repository.ts';
import { webhookRoutes } from './features/webhooks/webhook.routes.ts';
import { WebhookSender } from './features/webhooks/webhook-sender.ts';
import { WebhookService } from './features/webhooks/webhook.service.ts';
import type { Route } from './http/route.ts';
import { DemoMailRepository } from './mail/demo-mail.repository.ts';
import { FakeSmtpServer } from './mail/fake-smtp-server.ts';
import type { Mailer } from './mail/mailer.ts';
import { OutboxSender } from './mail/outbox-sender.ts';
import { RegularRound } from './mail/regular-round.ts';

const reminderRoundMs = 5 * 60 * 1000;
const webhookRoundMs = 3_000;

export interface Background {
  stop: () => Promise<void>;
}

interface NoticeParts {
  config: Config;
  database: Database;
  logger: Logger;
  accounts: AccountRepository;
  mailer: Mailer;
  inspectionNeighbours: InspectionNeighbours;
  publicUrl: () => string;
  now: (() => Date) | undefined;
}

/** The part of the composition that tells people and programs of inspections, and follows them up. */
export function composeNotices(parts: NoticeParts) {
  const { config, database, logger, accounts, mailer, inspectionNeighbours, publicUrl, now } =
    parts;
  const membersOf = accounts.membersOf.bind(accounts);
  const desk = new DeskService(
    database,
    { presentInspectionItem, today: todayAnywhere, membersOf },
    now,
  );
  const reminders = new DueReminders(
    database,
    {
      addMail: mailer.add.bind(mailer),
      publicUrl,
      flagsWaiting: (siteId) => new ReviewRepository(database.db).countOpen(siteId),
    },
    now,
  );
  const calendar = new CalendarService(
    database,
    { roleAt: accounts.roleAt.bind(accounts), publicUrl },
    now,
  );
  const allowsInnerTargets = config.webhookInnerTargets;
  const demoMails = new DemoMailRepository(database.db);

  const routes: Route[] = [
    ...accountRoutes(new MailChoicesService(database, config.authSecret, now), publicUrl),
    ...outboxRoutes(new OutboxService(database, now)),
    ...deskRoutes(desk, new ChangeInspection(database, inspectionNeighbours, now)),
    ...calendarRoutes(calendar),
    ...webhookRoutes(new WebhookService(database, allowsInnerTargets, now)),
    ...(config.demo ? demoMailboxRoutes(demoMails, publicUrl) : []),
  ];

  /** @returns what has been started, in this order */
  const start = async (): Promise<Background[]> => {
    const started: Background[] = [];
    let smtpUrl = config.smtpUrl;
    if (smtpUrl === undefined) {
      const fake = new FakeSmtpServer((mail) => demoMails.add(mail), logger);
      smtpUrl = await fake.listen();
      started.push({ stop: () => fake.close() });
    }
    const sender = new OutboxSender({
      database,
      transport: createTransport(smtpUrl),
      from: config.mailFrom,
      logger,
      unsubscribeAddress: mailer.unsubscribeAddress.bind(mailer),
      now,
    });
    sender.start();
    const reminderRound = new RegularRound({
      name: 'reminders',
      everyMs: reminderRoundMs,
      run: () => reminders.round(),
      logger,
    });
    reminderRound.start();
    const webhooks = new WebhookSender({ database, logger, publicUrl, allowsInnerTargets, now });
    const webhookRound = new RegularRound({
      name: 'webhooks',
      everyMs: webhookRoundMs,
      run: () => webhooks.round(),
      logger,
    });
    webhookRound.start();
    return [...started, sender, reminderRound, webhookRound];
  };
  return { routes, start };
}

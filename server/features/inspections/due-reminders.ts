import type { Database } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { User } from '#server/db/entities/user.entity.ts';
import type { PersonalMail } from '#server/mail/mailer.ts';
import { OutboxRepository } from '#server/mail/outbox.repository.ts';
import { addDays, daysBetween, mondayOf } from './calendar-days.ts';
import { mailFactsOf } from './inspection-mails.ts';
import type { InspectionNeighbours } from './inspection-neighbours.ts';
import { dueSoonMail, overdueMail, weeklyMail } from './reminder-mails.ts';
import { ReminderRepository } from './reminder.repository.ts';
import { todayAnywhere } from './today-anywhere.ts';

/** An owner is told this long before the day; who got the task later than that knows. */
const soonDays = 3;
/** An overdue inspection is told again after each such period. */
const overdueEveryDays = 7;
/** The weekly summary is written on Monday from this hour (UTC); a server that was off has till Wednesday. */
const weeklyFromHour = 5;
const weeklyUntilDay = 3;

interface Neighbours extends Pick<InspectionNeighbours, 'addMail' | 'publicUrl'> {
  flagsWaiting: (siteId: number) => Promise<number>;
}

/**
 * The mails that nobody's action calls for. What has been written is known by its occasion in the
 * outbox, so a round that is run twice, late, or by two servers writes nothing twice.
 */
export class DueReminders {
  private readonly database: Database;
  private readonly neighbours: Neighbours;
  private readonly now: () => Date;

  constructor(database: Database, neighbours: Neighbours, now: () => Date = () => new Date()) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  async round(): Promise<void> {
    await this.write(await this.dueSoon());
    await this.write(await this.overdue());
    await this.weekly();
  }

  private async dueSoon(): Promise<PersonalMail[]> {
    const today = todayAnywhere(this.now());
    const due = await this.reminders().dueBetween(today, addDays(today, soonDays));
    return due.flatMap((inspection) => {
      const { id, dueOn, assignedAt } = inspection;
      if (assignedAt.toISOString().slice(0, 10) >= addDays(dueOn, -soonDays)) return [];
      const facts = this.factsOf(inspection);
      return this.to(inspection.assignee, inspection, {
        kind: 'due-soon',
        occasion: `inspection:${id}:due-soon:${dueOn}`,
        ...dueSoonMail(facts, daysBetween(today, dueOn)),
      });
    });
  }

  private async overdue(): Promise<PersonalMail[]> {
    const today = todayAnywhere(this.now());
    const overdue = await this.reminders().dueBefore(today);
    return overdue.flatMap((inspection) => {
      const { id, dueOn, assignee, assignedBy } = inspection;
      const daysOver = daysBetween(dueOn, today);
      const period = Math.floor((daysOver - 1) / overdueEveryDays);
      const facts = this.factsOf(inspection);
      const mailTo = (person: User | undefined, reader: 'assignee' | 'lead') =>
        this.to(person, inspection, {
          kind: 'overdue',
          occasion: `inspection:${id}:overdue:${dueOn}:${period}`,
          ...overdueMail(facts, daysOver, reader),
        });
      return [...mailTo(assignee, 'assignee'), ...mailTo(assignedBy, 'lead')];
    });
  }

  private async weekly(): Promise<void> {
    const now = this.now();
    const today = now.toISOString().slice(0, 10);
    const monday = mondayOf(today);
    const day = daysBetween(monday, today);
    if (day >= weeklyUntilDay || (day === 0 && now.getUTCHours() < weeklyFromHour)) return;
    const mails: PersonalMail[] = [];
    for (const { siteId, site, user } of await this.reminders().leads()) {
      if (!site || !user) continue;
      const occasion = `weekly:${siteId}:${monday}:${user.id}`;
      if ((await new OutboxRepository(this.database.db).written([occasion])).size > 0) continue;
      const week = {
        siteId,
        siteName: site.name,
        findings: await this.reminders().openFindings(siteId),
        overdue: await this.reminders().dueBefore(todayAnywhere(now), siteId),
        flagsWaiting: await this.neighbours.flagsWaiting(siteId),
      };
      // A week in which nothing waits asks for nobody's attention.
      if (week.findings.length + week.overdue.length + week.flagsWaiting === 0) continue;
      const to = { userId: user.id, email: user.email };
      const text = weeklyMail(this.neighbours.publicUrl(), week);
      mails.push({ kind: 'weekly', siteId, to, occasion, ...text });
    }
    await this.write(mails);
  }

  private to(
    person: User | undefined,
    inspection: Inspection,
    mail: Omit<PersonalMail, 'siteId' | 'to'>,
  ): PersonalMail[] {
    const siteId = inspection.finding?.siteId;
    if (person === undefined || siteId === undefined) return [];
    return [
      {
        ...mail,
        occasion: `${mail.occasion}:${person.id}`,
        siteId,
        to: { userId: person.id, email: person.email },
      },
    ];
  }

  private async write(mails: readonly PersonalMail[]): Promise<void> {
    const { db } = this.database;
    const written = await new OutboxRepository(db).written(mails.map(({ occasion }) => occasion));
    for (const mail of mails) {
      if (!written.has(mail.occasion)) await this.neighbours.addMail(db, mail, this.now());
    }
  }

  private factsOf(inspection: Inspection) {
    const siteId = inspection.finding?.siteId ?? 0;
    return mailFactsOf(this.neighbours.publicUrl(), siteId, inspection);
  }

  private reminders(): ReminderRepository {
    return new ReminderRepository(this.database.db);
  }
}

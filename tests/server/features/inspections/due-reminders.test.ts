import { describe, expect, it } from 'vitest';
import { Database } from '#server/db/database.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { DueReminders } from '#server/features/inspections/due-reminders.ts';
import { ReviewRepository } from '#server/features/review/review.repository.ts';
import { Mailer } from '#server/mail/mailer.ts';
import { openMailbox } from '#tests/support/mailbox.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp, testAuthSecret, testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { inspectionStory } from './inspection-story.ts';

const database = useTestDatabase();
const { assigned, openFinding } = inspectionStory(database);

/** Assigned on 1 October 2026 and due on Friday, 20 November, whatever day the test runs on. */
async function dueTask(plant: Plant) {
  const task = await assigned(plant);
  const dates = { assignedAt: new Date('2026-10-01T08:00:00Z'), dueOn: '2026-11-20' };
  await database().getRepository(Inspection).update({ id: task.inspectionId }, dates);
  return task;
}

async function roundsAt(...times: string[]) {
  let at = new Date();
  const now = () => at;
  const mailer = new Mailer({ publicUrl: () => testPublicUrl, authSecret: testAuthSecret });
  const reminders = new DueReminders(
    new Database(database()),
    {
      addMail: mailer.add.bind(mailer),
      publicUrl: () => testPublicUrl,
      flagsWaiting: (siteId) => new ReviewRepository(database().manager).countOpen(siteId),
    },
    now,
  );
  const mailbox = await openMailbox(database(), () => new Date(Math.max(at.getTime(), Date.now())));
  const before = (await mailbox.received()).length;
  for (const time of times) {
    at = new Date(time);
    await reminders.round();
  }
  return (await mailbox.received()).slice(before);
}

const told = (mails: { toAddress: string; subject: string }[]) =>
  mails.map(({ toAddress, subject }) => `${toAddress}: ${subject}`);

describe('the reminders of an inspection', () => {
  it('tell the owner once that it is due soon, with the work order and the link', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await dueTask(plant);
    const mails = await roundsAt(
      '2026-11-13T20:00:00Z',
      '2026-11-19T08:00:00Z',
      '2026-11-19T08:05:00Z',
      '2026-11-20T09:00:00Z',
    );
    expect(told(mails)).toEqual([
      `${plant.owner.email}: Due in 2 days: fit inspection of P-101 Circulation pump, Pump, drive end`,
    ]);
    expect(mails[0]?.textBody).toContain('Work order: WO-4711');
    const link = `${testPublicUrl}/sites/${plant.site.id}/inspections/${inspectionId}`;
    expect(mails[0]?.textBody).toContain(link);
  });

  it('say nothing before the day to who got the task only then', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await dueTask(plant);
    const assignedAt = new Date('2026-11-18T08:00:00Z');
    await database().getRepository(Inspection).update({ id: inspectionId }, { assignedAt });
    expect(await roundsAt('2026-11-19T08:00:00Z')).toEqual([]);
  });

  it('tell owner and lead once a week that it is overdue, until it is reported', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await dueTask(plant);
    // Not before the day has passed everywhere: noon of the next day in UTC.
    expect(await roundsAt('2026-11-21T11:00:00Z')).toHaveLength(1);
    const first = await roundsAt('2026-11-21T13:00:00Z', '2026-11-22T13:00:00Z');
    expect(told(first)).toEqual(
      [plant.owner, plant.lead].map(
        ({ email }) =>
          `${email}: Overdue by 1 day: fit inspection of P-101 Circulation pump, Pump, drive end`,
      ),
    );
    expect(await roundsAt('2026-11-28T13:00:00Z')).toHaveLength(2);
    const state = { state: 'reported' } as const;
    await database().getRepository(Inspection).update({ id: inspectionId }, state);
    expect(await roundsAt('2026-12-12T13:00:00Z')).toEqual([]);
  });

  it('are written once by two servers at once', async () => {
    const plant = await buildPlant(database());
    await dueTask(plant);
    const both = await Promise.all([
      roundsAt('2026-11-21T13:00:00Z'),
      roundsAt('2026-11-21T13:00:00Z'),
    ]);
    const mailbox = await openMailbox(database());
    const overdue = (await mailbox.received()).filter(({ subject }) => /Overdue/.test(subject));
    expect(both.flat().length).toBeGreaterThan(0);
    expect(overdue).toHaveLength(2);
  });

  it('are not written for who has switched the kind off', async () => {
    const plant = await buildPlant(database());
    await dueTask(plant);
    const choice = { kind: 'overdue', wanted: false };
    await buildTestApp(database()).as(plant.owner).put('/api/account/mail', choice);
    expect(told(await roundsAt('2026-11-21T13:00:00Z'))).toEqual([
      expect.stringMatching(`^${plant.lead.email}: Overdue`),
    ]);
  });
});

describe('the weekly summary', () => {
  it('tells each lead on Monday morning what waits, and not again that week', async () => {
    const plant = await buildPlant(database());
    await dueTask(plant);
    await plant.flag('horizontal');
    const monday = await roundsAt('2026-11-23T04:00:00Z', '2026-11-23T06:00:00Z');
    const summaries = monday.filter(({ subject }) => /flag/.test(subject));
    expect(told(summaries)).toEqual([
      `${plant.lead.email}: ${plant.site.name}: 0 open findings, 1 overdue inspection, 1 flag waiting`,
    ]);
    expect(summaries[0]?.textBody).toMatch(
      /P-101 .*: was due 2026-11-20, with Oskar Owner, work order WO-4711/,
    );
    expect(await roundsAt('2026-11-23T18:00:00Z', '2026-11-25T18:00:00Z')).toEqual([]);
    const next = await roundsAt('2026-11-30T06:00:00Z');
    expect(next.filter(({ subject }) => /flag/.test(subject))).toHaveLength(1);
  });

  it('is made up for until Wednesday and lists the findings nobody has decided on', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    expect(await roundsAt('2026-11-26T08:00:00Z', '2026-11-29T08:00:00Z')).toEqual([]);
    const [mail, ...others] = await roundsAt('2026-12-02T08:00:00Z');
    expect(others).toEqual([]);
    expect(mail?.subject).toContain('1 open finding,');
    expect(mail?.textBody).toContain(`/sites/${plant.site.id}/findings/${findingId}`);
  });

  it('is not written where nothing waits', async () => {
    await buildPlant(database());
    expect(await roundsAt('2026-11-23T06:00:00Z')).toEqual([]);
  });
});

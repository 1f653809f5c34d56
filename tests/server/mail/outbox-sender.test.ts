import { simpleParser } from 'mailparser';
import { createTransport } from 'nodemailer';
import { describe, expect, it } from 'vitest';
import { Database } from '#server/db/database.ts';
import { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import { Mailer } from '#server/mail/mailer.ts';
import type { OutboxResponse } from '#shared/contracts/mail.ts';
import { buildSender, openMailbox } from '#tests/support/mailbox.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp, testAuthSecret, testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();
const start = new Date('2026-11-30T08:00:00Z');

/** A clock that stands still until it is moved. */
function clockAt(date: Date) {
  let ms = date.getTime();
  return { now: () => new Date(ms), forwardS: (s: number) => void (ms += s * 1000) };
}

const write = (plant: Plant, occasion: string, subject = 'A pump') =>
  new Mailer({ publicUrl: () => testPublicUrl, authSecret: testAuthSecret }).add(
    new Database(database()).db,
    {
      kind: 'assigned',
      siteId: plant.site.id,
      to: { userId: plant.owner.id, email: plant.owner.email },
      occasion,
      subject,
      parts: [{ text: 'Look at <it>.' }, { link: `${testPublicUrl}/x`, label: 'Open' }],
    },
    start,
  );

const faulty = async (plant: Plant) =>
  (await buildTestApp(database()).as(plant.lead).get(plant.path('/mails?faulty=true')))
    .body as OutboxResponse;

describe('the outbox', () => {
  it('delivers a mail once, also where its occasion comes up again', async () => {
    const plant = await buildPlant(database());
    const mailbox = await openMailbox(database(), () => start);
    await write(plant, 'one');
    await write(plant, 'one');
    await mailbox.deliver();
    await write(plant, 'one');
    const mails = await mailbox.received();
    expect(mails).toHaveLength(1);
    expect(mails[0]).toMatchObject({ toAddress: plant.owner.email, subject: 'A pump' });
    expect(mails[0]?.textBody).toContain('Look at <it>.');
    expect(mails[0]?.htmlBody).toContain('Look at &lt;it&gt;.');
  });

  it('delivers a mail once where two servers send at the same moment', async () => {
    const plant = await buildPlant(database());
    const mailbox = await openMailbox(database(), () => start);
    const second = buildSender(database(), createTransport(mailbox.url), () => start);
    await write(plant, 'one');
    await write(plant, 'two');
    await Promise.all([mailbox.deliver(), second.sendDue()]);
    expect(await mailbox.received()).toHaveLength(2);
  });

  it('waits longer after each failure, shows the fault to the lead and delivers when the server is back', async () => {
    const plant = await buildPlant(database());
    const clock = clockAt(start);
    const mailbox = await openMailbox(database(), clock.now);
    // Nothing listens at port 1.
    const down = buildSender(database(), createTransport('smtp://127.0.0.1:1'), clock.now);
    await write(plant, 'one');
    const waitsS: number[] = [];
    for (let attempt = 0; attempt < 4; attempt += 1) {
      await down.sendDue();
      const [mail] = (await faulty(plant)).mails;
      const next = new Date(mail?.nextAttemptAt ?? 0).getTime();
      waitsS.push((next - clock.now().getTime()) / 1000);
      clock.forwardS(waitsS.at(-1) ?? 0);
    }
    expect(waitsS).toEqual([30, 60, 120, 240]);
    const report = await faulty(plant);
    expect(report).toMatchObject({ waitingCount: 1, failedCount: 0 });
    expect(report.mails[0]).toMatchObject({
      state: 'waiting',
      attempts: 4,
      lastError: expect.stringMatching(/ECONNREFUSED/) as string,
    });
    expect(await mailbox.received()).toHaveLength(1);
    expect((await faulty(plant)).mails).toEqual([]);
  });

  it('gives up after a day and lets the lead, and nobody of another site, send again', async () => {
    const plant = await buildPlant(database());
    const other = await buildPlant(database());
    const clock = clockAt(start);
    const down = buildSender(database(), createTransport('smtp://127.0.0.1:1'), clock.now);
    await write(plant, 'one');
    for (let attempt = 0; attempt < 31; attempt += 1) {
      await down.sendDue();
      clock.forwardS(3600);
    }
    const report = await faulty(plant);
    expect(report).toMatchObject({ waitingCount: 0, failedCount: 1 });
    expect(report.mails[0]).toMatchObject({ state: 'failed', attempts: 30, nextAttemptAt: null });
    expect((await faulty(other)).mails).toEqual([]);

    const app = buildTestApp(database());
    const again = (at: Plant) =>
      app.as(at.lead).post(at.path(`/mails/${report.mails[0]?.id}/send-again`));
    expect((await again(other)).status).toBe(404);
    expect((await again(plant)).status).toBe(204);
    const mailbox = await openMailbox(database());
    expect(await mailbox.received()).toHaveLength(1);
    expect((await again(plant)).status).toBe(404);
  });

  it('shortens a subject that is too long instead of losing the mail', async () => {
    const plant = await buildPlant(database());
    const mailbox = await openMailbox(database(), () => start);
    await write(plant, 'one', 'Pump '.repeat(60));
    const [mail] = await mailbox.received();
    expect(mail?.subject.length).toBeLessThanOrEqual(200);
    expect(mail?.subject).toMatch(/…$/);
  });

  it('tells mail programs how to unsubscribe by one click (RFC 8058)', async () => {
    const plant = await buildPlant(database());
    await write(plant, 'one');
    const sent: Buffer[] = [];
    const stream = createTransport({ streamTransport: true, buffer: true });
    await buildSender(database(), {
      sendMail: async (mail) => {
        const info = await stream.sendMail(mail);
        sent.push(info.message as Buffer);
        return info as never;
      },
    }).sendDue();
    const mail = await simpleParser(sent[0] ?? '');
    expect(String(sent[0])).toContain('List-Unsubscribe-Post: List-Unsubscribe=One-Click');
    const list = mail.headers.get('list') as { unsubscribe?: { url: string } };
    const address = list.unsubscribe?.url ?? '';
    expect(address).toMatch(/^https:\/\/fretline\.example\/api\/unsubscribe\//);

    // As a mail program does it: a form post without cookies.
    const posted = await buildTestApp(database())
      .signedOut.post(address.slice(testPublicUrl.length))
      .type('form')
      .send('List-Unsubscribe=One-Click');
    expect(posted.body).toEqual({ kind: 'assigned', wanted: false });
    await write(plant, 'two');
    expect(await database().getRepository(OutboxMail).count()).toBe(1);
  });
});

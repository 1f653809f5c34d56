import { describe, expect, it } from 'vitest';
import { signUnsubscribeToken } from '#server/mail/unsubscribe-token.ts';
import type { MailChoicesResponse } from '#shared/contracts/mail.ts';
import { buildUser, testPassword } from '#tests/support/factories.ts';
import { buildTestApp, testAuthSecret, testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();
const app = () => buildTestApp(database());

const wantedOf = async (user: { id: number }) => {
  const { body } = await app().as(user).get('/api/account/mail');
  const { choices } = body as MailChoicesResponse;
  return Object.fromEntries(choices.map(({ kind, wanted }) => [kind, wanted]));
};

describe('the mails of an account', () => {
  it('are all wanted until a kind is switched off, and again when it is switched on', async () => {
    const user = await buildUser(database());
    expect(Object.values(await wantedOf(user))).not.toContain(false);
    const off = { kind: 'weekly', wanted: false };
    await app().as(user).put('/api/account/mail', off);
    await app().as(user).put('/api/account/mail', off);
    expect(await wantedOf(user)).toMatchObject({ weekly: false, assigned: true });
    await app().as(user).put('/api/account/mail', { kind: 'weekly', wanted: true });
    expect(await wantedOf(user)).toMatchObject({ weekly: true });
  });

  it('are switched off by the link of a mail, for its kind and its reader alone', async () => {
    const reader = await buildUser(database());
    const other = await buildUser(database());
    const token = signUnsubscribeToken(reader.id, 'overdue', testAuthSecret);
    const { signedOut } = app();
    const opened = await signedOut.get(`/api/unsubscribe/${token}/standing`);
    expect(opened.body).toEqual({ kind: 'overdue', wanted: true });
    expect(await wantedOf(reader)).toMatchObject({ overdue: true });

    const posted = await signedOut.post(`/api/unsubscribe/${token}`);
    expect(posted.body).toEqual({ kind: 'overdue', wanted: false });
    expect(await wantedOf(reader)).toMatchObject({ overdue: false, assigned: true });
    expect(await wantedOf(other)).toMatchObject({ overdue: true });
  });

  it('stay as they are for a link that was tampered with', async () => {
    const reader = await buildUser(database());
    const token = signUnsubscribeToken(reader.id, 'overdue', testAuthSecret);
    const foreign = signUnsubscribeToken(reader.id, 'overdue', 'another secret of another server!');
    for (const forged of [
      token.replace('overdue', 'weekly'),
      token.replace(String(reader.id), String(reader.id + 1)),
      token.slice(0, -1),
      `${token}.x`,
      foreign,
      'nonsense',
    ]) {
      expect((await app().signedOut.post(`/api/unsubscribe/${forged}`)).status, forged).toBe(404);
    }
    expect(Object.values(await wantedOf(reader))).not.toContain(false);
  });

  it('lead a mail program that only opens the address to the page with the button', async () => {
    const answer = await app().signedOut.get('/api/unsubscribe/1.weekly.abc');
    expect(answer.status).toBe(303);
    expect(answer.headers.location).toBe(`${testPublicUrl}/unsubscribe/1.weekly.abc`);
  });
});

describe('changing the password', () => {
  const signIn = async (email: string, password: string) => {
    const answer = await app().signedOut.post('/api/session', { email, password });
    const cookies = (answer.headers['set-cookie'] ?? []) as unknown as string[];
    return { status: answer.status, cookie: cookies.map((one) => one.split(';')[0]).join('; ') };
  };
  const change = (cookie: string, body: object) =>
    app().signedOut.post('/api/session/password', body).set('cookie', cookie);
  const renew = async (cookie: string) =>
    (await app().signedOut.post('/api/session/refresh').set('cookie', cookie)).status;

  it('lets only the new one in, keeps this session and ends the others', async () => {
    const user = await buildUser(database());
    const here = await signIn(user.email, testPassword);
    const elsewhere = await signIn(user.email, testPassword);
    const newPassword = 'quite another password';
    const changed = await change(here.cookie, { currentPassword: testPassword, newPassword });
    expect(changed.status).toBe(204);
    expect((await signIn(user.email, testPassword)).status).toBe(401);
    expect((await signIn(user.email, newPassword)).status).toBe(200);
    expect(await renew(elsewhere.cookie)).toBe(401);
    expect(await renew(here.cookie)).toBe(200);
  });

  it.each([
    ['a wrong present password', 'not the present one', 'a new password, long', 'currentPassword'],
    ['a short new one', testPassword, 'short', 'newPassword'],
    ['the same again', testPassword, testPassword, 'newPassword'],
  ])('refuses %s at its field', async (_what, currentPassword, newPassword, path) => {
    const user = await buildUser(database());
    const { cookie } = await signIn(user.email, testPassword);
    const answer = await change(cookie, { currentPassword, newPassword });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ error: { fields: [{ path }] } });
    expect((await signIn(user.email, testPassword)).status).toBe(200);
  });
});

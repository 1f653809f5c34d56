import { describe, expect, it } from 'vitest';
import { RefreshToken } from '#server/db/entities/refresh-token.entity.ts';
import { buildMember, buildSite, testPassword } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();

const cookiesOf = (answer: { headers: Record<string, unknown> }) =>
  (answer.headers['set-cookie'] as string[] | undefined) ?? [];
const valueOf = (cookies: string[], name: string) =>
  cookies.find((cookie) => cookie.startsWith(`${name}=`))?.split(';')[0] ?? '';

async function signIn() {
  const site = await buildSite(dataSource());
  const user = await buildMember(dataSource(), site, 'analyst');
  const app = buildTestApp(dataSource());
  const answer = await app.signedOut.post('/api/session', {
    email: user.email.toUpperCase(),
    password: testPassword,
  });
  return { site, user, app, answer, cookies: cookiesOf(answer) };
}

describe('POST /api/session', () => {
  it('signs in with the right password and tells the role at the site', async () => {
    const { answer, site, user } = await signIn();
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({
      email: user.email,
      memberships: [{ siteId: site.id, role: 'analyst' }],
    });
  });

  it('keeps both tokens out of reach of scripts and other sites', async () => {
    const { cookies } = await signIn();
    expect(cookies).toHaveLength(2);
    for (const cookie of cookies) {
      expect(cookie).toContain('HttpOnly');
      expect(cookie).toContain('SameSite=Strict');
    }
  });

  it('keeps the refresh token hashed', async () => {
    const { cookies } = await signIn();
    const token = valueOf(cookies, 'fretline_refresh').split('=')[1];
    const [row] = await dataSource().getRepository(RefreshToken).find();
    expect(row?.tokenHash).toMatch(/^[0-9a-f]{64}$/);
    expect(row?.tokenHash).not.toBe(token);
  });

  it('refuses a wrong password and an unknown address with the same words', async () => {
    const { user, app } = await signIn();
    const wrong = await app.signedOut.post('/api/session', {
      email: user.email,
      password: 'not this one',
    });
    const unknown = await app.signedOut.post('/api/session', {
      email: 'nobody@plant.example',
      password: 'not this one',
    });
    expect(wrong.status).toBe(401);
    expect(unknown.body.error.message).toBe(wrong.body.error.message);
  });
});

describe('POST /api/session/refresh', () => {
  it('renews the session and changes the refresh token', async () => {
    const { app, cookies } = await signIn();
    const before = valueOf(cookies, 'fretline_refresh');
    const renewed = await app.signedOut.post('/api/session/refresh').set('cookie', before);
    expect(renewed.status).toBe(200);
    expect(valueOf(cookiesOf(renewed), 'fretline_refresh')).not.toBe(before);
  });

  it('ends the whole session when a used token comes back later', async () => {
    const { app, cookies } = await signIn();
    const stolen = valueOf(cookies, 'fretline_refresh');
    const renewed = await app.signedOut.post('/api/session/refresh').set('cookie', stolen);
    const current = valueOf(cookiesOf(renewed), 'fretline_refresh');
    await dataSource().query('UPDATE refresh_token SET used_at = used_at - INTERVAL 1 MINUTE');
    expect((await app.signedOut.post('/api/session/refresh').set('cookie', stolen)).status).toBe(
      401,
    );
    expect((await app.signedOut.post('/api/session/refresh').set('cookie', current)).status).toBe(
      401,
    );
  });

  it('serves two tabs that wake up together', async () => {
    const { app, cookies } = await signIn();
    const token = valueOf(cookies, 'fretline_refresh');
    const answers = await Promise.all([
      app.signedOut.post('/api/session/refresh').set('cookie', token),
      app.signedOut.post('/api/session/refresh').set('cookie', token),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
  });
});

describe('DELETE /api/session', () => {
  it('revokes the refresh token', async () => {
    const { app, cookies } = await signIn();
    const token = valueOf(cookies, 'fretline_refresh');
    expect((await app.signedOut.delete('/api/session').set('cookie', token)).status).toBe(204);
    expect((await app.signedOut.post('/api/session/refresh').set('cookie', token)).status).toBe(
      401,
    );
  });
});

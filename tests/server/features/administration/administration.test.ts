import { describe, expect, it } from 'vitest';
import { buildSite, buildUser } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();

describe('an empty installation', () => {
  it('gets a first administrator who can sign in, and gets no second one', async () => {
    const { product, signedOut } = buildTestApp(dataSource());
    const { administration } = product.services;
    const first = await administration.createFirstAdministrator();
    const session = await signedOut.post('/api/session', first ?? {});
    expect(session.body).toMatchObject({ isAdministrator: true, memberships: [] });
    expect(await administration.createFirstAdministrator()).toBeNull();
  });
});

describe('an administrator', () => {
  it('adds a person, gives a role at a site and takes it away', async () => {
    const administrator = await buildUser(dataSource(), { isAdministrator: true });
    const site = await buildSite(dataSource());
    const { as } = buildTestApp(dataSource());
    const person = { name: 'New Person', email: 'new@plant.example', password: 'a long password' };
    const added = await as(administrator).post('/api/administration/people', person);
    expect(added.status).toBe(201);
    const { userId } = added.body.people.find(
      (one: { email: string }) => one.email === person.email,
    );
    const membership = `/api/administration/people/${userId}/memberships/${site.id}`;
    const given = await as(administrator).put(membership, { role: 'lead' });
    expect(given.body.people).toContainEqual(
      expect.objectContaining({ userId, memberships: [expect.objectContaining({ role: 'lead' })] }),
    );
    const taken = await as(administrator).put(membership, { role: null });
    expect(taken.body.people).toContainEqual(expect.objectContaining({ userId, memberships: [] }));
  });

  it('is told of an address that has an account already', async () => {
    const administrator = await buildUser(dataSource(), { isAdministrator: true });
    const { as } = buildTestApp(dataSource());
    const answer = await as(administrator).post('/api/administration/people', {
      name: 'Again',
      email: administrator.email,
      password: 'a long password',
    });
    expect(answer.status).toBe(409);
    expect(answer.body.error.fields[0].path).toBe('email');
  });
});

import { beforeEach, describe, expect, it } from 'vitest';
import type { Route } from '#server/http/route.ts';
import { siteRoles, type SiteRole } from '#shared/contracts/session.ts';
import { buildMember, buildSite, buildUser } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { accessMatrix } from './access-matrix.ts';

const dataSource = useTestDatabase();
const nameOf = (route: Route) => `${route.method.toUpperCase()} ${route.path}`;

/** A path with ids that name nothing, at this site. */
const addressOf = (route: Route, siteId: number) =>
  route.path.replace(':siteId', String(siteId)).replace(/:\w+/g, '2000000000');

/** Whether an answer came from behind the access check: refused for what it asked, not for who asked. */
const letIn = (status: number) => status !== 401 && status !== 403;

let people: Record<SiteRole, { id: number }>;
let stranger: { id: number };
let administrator: { id: number };
let siteId: number;

beforeEach(async () => {
  const site = await buildSite(dataSource());
  const elsewhere = await buildSite(dataSource());
  siteId = site.id;
  people = {
    analyst: await buildMember(dataSource(), site, 'analyst'),
    lead: await buildMember(dataSource(), site, 'lead'),
    owner: await buildMember(dataSource(), site, 'owner'),
  };
  stranger = await buildMember(dataSource(), elsewhere, 'lead');
  administrator = await buildUser(dataSource(), { isAdministrator: true });
});

describe('the route table', () => {
  it('has every route in the written access matrix, and no other', () => {
    const { product } = buildTestApp(dataSource());
    const names = product.routes.map(nameOf).sort();
    const written = Object.keys(accessMatrix).sort();
    // The demo mailbox exists in demo mode only; the test application is none.
    expect(names).toEqual(written.filter((name) => name !== 'GET /api/demo/mails'));
  });

  it('answers 401 on every guarded route without a session', async () => {
    const { product, signedOut } = buildTestApp(dataSource());
    for (const route of product.routes.filter(({ access }) => access.kind !== 'anyone')) {
      const answer = await signedOut[route.method](addressOf(route, siteId));
      expect(answer.status, nameOf(route)).toBe(401);
    }
  });

  it('lets in the roles of the matrix and answers 403 to the others', async () => {
    const { product, as } = buildTestApp(dataSource());
    for (const route of product.routes) {
      const allowed = accessMatrix[nameOf(route)];
      if (!Array.isArray(allowed)) continue;
      for (const role of siteRoles) {
        const answer = await as(people[role])[route.method](addressOf(route, siteId));
        const label = `${nameOf(route)} as ${role}`;
        if (allowed.includes(role)) expect(letIn(answer.status), label).toBe(true);
        else expect(answer.status, label).toBe(403);
      }
    }
  });

  it('answers 404 on every route of a site to a member of another site and to the administrator', async () => {
    const { product, as } = buildTestApp(dataSource());
    for (const route of product.routes.filter(({ access }) => access.kind === 'siteRoles')) {
      for (const outsider of [stranger, administrator]) {
        const answer = await as(outsider)[route.method](addressOf(route, siteId));
        expect(answer.status, nameOf(route)).toBe(404);
      }
    }
  });

  it('keeps the administration for administrators', async () => {
    const { product, as } = buildTestApp(dataSource());
    const routes = product.routes.filter(({ access }) => access.kind === 'administrator');
    expect(routes.length).toBeGreaterThan(0);
    for (const route of routes) {
      const refused = await as(people.lead)[route.method](addressOf(route, siteId));
      expect(refused.status, nameOf(route)).toBe(403);
      const answer = await as(administrator)[route.method](addressOf(route, siteId));
      expect(letIn(answer.status), nameOf(route)).toBe(true);
    }
  });

  it('gives a reason for every open route', () => {
    const { product } = buildTestApp(dataSource());
    for (const { access } of product.routes) {
      if (access.kind === 'anyone') expect(access.because.length).toBeGreaterThan(20);
    }
  });
});

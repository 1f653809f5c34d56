import { z } from 'zod';
import { administrator } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import {
  administeredPeopleResponse,
  administeredSitesResponse,
  createPersonRequest,
  createSiteRequest,
  setMembershipRequest,
} from '#shared/contracts/administration.ts';
import { id } from '#shared/contracts/fields.ts';
import type { AdministrationService } from './administration.service.ts';

/** Sites, people and roles. The paths lie outside /sites: an administrator is no member of a site. */
export const administrationRoutes = (administration: AdministrationService) => [
  route({
    method: 'get',
    path: '/api/administration/sites',
    access: administrator(),
    response: administeredSitesResponse,
    handle: async () => ({ sites: await administration.sites() }),
  }),
  route({
    method: 'post',
    path: '/api/administration/sites',
    status: 201,
    access: administrator(),
    body: createSiteRequest,
    response: administeredSitesResponse,
    handle: async ({ principal, body }) => {
      await administration.createSite(principal, body);
      return { sites: await administration.sites() };
    },
  }),
  route({
    method: 'get',
    path: '/api/administration/people',
    access: administrator(),
    response: administeredPeopleResponse,
    handle: async () => ({ people: await administration.people() }),
  }),
  route({
    method: 'post',
    path: '/api/administration/people',
    status: 201,
    access: administrator(),
    body: createPersonRequest,
    response: administeredPeopleResponse,
    handle: async ({ principal, body }) => {
      await administration.createPerson(principal, body);
      return { people: await administration.people() };
    },
  }),
  route({
    method: 'put',
    path: '/api/administration/people/:userId/memberships/:membershipSiteId',
    access: administrator(),
    params: z.object({ userId: id, membershipSiteId: id }),
    body: setMembershipRequest,
    response: administeredPeopleResponse,
    handle: async ({ principal, params, body }) => {
      await administration.setMembership(
        principal,
        params.membershipSiteId,
        params.userId,
        body.role,
      );
      return { people: await administration.people() };
    },
  }),
];

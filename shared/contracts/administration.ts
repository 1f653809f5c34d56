import { z } from 'zod';
import { line } from './fields.ts';
import { siteRole } from './session.ts';

export const createSiteRequest = z.strictObject({ name: line(120, 'a name') });
export type CreateSiteRequest = z.infer<typeof createSiteRequest>;

export const administeredSite = z.object({
  id: z.int(),
  name: z.string(),
  memberCount: z.int(),
  machineCount: z.int(),
});
export const administeredSitesResponse = z.object({ sites: z.array(administeredSite) });
export type AdministeredSitesResponse = z.infer<typeof administeredSitesResponse>;

export const createPersonRequest = z.strictObject({
  name: line(120, 'a name'),
  email: z.email('Enter an e-mail address.').trim().toLowerCase().max(254),
  /** First password, told to the person by the administrator. */
  password: z.string().min(12, 'At least 12 characters.').max(256),
  isAdministrator: z.boolean().default(false),
});
export type CreatePersonRequest = z.infer<typeof createPersonRequest>;

export const administeredPerson = z.object({
  userId: z.int(),
  name: z.string(),
  email: z.string(),
  isAdministrator: z.boolean(),
  memberships: z.array(z.object({ siteId: z.int(), siteName: z.string(), role: siteRole })),
});
export type AdministeredPerson = z.infer<typeof administeredPerson>;
export const administeredPeopleResponse = z.object({ people: z.array(administeredPerson) });
export type AdministeredPeopleResponse = z.infer<typeof administeredPeopleResponse>;

/** Sets a person's one role at a site; null takes the membership away. */
export const setMembershipRequest = z.strictObject({ role: siteRole.nullable() });
export type SetMembershipRequest = z.infer<typeof setMembershipRequest>;

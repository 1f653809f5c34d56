import { z } from 'zod';
import { siteRole } from './session.ts';

/** A member of a site, as choosers show them. */
export const memberResponse = z.object({
  userId: z.int(),
  name: z.string(),
  email: z.string(),
  role: siteRole,
});
export const membersResponse = z.object({ members: z.array(memberResponse) });
export type MembersResponse = z.infer<typeof membersResponse>;

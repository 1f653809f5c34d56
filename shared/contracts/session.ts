import { z } from 'zod';

/** A person holds one role per site. */
export const siteRoles = ['analyst', 'lead', 'owner'] as const;
export const siteRole = z.enum(siteRoles);
export type SiteRole = z.infer<typeof siteRole>;

export const signInRequest = z.strictObject({
  email: z.string().trim().toLowerCase().min(3, 'Enter your e-mail address.').max(254),
  password: z.string().min(1, 'Enter your password.').max(256),
});
export type SignInRequest = z.infer<typeof signInRequest>;

export const membershipResponse = z.object({
  siteId: z.int(),
  siteName: z.string(),
  role: siteRole,
});
export type MembershipResponse = z.infer<typeof membershipResponse>;

export const sessionResponse = z.object({
  userId: z.int(),
  name: z.string(),
  email: z.string(),
  isAdministrator: z.boolean(),
  memberships: z.array(membershipResponse),
  /** True where the local demo mailbox and demo accounts are shown. */
  demo: z.boolean(),
});
export type SessionResponse = z.infer<typeof sessionResponse>;

/** What the sign-in page may show before anyone has signed in. */
export const productResponse = z.object({
  demo: z.boolean(),
  demoAccounts: z.array(
    z.object({ name: z.string(), email: z.string(), password: z.string(), role: z.string() }),
  ),
});
export type ProductResponse = z.infer<typeof productResponse>;

import type { SiteRole } from '#shared/contracts/session.ts';

/** Who may call a route. A route without one does not compile. */
export type Access =
  | { kind: 'anyone'; because: string }
  | { kind: 'signedIn' }
  | { kind: 'administrator' }
  | { kind: 'siteRoles'; roles: readonly SiteRole[] };

/** Open to the world, for a stated reason. */
export const anyoneBecause = (because: string) => ({ kind: 'anyone', because }) as const;

/** Any person with a session. */
export const signedIn = () => ({ kind: 'signedIn' }) as const;

/** Accounts with the administrator property; says nothing about sites. */
export const administrator = () => ({ kind: 'administrator' }) as const;

/**
 * Members of the site in the path (`:siteId`) who hold one of these roles there. A member with
 * another role gets 403; who isn't a member gets 404, since even the site's existence is private.
 */
export const only = (...roles: [SiteRole, ...SiteRole[]]) =>
  ({ kind: 'siteRoles', roles }) as const;

/** Every member of the site in the path. */
export const anyMember = () => only('analyst', 'lead', 'owner');

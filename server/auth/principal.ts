import type { SiteRole } from '#shared/contracts/session.ts';

/** The person behind a request. */
export interface Principal {
  userId: number;
  name: string;
  email: string;
  isAdministrator: boolean;
}

/** The person as a member of the site in the path. */
export interface SitePrincipal extends Principal {
  siteId: number;
  role: SiteRole;
}

import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';

/** An asset owner sees the findings of the machines they own; analysts and leads all of the site. */
export const maySeeFinding = (principal: SitePrincipal, finding: Finding): boolean =>
  finding.siteId === principal.siteId &&
  (principal.role !== 'owner' ||
    finding.bearingPosition?.machine?.ownerUserId === principal.userId);

import type { SitePrincipal } from '#server/auth/principal.ts';

type OwnedMachine = { siteId: number; ownerUserId: number | null };

/** An asset owner sees the machines they own; analysts and leads all of the site. */
export const maySeeMachine = (principal: SitePrincipal, machine: OwnedMachine): boolean =>
  machine.siteId === principal.siteId &&
  (principal.role !== 'owner' || machine.ownerUserId === principal.userId);

/** The register is the reliability lead's. */
export const mayEditRegister = (principal: SitePrincipal): boolean => principal.role === 'lead';

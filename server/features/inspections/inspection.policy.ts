import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';

const machineOwner = (inspection: Inspection) =>
  inspection.finding?.bearingPosition?.machine?.ownerUserId;

/** An asset owner sees what they are asked to inspect and what is inspected on their machines. */
export const maySeeInspection = (principal: SitePrincipal, inspection: Inspection): boolean =>
  inspection.finding?.siteId === principal.siteId &&
  (principal.role !== 'owner' ||
    inspection.assigneeUserId === principal.userId ||
    machineOwner(inspection) === principal.userId);

/** Only the owner it was assigned to accepts and reports. */
export const isAssignee = (principal: SitePrincipal, inspection: Inspection): boolean =>
  inspection.assigneeUserId === principal.userId;

/** The finding behind a task is the machine owner's to see, not a stand-in's. */
export const maySeeFindingOf = (principal: SitePrincipal, inspection: Inspection): boolean =>
  principal.role !== 'owner' || machineOwner(inspection) === principal.userId;

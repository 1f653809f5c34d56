import { randomBytes } from 'node:crypto';
import { airAndUtilityMachines } from '#fixtures/demo/air-and-utility-machines.ts';
import type { DemoMachine } from '#fixtures/demo/demo-types.ts';
import { driveMachines } from '#fixtures/demo/drive-machines.ts';
import { millName, people, stationName } from '#fixtures/demo/people.ts';
import { wetEndMachines } from '#fixtures/demo/wet-end-machines.ts';
import type { SitePrincipal } from '#server/auth/principal.ts';
import type { DemoAccounts } from '#server/config/demo-accounts.ts';
import type { AdministrationService } from '#server/features/administration/administration.service.ts';
import type { MachineService } from '#server/features/register/machine.service.ts';
import type { PositionService } from '#server/features/register/position.service.ts';
import type { RouteService } from '#server/features/register/route.service.ts';
import { createBearingPositionRequest } from '#shared/contracts/bearing-position.ts';
import { addFitRecordRequest } from '#shared/contracts/fit-record.ts';
import { createMachineRequest } from '#shared/contracts/machine.ts';
import { createRouteRequest } from '#shared/contracts/route.ts';

export interface RegisterServices {
  administration: AdministrationService;
  machines: MachineService;
  positions: PositionService;
  routes: RouteService;
}

export interface LoadedPeople {
  accounts: DemoAccounts;
  /** A member of the mill by the key of people.ts. */
  principal: (key: string) => SitePrincipal;
  siteId: number;
}

export const demoMachines: readonly DemoMachine[] = [
  ...wetEndMachines,
  ...airAndUtilityMachines,
  ...driveMachines,
];

const roleInWords = (key: string) =>
  people
    .filter((person) => person.key === key)
    .map((person) => {
      const [role] = Object.values(person.roles);
      const words = { analyst: 'Analyst', lead: 'Reliability lead', owner: 'Asset owner' };
      return role === undefined ? 'Administrator' : words[role];
    })
    .join('');

/** Makes the two sites and their people, with passwords made for this installation. */
export async function loadPeople(administration: AdministrationService): Promise<LoadedPeople> {
  const siteIds = new Map<string, number>();
  for (const name of [millName, stationName]) {
    siteIds.set(name, await administration.createSite(null, { name }));
  }
  const accounts: DemoAccounts = [];
  const principals = new Map<string, SitePrincipal>();
  const siteId = siteIds.get(millName) ?? 0;
  for (const { key, name, email, isAdministrator, roles } of people) {
    const password = randomBytes(9).toString('base64url');
    const userId = await administration.createPerson(null, {
      name,
      email,
      isAdministrator,
      password,
    });
    for (const [siteName, role] of Object.entries(roles)) {
      const site = siteIds.get(siteName);
      if (site === undefined || role === undefined) continue;
      await administration.setMembership(null, site, userId, role);
    }
    accounts.push({ name, email, password, role: roleInWords(key) });
    const role = roles[millName];
    if (role !== undefined) {
      principals.set(key, { userId, name, email, isAdministrator, siteId, role });
    }
  }
  return {
    accounts,
    siteId,
    principal: (key) => {
      const found = principals.get(key);
      if (found === undefined) throw new Error(`The demo has no member ${key}.`);
      return found;
    },
  };
}

/** Enters the demo machines with all that hangs on them, and one route over every point. */
export async function loadRegister(
  services: RegisterServices,
  { principal }: LoadedPeople,
): Promise<{ routeId: number }> {
  const lead = principal('lead');
  for (const { machine, owner, positions } of demoMachines) {
    const entered = await services.machines.create(
      lead,
      createMachineRequest.parse({ ...machine, ownerUserId: principal(owner).userId }),
    );
    for (const { position, points, fitRecords } of positions) {
      const created = await services.positions.create(
        lead,
        entered.machine.id,
        createBearingPositionRequest.parse(position),
      );
      for (const direction of points) {
        await services.positions.addPoint(lead, created.position.id, { direction });
      }
      for (const record of fitRecords) {
        await services.positions.addFitRecord(
          lead,
          created.position.id,
          addFitRecordRequest.parse(record),
        );
      }
    }
  }
  const points = await services.routes.pointChoices(lead);
  const tags = demoMachines.map(({ machine }) => machine.tag);
  const walked = [...points].sort(
    (a, b) => tags.indexOf(a.machineTag) - tags.indexOf(b.machineTag),
  );
  const route = await services.routes.create(
    lead,
    createRouteRequest.parse({
      name: 'Monthly walk, mill',
      topFrequencyHz: 1000,
      lineCount: 3200,
      pointIds: walked.map((point) => point.id),
    }),
  );
  return { routeId: route.id };
}

import { randomUUID } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { Membership } from '#server/db/entities/membership.entity.ts';
import { RoutePoint } from '#server/db/entities/route-point.entity.ts';
import { Route } from '#server/db/entities/route.entity.ts';
import { Site } from '#server/db/entities/site.entity.ts';
import { Survey } from '#server/db/entities/survey.entity.ts';
import { User } from '#server/db/entities/user.entity.ts';
import { hashPassword } from '#server/auth/passwords.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { SiteRole } from '#shared/contracts/session.ts';

export const testPassword = 'a password of the tests';
let passwordHash: Promise<string> | undefined;

/** A short text that no other row has. */
const unique = (word: string) => `${word}-${randomUUID().slice(0, 8)}`;

export function buildSite(dataSource: DataSource, overrides: Partial<Site> = {}): Promise<Site> {
  return dataSource
    .getRepository(Site)
    .save({ name: unique('Site'), createdAt: new Date(), ...overrides });
}

export async function buildUser(
  dataSource: DataSource,
  overrides: Partial<User> = {},
): Promise<User> {
  passwordHash ??= hashPassword(testPassword);
  const name = unique('Person');
  return dataSource.getRepository(User).save({
    name,
    email: `${name.toLowerCase()}@plant.example`,
    passwordHash: await passwordHash,
    isAdministrator: false,
    createdAt: new Date(),
    ...overrides,
  });
}

/** A person with a role at the site. */
export async function buildMember(
  dataSource: DataSource,
  site: Pick<Site, 'id'>,
  role: SiteRole,
  overrides: Partial<User> = {},
): Promise<User> {
  const user = await buildUser(dataSource, overrides);
  await dataSource.getRepository(Membership).insert({ userId: user.id, siteId: site.id, role });
  return user;
}

export function buildMachine(
  dataSource: DataSource,
  site: Pick<Site, 'id'>,
  overrides: Partial<Machine> = {},
): Promise<Machine> {
  return dataSource.getRepository(Machine).save({
    siteId: site.id,
    tag: unique('P'),
    name: 'Circulation pump',
    kind: 'pump',
    drive: null,
    powerKw: 30,
    nominalSpeedRpm: 1480,
    speedMinRpm: null,
    speedMaxRpm: null,
    lineFrequencyHz: 50,
    mounting: 'rigid',
    bladeCount: 5,
    gearTeethCount: null,
    beltFrequencyHz: null,
    criticality: 'medium',
    nextPlannedStopOn: null,
    notes: null,
    ownerUserId: null,
    version: 1,
    ...overrides,
  });
}

export function buildPosition(
  dataSource: DataSource,
  machine: Pick<Machine, 'id'>,
  overrides: Partial<BearingPosition> = {},
): Promise<BearingPosition> {
  return dataSource.getRepository(BearingPosition).save({
    machineId: machine.id,
    code: unique('DE').slice(0, 24),
    name: 'Pump, drive end',
    kind: 'rolling',
    shaftRatio: 1,
    designation: '6312',
    bearingType: 'ball',
    boreMm: 60,
    outsideMm: 130,
    widthMm: 31,
    bearingClass: 'Normal',
    clearanceGroup: 'CN',
    innerLoad: 'rotating',
    outerLoad: 'stationary',
    loadLevel: 'normal',
    shaftMaterial: 'steel',
    housingMaterial: 'cast iron',
    splitHousing: false,
    mustSlide: false,
    shaftC: null,
    innerRingC: null,
    outerRingC: null,
    housingC: null,
    sequence: 0,
    ...overrides,
  });
}

export function buildPoint(
  dataSource: DataSource,
  position: Pick<BearingPosition, 'id'>,
  direction: Direction = 'horizontal',
): Promise<MeasuringPoint> {
  return dataSource
    .getRepository(MeasuringPoint)
    .save({ bearingPositionId: position.id, direction });
}

export async function buildRoute(
  dataSource: DataSource,
  site: Pick<Site, 'id'>,
  points: Pick<MeasuringPoint, 'id'>[],
): Promise<Route> {
  const route = await dataSource.getRepository(Route).save({
    siteId: site.id,
    name: unique('Route'),
    topFrequencyHz: 1000,
    lineCount: 3200,
    version: 1,
  });
  await dataSource.getRepository(RoutePoint).insert(
    points.map((point, index) => ({
      routeId: route.id,
      measuringPointId: point.id,
      sequence: index + 1,
    })),
  );
  return route;
}

export function buildSurvey(
  dataSource: DataSource,
  route: Pick<Route, 'id'>,
  createdBy: Pick<User, 'id'>,
  overrides: Partial<Survey> = {},
): Promise<Survey> {
  return dataSource.getRepository(Survey).save({
    routeId: route.id,
    surveyedOn: '2026-11-02',
    createdByUserId: createdBy.id,
    createdAt: new Date(),
    ...overrides,
  });
}

import type { DataSource } from 'typeorm';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { ScreeningResult } from '#shared/signal/screening-types.ts';
import {
  buildMachine,
  buildMember,
  buildPoint,
  buildPosition,
  buildRoute,
  buildSite,
  buildSurvey,
} from './factories.ts';
import { buildScreening, buildWaveform } from './screening-factories.ts';
import { aScreeningResult } from './screening-result.ts';

/** A site with its people, one machine with one bearing position, and a survey of it. */
export async function buildPlant(dataSource: DataSource) {
  const site = await buildSite(dataSource);
  const [analyst, otherAnalyst, lead, owner, otherOwner] = await Promise.all([
    buildMember(dataSource, site, 'analyst', { name: 'Ada Analyst' }),
    buildMember(dataSource, site, 'analyst', { name: 'Otto Analyst' }),
    buildMember(dataSource, site, 'lead', { name: 'Lena Lead' }),
    buildMember(dataSource, site, 'owner', { name: 'Oskar Owner' }),
    buildMember(dataSource, site, 'owner', { name: 'Olga Owner' }),
  ]);
  const machine = await buildMachine(dataSource, site, { tag: 'P-101', ownerUserId: owner.id });
  const position = await buildPosition(dataSource, machine, { code: 'DE' });
  const points = {
    horizontal: await buildPoint(dataSource, position, 'horizontal'),
    vertical: await buildPoint(dataSource, position, 'vertical'),
    axial: await buildPoint(dataSource, position, 'axial'),
  };
  const route = await buildRoute(dataSource, site, Object.values(points));
  const survey = await buildSurvey(dataSource, route, analyst);
  /** A screening that waits in the queue. */
  const flag = async (direction: Direction = 'vertical', result: Partial<ScreeningResult> = {}) => {
    const waveform = await buildWaveform(dataSource, {
      surveyId: survey.id,
      measuringPointId: points[direction].id,
      uploadedByUserId: analyst.id,
    });
    return buildScreening(dataSource, waveform, aScreeningResult(result));
  };
  return {
    site,
    analyst,
    otherAnalyst,
    lead,
    owner,
    otherOwner,
    machine,
    position,
    points,
    survey,
    flag,
    path: (rest: string) => `/api/sites/${site.id}${rest}`,
  };
}
export type Plant = Awaited<ReturnType<typeof buildPlant>>;

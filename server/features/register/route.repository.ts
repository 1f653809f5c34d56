import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { RoutePoint } from '#server/db/entities/route-point.entity.ts';
import { Route } from '#server/db/entities/route.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { pointLabel } from '#shared/contracts/measuring-point.ts';
import type { RouteListQuery } from '#shared/contracts/route.ts';

export interface RouteListRow {
  id: number;
  name: string;
  pointCount: number;
  surveyCount: number;
  lastSurveyedOn: string | null;
}

const presentChoice = (point: MeasuringPoint): PointChoice => {
  const position = point.bearingPosition;
  const machine = position?.machine;
  if (position === undefined || machine === undefined) {
    throw new Error('A measuring point was read without its position and machine.');
  }
  return {
    id: point.id,
    label: pointLabel(machine.tag, position.code, point.direction),
    machineId: machine.id,
    machineTag: machine.tag,
    machineName: machine.name,
    positionCode: position.code,
    positionName: position.name,
    direction: point.direction,
    nominalSpeedRpm: machine.nominalSpeedRpm,
  };
};

/** Routes of a site and the points they can be made of. */
export class RouteRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async list(siteId: number, query: RouteListQuery) {
    const pattern = query.search ? likePattern(query.search) : '%';
    const rows = await this.db.query<RouteListRow[]>(
      `SELECT route.id, route.name,
              (SELECT COUNT(*) FROM route_point rp WHERE rp.route_id = route.id) AS pointCount,
              (SELECT COUNT(*) FROM survey s WHERE s.route_id = route.id) AS surveyCount,
              (SELECT MAX(s.surveyed_on) FROM survey s WHERE s.route_id = route.id) AS lastSurveyedOn
         FROM route WHERE route.site_id = ? AND route.name LIKE ?
        ORDER BY ${query.sort} ${query.direction === 'desc' ? 'DESC' : 'ASC'}, route.name
        LIMIT ? OFFSET ?`,
      [siteId, pattern, query.pageSize, (query.page - 1) * query.pageSize],
    );
    const [count] = await this.db.query<{ total: string | number }[]>(
      'SELECT COUNT(*) AS total FROM route WHERE site_id = ? AND name LIKE ?',
      [siteId, pattern],
    );
    return {
      rows: rows.map((row) => ({
        ...row,
        pointCount: Number(row.pointCount),
        surveyCount: Number(row.surveyCount),
      })),
      total: Number(count?.total ?? 0),
    };
  }

  find(siteId: number, id: number): Promise<Route | null> {
    return this.db.findOneBy(Route, { id, siteId });
  }

  async pointsOf(routeId: number): Promise<PointChoice[]> {
    const points = await this.db.find(RoutePoint, {
      where: { routeId },
      relations: { measuringPoint: { bearingPosition: { machine: true } } },
      order: { sequence: 'ASC' },
    });
    return points.flatMap(({ measuringPoint }) =>
      measuringPoint ? [presentChoice(measuringPoint)] : [],
    );
  }

  /** Every measuring point of the site, in the order of tag, position and direction. */
  async choices(siteId: number): Promise<PointChoice[]> {
    const points = await this.db.find(MeasuringPoint, {
      where: { bearingPosition: { machine: { siteId } } },
      relations: { bearingPosition: { machine: true } },
      order: { bearingPosition: { machine: { tag: 'ASC' }, sequence: 'ASC' }, id: 'ASC' },
    });
    return points.map(presentChoice);
  }

  /** How many of these points belong to the site. */
  countOfSite(siteId: number, pointIds: number[]): Promise<number> {
    return this.db.countBy(MeasuringPoint, {
      id: In(pointIds),
      bearingPosition: { machine: { siteId } },
    });
  }

  async insert(route: Pick<Route, 'siteId' | 'name' | 'topFrequencyHz' | 'lineCount'>) {
    const result = await this.db.insert(Route, { ...route, version: 1 });
    return (result.identifiers[0] as { id: number }).id;
  }

  async update(id: number, version: number, changes: Partial<Route>): Promise<boolean> {
    const result = await this.db.update(
      Route,
      { id, version },
      { ...changes, version: version + 1 },
    );
    return result.affected === 1;
  }

  async setPoints(routeId: number, pointIds: number[]): Promise<void> {
    await this.db.delete(RoutePoint, { routeId });
    await this.db.insert(
      RoutePoint,
      pointIds.map((measuringPointId, index) => ({
        routeId,
        measuringPointId,
        sequence: index + 1,
      })),
    );
  }
}

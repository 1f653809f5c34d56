import type { SelectQueryBuilder } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import {
  criticalities,
  type Criticality,
  type MachineListQuery,
} from '#shared/contracts/machine.ts';

export interface MachineListRow {
  id: number;
  tag: string;
  name: string;
  kind: Machine['kind'];
  nominalSpeedRpm: number | null;
  powerKw: number | null;
  criticality: Criticality;
  nextPlannedStopOn: string | null;
  ownerName: string | null;
  positionCount: number;
  pointCount: number;
  openFindingCount: number;
}

type Sort = Exclude<MachineListQuery['sort'], 'criticality'>;
const sortColumns: Readonly<Record<Sort, string>> = {
  tag: 'machine.tag',
  name: 'machine.name',
  kind: 'machine.kind',
  nextPlannedStopOn: 'machine.next_planned_stop_on',
};

type Filtered = SelectQueryBuilder<Machine>;
interface Slice {
  limit: number;
  offset: number;
}

/**
 * The machine register, a page at a time. Every sort and filter reads an index of its own in order
 * (`machine.entity.ts`), so that a page costs the same in a plant of five thousand machines.
 */
export class MachineListRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** One page of the register; `ownerUserId` narrows it to an owner's machines. */
  async list(siteId: number, ownerUserId: number | null, query: MachineListQuery) {
    const filtered = this.filtered(siteId, ownerUserId, query);
    const slice = { limit: query.pageSize, offset: (query.page - 1) * query.pageSize };
    const { ids, total } =
      query.sort === 'criticality'
        ? await byCriticality(filtered, query, slice)
        : await inOrder(filtered, query.sort, query, slice);
    return { rows: await this.rows(ids), total };
  }

  private filtered(siteId: number, ownerUserId: number | null, query: MachineListQuery): Filtered {
    const filtered = this.db
      .createQueryBuilder(Machine, 'machine')
      .where('machine.site_id = :siteId', { siteId });
    if (ownerUserId !== null) {
      filtered.andWhere('machine.owner_user_id = :ownerUserId', { ownerUserId });
    }
    if (query.kind !== undefined) filtered.andWhere('machine.kind = :kind', { kind: query.kind });
    if (query.criticality !== undefined) {
      filtered.andWhere('machine.criticality = :criticality', { criticality: query.criticality });
    }
    if (query.search) {
      filtered.andWhere('(machine.tag LIKE :pattern OR machine.name LIKE :pattern)', {
        pattern: likePattern(query.search),
      });
    }
    return filtered;
  }

  /** What the list shows of the page's machines; the counts are asked for them alone. */
  private async rows(ids: number[]): Promise<MachineListRow[]> {
    if (ids.length === 0) return [];
    const rows = await this.db.query<MachineListRow[]>(
      `SELECT machine.id, machine.tag, machine.name, machine.kind,
              machine.nominal_speed_rpm AS nominalSpeedRpm, machine.power_kw AS powerKw,
              machine.criticality, machine.next_planned_stop_on AS nextPlannedStopOn,
              user.name AS ownerName,
              (SELECT COUNT(*) FROM bearing_position p WHERE p.machine_id = machine.id) AS positionCount,
              (SELECT COUNT(*) FROM measuring_point mp JOIN bearing_position p
                 ON p.id = mp.bearing_position_id WHERE p.machine_id = machine.id) AS pointCount,
              (SELECT COUNT(*) FROM finding f JOIN bearing_position p ON p.id = f.bearing_position_id
                 WHERE p.machine_id = machine.id AND f.state NOT IN ('verified', 'dismissed'))
                AS openFindingCount
         FROM machine LEFT JOIN user ON user.id = machine.owner_user_id
        WHERE machine.id IN (${ids.map(() => '?').join(', ')})`,
      ids,
    );
    const byId = new Map(rows.map((row) => [row.id, row]));
    return ids.flatMap((machineId) => {
      const row = byId.get(machineId);
      if (row === undefined) return [];
      return [
        {
          ...row,
          positionCount: Number(row.positionCount),
          pointCount: Number(row.pointCount),
          openFindingCount: Number(row.openFindingCount),
        },
      ];
    });
  }
}

async function idsOf(page: Filtered): Promise<number[]> {
  return (await page.select('machine.id', 'id').getRawMany<{ id: number }>()).map(({ id }) => id);
}

const directionOf = ({ direction }: MachineListQuery) => (direction === 'desc' ? 'DESC' : 'ASC');

async function inOrder(filtered: Filtered, sort: Sort, query: MachineListQuery, slice: Slice) {
  const direction = directionOf(query);
  const page = filtered.clone().orderBy(sortColumns[sort], direction);
  if (sort !== 'tag') page.addOrderBy('machine.tag', direction);
  page.limit(slice.limit).offset(slice.offset);
  if (!query.search) {
    const [ids, total] = await Promise.all([idsOf(page), countOf(filtered)]);
    return { ids, total };
  }
  // A search reads every name: a page that isn't full is the last one, and needs no second reading.
  const ids = await idsOf(page);
  const isLast = ids.length < slice.limit && (ids.length > 0 || slice.offset === 0);
  const total = isLast ? slice.offset + ids.length : await countOf(filtered);
  return { ids, total };
}

/**
 * Low, medium and high are no alphabet: each class is read in the order of its tags, and the page is
 * put together from those it reaches into.
 */
async function byCriticality(filtered: Filtered, query: MachineListQuery, slice: Slice) {
  const direction = directionOf(query);
  const classes = criticalities
    .filter((one) => query.criticality === undefined || query.criticality === one)
    .map((one) => filtered.clone().andWhere('machine.criticality = :class', { class: one }));
  if (direction === 'DESC') classes.reverse();
  const counts = await Promise.all(classes.map(countOf));
  const ids: number[] = [];
  let before = 0;
  for (const [index, ofClass] of classes.entries()) {
    const count = counts[index] ?? 0;
    const offset = Math.max(0, slice.offset - before);
    const limit = slice.limit - ids.length;
    if (limit > 0 && offset < count) {
      const page = ofClass.clone().orderBy('machine.tag', direction).limit(limit).offset(offset);
      ids.push(...(await idsOf(page)));
    }
    before += count;
  }
  return { ids, total: before };
}

async function countOf(filtered: Filtered): Promise<number> {
  const row = await filtered
    .clone()
    .select('COUNT(*)', 'count')
    .getRawOne<{ count: string | number }>();
  return Number(row?.count ?? 0);
}

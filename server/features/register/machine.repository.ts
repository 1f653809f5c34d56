import type { Db } from '#server/db/database.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import type { MachineListQuery } from '#shared/contracts/machine.ts';

export interface MachineListRow {
  id: number;
  tag: string;
  name: string;
  kind: Machine['kind'];
  nominalSpeedRpm: number | null;
  powerKw: number | null;
  criticality: Machine['criticality'];
  nextPlannedStopOn: string | null;
  ownerName: string | null;
  positionCount: number;
  pointCount: number;
  openFindingCount: number;
}

const sortColumns: Record<MachineListQuery['sort'], string> = {
  tag: 'machine.tag',
  name: 'machine.name',
  kind: 'machine.kind',
  criticality: "FIELD(machine.criticality, 'low', 'medium', 'high')",
  nextPlannedStopOn: 'machine.next_planned_stop_on',
};

/** Machines of a site. */
export class MachineRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** One page of the register; `ownerUserId` narrows it to an owner's machines. */
  async list(siteId: number, ownerUserId: number | null, query: MachineListQuery) {
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
    const total = await filtered.clone().getCount();
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    // The counts are asked for the page's rows alone: the page is cut in the inner query.
    const page = filtered
      .select('machine.id', 'id')
      .orderBy(sortColumns[query.sort], direction)
      .addOrderBy('machine.tag', direction)
      .limit(query.pageSize)
      .offset((query.page - 1) * query.pageSize);
    const ids = (await page.getRawMany<{ id: number }>()).map((row) => row.id);
    if (ids.length === 0) return { rows: [], total };
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
    return {
      rows: ids.flatMap((machineId) => {
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
      }),
      total,
    };
  }

  find(siteId: number, id: number): Promise<Machine | null> {
    return this.db.findOne(Machine, { where: { id, siteId }, relations: { owner: true } });
  }

  async insert(machine: Omit<Machine, 'id' | 'version' | 'site' | 'owner'>): Promise<number> {
    const result = await this.db.insert(Machine, { ...machine, version: 1 });
    return (result.identifiers[0] as { id: number }).id;
  }

  /** Writes the changes if nobody else has since; false if somebody has. */
  async update(
    siteId: number,
    id: number,
    version: number,
    changes: Partial<Machine>,
  ): Promise<boolean> {
    const result = await this.db.update(
      Machine,
      { id, siteId, version },
      { ...changes, version: version + 1 },
    );
    return result.affected === 1;
  }

  /** Findings of a machine that aren't done with. */
  findings(machineId: number): Promise<{ id: number; state: string; positionCode: string }[]> {
    return this.db.query(
      `SELECT f.id, f.state, p.code AS positionCode
         FROM finding f JOIN bearing_position p ON p.id = f.bearing_position_id
        WHERE p.machine_id = ? ORDER BY f.id DESC`,
      [machineId],
    );
  }
}

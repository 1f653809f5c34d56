import type { Db } from '#server/db/database.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';

/** Machines of a site. */
export class MachineRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
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

import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';

/** Longer than any tag or code that is taken. */
const lookedUpCharacters = 200;

export interface FoundMachine {
  /** The same for all spellings that the database holds for one tag. */
  tagKey: string;
  machine: Machine | null;
}

export interface FoundPosition {
  key: string;
  machine: Machine | null;
  position: BearingPosition | null;
}

/**
 * Finds register rows by the names a file gives them. The database does the comparing: it takes
 * "p-101" and "P-101" for one tag, and nothing here may see that differently.
 */
export class RegisterLookupRepository {
  private readonly db: Db;
  private collation: Promise<string> | undefined;

  constructor(db: Db) {
    this.db = db;
  }

  /** One answer for each tag, in their order. */
  async machines(siteId: number, tags: string[]): Promise<FoundMachine[]> {
    const collation = await this.collationName();
    const found = await this.db.query<{ tagKey: string; id: number | null }[]>(
      `SELECT HEX(WEIGHT_STRING(j.tag COLLATE ${collation})) AS tagKey, m.id
         FROM JSON_TABLE(?, '$[*]' COLUMNS (ord FOR ORDINALITY,
                tag VARCHAR(${lookedUpCharacters}) CHARACTER SET utf8mb4 PATH '$')) j
         LEFT JOIN machine m ON m.site_id = ? AND m.tag = j.tag COLLATE ${collation}
        ORDER BY j.ord`,
      [JSON.stringify(tags.map(cut)), siteId],
    );
    const byId = await this.machinesById(found.map(({ id }) => id));
    return found.map(({ tagKey, id }) => ({ tagKey, machine: byId.get(id ?? 0) ?? null }));
  }

  /** One answer for each pair of machine tag and position code, in their order. */
  async positions(
    siteId: number,
    names: { tag: string; code: string }[],
  ): Promise<FoundPosition[]> {
    const collation = await this.collationName();
    const text = `VARCHAR(${lookedUpCharacters}) CHARACTER SET utf8mb4`;
    const found = await this.db.query<
      { key: string; machineId: number | null; positionId: number | null }[]
    >(
      `SELECT CONCAT(HEX(WEIGHT_STRING(j.tag COLLATE ${collation})), '/',
                     HEX(WEIGHT_STRING(j.code COLLATE ${collation}))) AS \`key\`,
              m.id AS machineId, p.id AS positionId
         FROM JSON_TABLE(?, '$[*]' COLUMNS (ord FOR ORDINALITY,
                tag ${text} PATH '$.tag', code ${text} PATH '$.code')) j
         LEFT JOIN machine m ON m.site_id = ? AND m.tag = j.tag COLLATE ${collation}
         LEFT JOIN bearing_position p ON p.machine_id = m.id AND p.code = j.code COLLATE ${collation}
        ORDER BY j.ord`,
      [JSON.stringify(names.map(({ tag, code }) => ({ tag: cut(tag), code: cut(code) }))), siteId],
    );
    const machines = await this.machinesById(found.map(({ machineId }) => machineId));
    const ids = known(found.map(({ positionId }) => positionId));
    const positions = new Map(
      (ids.length === 0 ? [] : await this.db.findBy(BearingPosition, { id: In(ids) })).map(
        (position) => [position.id, position],
      ),
    );
    return found.map(({ key, machineId, positionId }) => ({
      key,
      machine: machines.get(machineId ?? 0) ?? null,
      position: positions.get(positionId ?? 0) ?? null,
    }));
  }

  fitRecordsOf(positionIds: number[]): Promise<FitRecord[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.findBy(FitRecord, { bearingPositionId: In(positionIds) });
  }

  pointsOf(positionIds: number[]): Promise<MeasuringPoint[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.findBy(MeasuringPoint, { bearingPositionId: In(positionIds) });
  }

  /** The members of the site and who else owns a machine there, with their addresses. */
  async people(siteId: number): Promise<{ id: number; email: string; isOwner: boolean }[]> {
    const people = await this.db.query<{ id: number; email: string; role: string | null }[]>(
      `SELECT user.id, user.email, membership.role
         FROM user LEFT JOIN membership
              ON membership.user_id = user.id AND membership.site_id = ?
        WHERE membership.role IS NOT NULL
           OR user.id IN (SELECT owner_user_id FROM machine WHERE site_id = ?)`,
      [siteId, siteId],
    );
    return people.map(({ id, email, role }) => ({ id, email, isOwner: role === 'owner' }));
  }

  private async machinesById(ids: (number | null)[]): Promise<Map<number, Machine>> {
    const wanted = known(ids);
    if (wanted.length === 0) return new Map();
    const machines = await this.db.findBy(Machine, { id: In(wanted) });
    return new Map(machines.map((machine) => [machine.id, machine]));
  }

  /** A database that was given to us may compare texts otherwise than the one we make. */
  private collationName(): Promise<string> {
    this.collation ??= this.db
      .query<{ name: string }[]>(
        `SELECT COLLATION_NAME AS name FROM information_schema.COLUMNS
          WHERE TABLE_SCHEMA = DATABASE() AND TABLE_NAME = 'machine' AND COLUMN_NAME = 'tag'`,
      )
      .then(([row]) => {
        if (row === undefined || !/^utf8mb4_\w+$/.test(row.name)) {
          throw new Error(`The tags of machines have the collation ${String(row?.name)}.`);
        }
        return row.name;
      });
    return this.collation;
  }
}

const cut = (text: string) => text.slice(0, lookedUpCharacters);
const known = (ids: (number | null)[]): number[] => [
  ...new Set(ids.filter((one): one is number => one !== null)),
];

import { In, type EntityMetadata } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { PlannedValues } from '#server/db/entities/register-import-row.entity.ts';
import type { RegisterKind } from '#shared/contracts/register-import.ts';

const entityOf = {
  machines: Machine,
  positions: BearingPosition,
  'fit-records': FitRecord,
  points: MeasuringPoint,
} as const;

type Metadata = EntityMetadata['columns'][number];

/** Writes register rows many at a time, within a transaction. */
export class RegisterWriteRepository {
  private readonly db: Db;
  private readonly kind: RegisterKind;

  constructor(db: Db, kind: RegisterKind) {
    this.db = db;
    this.kind = kind;
  }

  private get metadata(): EntityMetadata {
    return this.db.connection.getMetadata(entityOf[this.kind]);
  }

  /** @returns the new ids, in the order of the rows */
  async insert(rows: Record<string, unknown>[]): Promise<number[]> {
    const result = await this.db
      .createQueryBuilder()
      .insert()
      .into(entityOf[this.kind])
      .values(rows)
      .execute();
    return result.identifiers.map((identifier) => (identifier as { id: number }).id);
  }

  /** The rows as they are now, kept for this transaction until it ends. */
  async lock(ids: number[]): Promise<Map<number, object>> {
    const rows = await this.db.find(entityOf[this.kind] as typeof Machine, {
      where: { id: In(ids) },
      order: { id: 'ASC' },
      lock: { mode: 'pessimistic_write' },
    });
    return new Map(rows.map((row) => [row.id, row]));
  }

  /**
   * The fit records of these positions, of which nobody else adds one until this transaction ends.
   * The positions are held first, as a person's form does: in another order the two would wait for
   * each other. Held to read only, so that nobody waits who merely refers to a position.
   */
  async holdFitRecords(positionIds: number[]): Promise<FitRecord[]> {
    const lock = { mode: 'pessimistic_read' } as const;
    await this.db.find(BearingPosition, {
      where: { id: In(positionIds) },
      order: { id: 'ASC' },
      select: { id: true },
      lock,
    });
    return this.db.find(FitRecord, { where: { bearingPositionId: In(positionIds) }, lock });
  }

  /** Writes the values of each row; those that count their edits count one more. */
  async update(rows: { id: number; values: PlannedValues }[]): Promise<void> {
    const keys = Object.keys(rows[0]?.values ?? {});
    const columns = this.metadata.columns.filter(({ propertyName }) => keys.includes(propertyName));
    const read = columns.map(
      (column) =>
        `\`${column.databaseName}\` ${jsonTypeOf(column)} PATH '$.${column.propertyName}'`,
    );
    const set = columns.map(({ databaseName }) => `t.\`${databaseName}\` = j.\`${databaseName}\``);
    if (this.kind === 'machines') set.push('t.version = t.version + 1');
    const data = rows.map(({ id, values }) => ({ rowId: id, ...values }));
    await this.db.query(
      `UPDATE \`${this.metadata.tableName}\` t
         JOIN JSON_TABLE(?, '$[*]' COLUMNS (row_id INT PATH '$.rowId', ${read.join(', ')})) j
           ON j.row_id = t.id
          SET ${set.join(', ')}`,
      [JSON.stringify(data)],
    );
  }

  async remove(ids: number[]): Promise<void> {
    await this.db.delete(entityOf[this.kind], { id: In(ids) });
  }

  /** Which of the rows others refer to by now, and from which table; asks every foreign key. */
  async usedBy(ids: number[]): Promise<{ id: number; table: string }[]> {
    const references = await this.db.query<{ table: string; column: string }[]>(
      `SELECT TABLE_NAME AS \`table\`, COLUMN_NAME AS \`column\`
         FROM information_schema.KEY_COLUMN_USAGE
        WHERE TABLE_SCHEMA = DATABASE() AND REFERENCED_TABLE_SCHEMA = DATABASE()
          AND REFERENCED_TABLE_NAME = ? AND REFERENCED_COLUMN_NAME = 'id'`,
      [this.metadata.tableName],
    );
    const used: { id: number; table: string }[] = [];
    for (const { table, column } of references) {
      const rows = await this.db.query<{ id: number }[]>(
        `SELECT DISTINCT \`${column}\` AS id FROM \`${table}\`
          WHERE \`${column}\` IN (${ids.map(() => '?').join(', ')})`,
        ids,
      );
      used.push(...rows.map(({ id }) => ({ id, table })));
    }
    return used;
  }

  /** Fit records whose seat an inspection has been assigned for since, by record. */
  async inspectedSince(recordIds: number[], since: Date): Promise<number[]> {
    const rows = await this.db.query<{ id: number }[]>(
      `SELECT DISTINCT fit_record.id
         FROM fit_record
         JOIN finding ON finding.bearing_position_id = fit_record.bearing_position_id
         JOIN inspection ON inspection.finding_id = finding.id
        WHERE fit_record.id IN (${recordIds.map(() => '?').join(', ')})
          AND inspection.assigned_at >= ?`,
      [...recordIds, since],
    );
    return rows.map(({ id }) => id);
  }
}

/** The column's type where JSON is read as a table: texts, numbers and 0 or 1 for yes and no. */
function jsonTypeOf(column: Metadata): string {
  const type = String(column.type);
  switch (type) {
    case 'boolean':
      return 'TINYINT';
    case 'int':
    case 'double':
    case 'date':
      return type.toUpperCase();
    case 'varchar':
      return `VARCHAR(${column.length}) CHARACTER SET utf8mb4`;
    case 'text':
      return 'LONGTEXT CHARACTER SET utf8mb4';
    default:
      throw new Error(`Columns of the type ${type} are not imported.`);
  }
}

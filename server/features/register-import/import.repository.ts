import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { RegisterImportRow } from '#server/db/entities/register-import-row.entity.ts';
import { RegisterImport } from '#server/db/entities/register-import.entity.ts';
import type {
  ImportListQuery,
  ImportRowsQuery,
  RowCounts,
} from '#shared/contracts/register-import.ts';
import type { JudgedRow } from './given-row.ts';

const people = { uploadedBy: true, appliedBy: true, undoneBy: true } as const;

/** Imports of a site and the fate of their rows. */
export class ImportRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async list(siteId: number, { page, pageSize }: ImportListQuery) {
    const [rows, total] = await this.db.findAndCount(RegisterImport, {
      where: { siteId },
      relations: people,
      order: { id: 'DESC' },
      take: pageSize,
      skip: (page - 1) * pageSize,
    });
    return { rows, total };
  }

  find(siteId: number, id: number): Promise<RegisterImport | null> {
    return this.db.findOne(RegisterImport, { where: { id, siteId }, relations: people });
  }

  /**
   * The import, kept for this transaction. All imports of the site are held with it, so that two of
   * them are never written or taken back at the same time.
   */
  async lock(siteId: number, id: number): Promise<RegisterImport | null> {
    await this.db.query('SELECT id FROM register_import WHERE site_id = ? FOR UPDATE', [siteId]);
    return this.db.findOneBy(RegisterImport, { id, siteId });
  }

  async insert(
    entry: Pick<
      RegisterImport,
      | 'siteId'
      | 'kind'
      | 'state'
      | 'fileName'
      | 'encoding'
      | 'separator'
      | 'rowCount'
      | 'uploadedByUserId'
      | 'uploadedAt'
    >,
  ): Promise<number> {
    const result = await this.db.insert(RegisterImport, entry);
    return (result.identifiers[0] as { id: number }).id;
  }

  async update(id: number, changes: Partial<RegisterImport>): Promise<void> {
    await this.db.update(RegisterImport, { id }, changes);
  }

  async setCounts(id: number, counts: RowCounts): Promise<void> {
    await this.update(id, {
      newCount: counts.new,
      changedCount: counts.changed,
      sameCount: counts.same,
      wrongCount: counts.wrong,
    });
  }

  /** Dry runs that a process left behind when it died. */
  async failUnfinished(failure: string): Promise<void> {
    await this.db.update(RegisterImport, { state: 'reading' }, { state: 'failed', failure });
  }

  async addRows(registerImportId: number, rows: JudgedRow[]): Promise<void> {
    if (rows.length === 0) return;
    // Plain SQL: the mapper takes several times as long over twenty thousand rows.
    const json = (value: unknown[] | object | null) =>
      value === null || (Array.isArray(value) && value.length === 0) ? null : JSON.stringify(value);
    await this.db.query(
      `INSERT INTO register_import_row
         (register_import_id, \`row_number\`, fate, label, faults, changes, plan, object_id)
       VALUES ${rows.map(() => '(?, ?, ?, ?, ?, ?, ?, ?)').join(', ')}`,
      rows.flatMap((row) => [
        registerImportId,
        row.rowNumber,
        row.fate,
        row.label,
        json(row.faults),
        json(row.changes),
        json(row.plan),
        row.objectId,
      ]),
    );
  }

  async rows(registerImportId: number, { fate, page, pageSize }: ImportRowsQuery) {
    const [rows, total] = await this.db.findAndCount(RegisterImportRow, {
      where: { registerImportId, ...(fate === undefined ? {} : { fate }) },
      order: { rowNumber: 'ASC' },
      take: pageSize,
      skip: (page - 1) * pageSize,
    });
    return { rows, total };
  }

  /** The next rows with something to write, after a row number. */
  planned(registerImportId: number, afterRow: number, count: number): Promise<RegisterImportRow[]> {
    return this.db
      .createQueryBuilder(RegisterImportRow, 'line')
      .where('line.register_import_id = :registerImportId', { registerImportId })
      .andWhere('line.row_number > :afterRow', { afterRow })
      .andWhere({ fate: In(['new', 'changed']) })
      .orderBy('line.row_number')
      .limit(count)
      .getMany();
  }

  async setObjectIds(made: { rowId: number; objectId: number }[]): Promise<void> {
    if (made.length === 0) return;
    await this.db.query(
      `UPDATE register_import_row line
         JOIN JSON_TABLE(?, '$[*]' COLUMNS (row_id INT PATH '$.rowId', object_id INT PATH '$.objectId')) j
           ON j.row_id = line.id
          SET line.object_id = j.object_id`,
      [JSON.stringify(made)],
    );
  }
}

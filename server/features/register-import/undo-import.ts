import type { Db } from '#server/db/database.ts';
import type { RegisterImportRow } from '#server/db/entities/register-import-row.entity.ts';
import type { RegisterImport } from '#server/db/entities/register-import.entity.ts';
import { AppError } from '#server/http/app-error.ts';
import { RegisterWriteRepository } from './register-write.repository.ts';
import { eachPlanned, objectIdOf, planOf, stillIs } from './write-import.ts';

/** What a row of another table that refers to a register row is, in words. */
const usesOf: Readonly<Record<string, string>> = {
  bearing_position: 'it has bearing positions',
  measuring_point: 'it has measuring points',
  fit_record: 'it has fit records',
  finding: 'there is a finding at it',
  route_point: 'a route goes by it',
  waveform: 'waveforms were recorded at it',
};
const useOf = (table: string) => usesOf[table] ?? `it is used (${table.replaceAll('_', ' ')})`;

const toldFaults = 20;

/**
 * Takes back what an import wrote, within the caller's transaction: new rows go, changed ones are
 * again as they were.
 *
 * @throws {AppError} `conflict` naming the rows that were changed or used since
 */
export async function undoPlanned(db: Db, { id, kind, appliedAt }: RegisterImport): Promise<void> {
  const register = new RegisterWriteRepository(db, kind);
  const faults: { row: RegisterImportRow; reason: string }[] = [];
  await eachPlanned(db, id, async (rows) => {
    const ids = rows.map(objectIdOf);
    const found = await register.lock(ids);
    const kept = rows.filter((row) => !stillIs(found.get(objectIdOf(row)), planOf(row).after));
    faults.push(...kept.map((row) => ({ row, reason: 'it was changed since' })));
    const made = rows.filter(({ fate }) => fate === 'new');
    const byId = new Map(made.map((row) => [objectIdOf(row), row]));
    const madeIds = [...byId.keys()];
    if (madeIds.length > 0) {
      const used = await register.usedBy(madeIds);
      if (kind === 'fit-records' && appliedAt !== null) {
        const inspected = await register.inspectedSince(madeIds, appliedAt);
        used.push(...inspected.map((recordId) => ({ id: recordId, table: 'inspection' })));
      }
      for (const use of used) {
        const row = byId.get(use.id);
        const reason =
          use.table === 'inspection'
            ? 'an inspection of its position was assigned since'
            : useOf(use.table);
        if (row !== undefined) faults.push({ row, reason });
      }
    }
    // The rest isn't written any more: all of it would be rolled back.
    if (faults.length > 0) return;
    if (madeIds.length > 0) await register.remove(madeIds);
    const changed = rows.filter(({ fate }) => fate === 'changed');
    if (changed.length > 0) {
      await register.update(
        changed.map((row) => ({ id: objectIdOf(row), values: planOf(row).before ?? {} })),
      );
    }
  });
  if (faults.length === 0) return;
  const told = faults.map(({ row, reason }) => `Row ${row.rowNumber} (${row.label}): ${reason}.`);
  const more = faults.length === 1 ? '' : ` So it is with ${faults.length - 1} more.`;
  throw new AppError(
    'conflict',
    `The import can't be undone, nothing was taken back. ${told[0] ?? ''}${more}`,
    { fields: told.slice(0, toldFaults).map((message) => ({ path: 'rows', message })) },
  );
}

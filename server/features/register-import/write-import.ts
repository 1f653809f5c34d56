import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Db } from '#server/db/database.ts';
import type {
  PlannedValues,
  RegisterImportRow,
} from '#server/db/entities/register-import-row.entity.ts';
import type { RegisterImport } from '#server/db/entities/register-import.entity.ts';
import { AppError } from '#server/http/app-error.ts';
import { differingKeys, valuesOf } from './given-row.ts';
import { ImportRepository } from './import.repository.ts';
import { RegisterWriteRepository } from './register-write.repository.ts';

const batchRows = 500;

/** Hands on the rows that are to be written, some hundred at a time, in the file's order. */
export async function eachPlanned(
  db: Db,
  importId: number,
  take: (rows: RegisterImportRow[]) => Promise<void>,
): Promise<void> {
  const imports = new ImportRepository(db);
  let last = 0;
  for (;;) {
    const rows = await imports.planned(importId, last, batchRows);
    if (rows.length === 0) return;
    await take(rows);
    last = rows.at(-1)?.rowNumber ?? last;
  }
}

export const planOf = ({ id, plan }: RegisterImportRow) => {
  if (plan === null) throw new Error(`The row ${id} of an import has nothing to write.`);
  return plan;
};

/** Whether a register row still is as an import left or found it. */
export const stillIs = (now: object | undefined, values: PlannedValues): boolean =>
  now !== undefined && differingKeys(valuesOf(now, Object.keys(values)), values).length === 0;

/**
 * Writes what the dry run planned, within the caller's transaction.
 *
 * @throws {AppError} `conflict` naming the row that somebody else has changed since
 */
export async function writePlanned(
  db: Db,
  { id, kind }: RegisterImport,
  principal: SitePrincipal,
  now: Date,
): Promise<void> {
  const register = new RegisterWriteRepository(db, kind);
  const imports = new ImportRepository(db);
  await eachPlanned(db, id, async (rows) => {
    const made = rows.filter(({ fate }) => fate === 'new');
    const changed = rows.filter(({ fate }) => fate === 'changed');
    if (made.length > 0) {
      const values = made.map((row) => planOf(row).after);
      if (kind === 'fit-records') await refuseRecorded(register, made);
      // Who recorded it and when isn't part of what the file says.
      const known =
        kind === 'fit-records'
          ? { inspectionId: null, stage: null, recordedByUserId: principal.userId, createdAt: now }
          : kind === 'machines'
            ? { version: 1 }
            : {};
      const ids = await register.insert(values.map((one) => ({ ...one, ...known })));
      await imports.setObjectIds(
        made.map((row, index) => ({ rowId: row.id, objectId: ids[index] ?? 0 })),
      );
    }
    if (changed.length > 0) {
      const found = await register.lock(changed.map(objectIdOf));
      const stale = changed.find(
        (row) => !stillIs(found.get(objectIdOf(row)), planOf(row).before ?? {}),
      );
      if (stale !== undefined) throw changedSince(stale);
      await register.update(
        changed.map((row) => ({ id: objectIdOf(row), values: planOf(row).after })),
      );
    }
  });
}

export const objectIdOf = ({ id, objectId }: RegisterImportRow): number => {
  if (objectId === null) throw new Error(`The row ${id} of an import belongs to nothing.`);
  return objectId;
};

const changedSince = ({ rowNumber, label }: RegisterImportRow) =>
  new AppError(
    'conflict',
    `Row ${rowNumber} (${label}): somebody else has changed it since the dry run. Nothing was written; send the file again to see what it would change now.`,
  );

/** Fit records have no unique key: two of them for one seat and date are found by looking. */
async function refuseRecorded(
  register: RegisterWriteRepository,
  rows: RegisterImportRow[],
): Promise<void> {
  const key = (values: object) =>
    Object.values(valuesOf(values, ['bearingPositionId', 'seat', 'recordedOn'])).join(' ');
  const ids = rows.map((row) => Number(planOf(row).after.bearingPositionId));
  const there = new Set((await register.holdFitRecords([...new Set(ids)])).map(key));
  const stale = rows.find((row) => there.has(key(planOf(row).after)));
  if (stale !== undefined) throw changedSince(stale);
}

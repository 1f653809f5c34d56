import type { RegisterImportRow } from '#server/db/entities/register-import-row.entity.ts';
import type { RegisterImport } from '#server/db/entities/register-import.entity.ts';
import type { ImportRow, RegisterImportResponse } from '#shared/contracts/register-import.ts';
import { whyNotApplied, whyNotUndone } from './import-states.ts';

export const presentImport = (found: RegisterImport): RegisterImportResponse => ({
  id: found.id,
  kind: found.kind,
  state: found.state,
  fileName: found.fileName,
  encoding: found.encoding,
  separator: found.separator,
  rowCount: found.rowCount,
  rowsRead: found.newCount + found.changedCount + found.sameCount + found.wrongCount,
  counts: {
    new: found.newCount,
    changed: found.changedCount,
    same: found.sameCount,
    wrong: found.wrongCount,
  },
  failure: found.failure,
  uploadedAt: found.uploadedAt.toISOString(),
  uploadedByName: found.uploadedBy?.name ?? '',
  appliedAt: found.appliedAt?.toISOString() ?? null,
  appliedByName: found.appliedBy?.name ?? null,
  undoneAt: found.undoneAt?.toISOString() ?? null,
  undoneByName: found.undoneBy?.name ?? null,
  can: { apply: whyNotApplied(found) === null, undo: whyNotUndone(found) === null },
});

export const presentRow = (row: RegisterImportRow): ImportRow => ({
  id: row.id,
  rowNumber: row.rowNumber,
  fate: row.fate,
  label: row.label,
  faults: row.faults ?? [],
  changes: row.changes ?? [],
});

import type { Database } from '#server/db/database.ts';
import type { RegisterKind, RowCounts } from '#shared/contracts/register-import.ts';
import { readGivenRow, type GivenRow, type JudgedRow } from './given-row.ts';
import { ImportRepository } from './import.repository.ts';
import type { JudgeContext, RegisterChecks } from './judge-context.ts';
import { judgeFitRecords } from './judge-fit-records.ts';
import { judgeMachines } from './judge-machines.ts';
import { judgePoints } from './judge-points.ts';
import { judgePositions } from './judge-positions.ts';
import { readRows, type Table } from './read-table.ts';
import { RegisterLookupRepository } from './register-lookup.repository.ts';

const judgeOf: Readonly<
  Record<RegisterKind, (context: JudgeContext, rows: GivenRow[]) => Promise<JudgedRow[]>>
> = {
  machines: judgeMachines,
  positions: judgePositions,
  'fit-records': judgeFitRecords,
  points: judgePoints,
};

/** Rows judged and kept in one go: few enough that the server answers others in between. */
const batchRows = 250;

export interface DryRun {
  importId: number;
  siteId: number;
  kind: RegisterKind;
  table: Table;
  /** Today, YYYY-MM-DD. */
  today: string;
}

/** The process is about to end: what isn't judged yet stays so. */
export class DryRunStopped extends Error {}

/**
 * Gives every row of the file its fate and keeps it with its plan; writes nothing to the register.
 *
 * @param stopped asked before each batch
 * @throws {DryRunStopped}
 */
export async function runDry(
  database: Database,
  checks: RegisterChecks,
  { importId, siteId, kind, table, today }: DryRun,
  stopped: () => boolean,
): Promise<void> {
  const imports = new ImportRepository(database.db);
  const lookup = new RegisterLookupRepository(database.db);
  const context: JudgeContext = {
    siteId,
    lookup,
    checks,
    people: await lookup.people(siteId),
    today,
    seen: new Map(),
  };
  const counts: RowCounts = { new: 0, changed: 0, same: 0, wrong: 0 };
  await readRows(table, async (rows) => {
    for (let start = 0; start < rows.length; start += batchRows) {
      if (stopped()) throw new DryRunStopped();
      const given = rows.slice(start, start + batchRows).map((row) => readGivenRow(table, row));
      const judged = await judgeOf[kind](context, given);
      for (const { fate } of judged) counts[fate] += 1;
      await imports.addRows(importId, judged);
      await imports.setCounts(importId, counts);
    }
  });
  await imports.update(importId, { state: 'ready' });
}

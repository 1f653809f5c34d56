import type { SitePrincipal } from '#server/auth/principal.ts';
import { byteOrderMark, csvText } from '#server/csv/csv-text.ts';
import type { Database } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { Machine } from '#server/db/entities/machine.entity.ts';
import type { PlannedValues } from '#server/db/entities/register-import-row.entity.ts';
import type { RegisterKind } from '#shared/contracts/register-import.ts';
import { writeCell } from './csv-cell.ts';
import { ExportRepository } from './export.repository.ts';
import { valuesOf } from './given-row.ts';
import { columnsOf } from './import-columns.ts';

/** Machines read in one go; a page of bearing positions is some times as many rows. */
const pageMachines = 200;

/** The register as CSV, in the form in which it is imported. */
export class ExportService {
  private readonly database: Database;

  constructor(database: Database) {
    this.database = database;
  }

  /** The file piece by piece: UTF-8, comma, decimal point, ISO dates, units in the header. */
  async *csv(principal: SitePrincipal, kind: RegisterKind): AsyncGenerator<string> {
    const columns = columnsOf[kind];
    yield byteOrderMark + csvText([columns.map(({ header }) => header)]);
    const repository = new ExportRepository(this.database.db);
    let afterTag: string | null = null;
    for (;;) {
      const machines: Machine[] = await repository.machines(
        principal.siteId,
        afterTag,
        pageMachines,
      );
      const last = machines.at(-1);
      if (last === undefined) return;
      afterTag = last.tag;
      const rows = await rowsOf(repository, kind, machines);
      if (rows.length > 0) {
        yield csvText(
          rows.map((row) => columns.map((column) => writeCell(column, row[column.key] ?? null))),
        );
      }
    }
  }
}

const place = (position: BearingPosition | undefined) => ({
  machineTag: position?.machine?.tag ?? null,
  positionCode: position?.code ?? null,
});

async function rowsOf(
  repository: ExportRepository,
  kind: RegisterKind,
  machines: Machine[],
): Promise<PlannedValues[]> {
  const keys = columnsOf[kind].map(({ key }) => key);
  const ids = machines.map(({ id }) => id);
  switch (kind) {
    case 'machines':
      return machines.map((machine) => ({
        ...valuesOf(machine, keys),
        ownerEmail: machine.owner?.email ?? null,
      }));
    case 'positions':
      return (await repository.positions(ids)).map((position) => ({
        ...valuesOf(position, keys),
        machineTag: position.machine?.tag ?? null,
      }));
    case 'fit-records':
      return (await repository.fitRecords(ids)).map((record) => ({
        ...valuesOf(record, keys),
        ...place(record.bearingPosition),
      }));
    case 'points':
      return (await repository.points(ids)).map((point) => ({
        ...valuesOf(point, keys),
        ...place(point.bearingPosition),
      }));
  }
}

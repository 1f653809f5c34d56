import { quantityOfUnit, type Quantity, type Unit } from '../../quantities/quantity.ts';
import { CsvError, quoteFound } from './csv-error.ts';
import { maxColumns } from './csv-limits.ts';
import { readHeaderCell, type HeaderCell } from './header-row.ts';
import type { ColumnRole, ReadWaveformCsvOptions } from './waveform-csv.ts';

/** What is done with one column. */
export interface PlannedColumn {
  /** `blank`: behind a separator at the end of every row, must stay empty. */
  role: ColumnRole | 'blank';
  name: string;
  quantity: Quantity | null;
  unit: Unit | null;
  unitText: string | null;
  /** Length of the time column's written unit, s. */
  timeUnitS: number;
  /** How the time column is known to be one: its place alone allows a running number as well. */
  timeBy: 'mapping' | 'header' | 'place' | null;
}

/**
 * Decides what each column is: by the mapping, then by the header, then by the convention (the
 * first of several columns is the time).
 *
 * @param header - cells of the header row, or null without one
 * @param headerLine - its physical line; the first row's without a header
 * @param columnCount - cells of the first row, the last of them blank in all rows if `lastIsBlank`
 */
export function planColumns(
  header: readonly string[] | null,
  headerLine: number,
  columnCount: number,
  lastIsBlank: boolean,
  options: ReadWaveformCsvOptions,
): PlannedColumn[] {
  if (columnCount > maxColumns) {
    throw new CsvError(
      'too-many-columns',
      headerLine,
      `The row has ${columnCount} cells; expected at most ${maxColumns}. Export fewer channels.`,
    );
  }
  const mappings = new Map(options.columns?.map((column) => [column.columnIndex, column]));
  for (const index of mappings.keys()) {
    if (!Number.isInteger(index) || index < 0 || index >= columnCount) {
      throw new CsvError(
        'bad-option',
        null,
        `The mapping speaks of column ${index + 1}; the file has ${columnCount}. ` +
          'Choose the columns again for this file.',
      );
    }
  }

  const said: (HeaderCell | null)[] = [];
  const plan: PlannedColumn[] = [];
  for (let i = 0; i < columnCount; i += 1) {
    const mapping = mappings.get(i);
    const cell = header === null || header[i] === undefined ? null : header[i]!;
    const ignored = mapping?.role === 'ignore';
    const read = cell === null || cell === '' || ignored ? null : readHeaderCell(cell, headerLine);
    said.push(read);
    plan.push({
      role: lastIsBlank && i === columnCount - 1 ? 'blank' : roleOf(mapping?.role, read),
      name: mapping?.name ?? (read === null || read.name === '' ? `column ${i + 1}` : read.name),
      quantity: read?.quantity ?? null,
      unit: mapping?.unit ?? read?.unit ?? null,
      unitText: read?.unitText ?? null,
      timeUnitS: read?.timeUnitS ?? 1,
      timeBy: mapping?.role === 'time' ? 'mapping' : read?.kind === 'time' ? 'header' : null,
    });
  }
  placeTime(plan, said, mappings.get(0)?.role !== undefined, headerLine);
  plan.forEach((column, i) => {
    if (column.role !== 'samples') return;
    const told = mappings.get(i)?.unit === undefined ? options.unit : undefined;
    settleUnit(column, told, headerLine);
  });
  checkChannels(plan, headerLine, options.maxChannels ?? maxColumns);
  return plan;
}

function roleOf(mapped: ColumnRole | undefined, read: HeaderCell | null): ColumnRole {
  if (mapped !== undefined) return mapped;
  if (read?.kind === 'time') return 'time';
  return read?.kind === 'index' ? 'ignore' : 'samples';
}

/** Without a named time column the first of several is the time, unless the header says otherwise. */
function placeTime(
  plan: PlannedColumn[],
  said: readonly (HeaderCell | null)[],
  firstIsMapped: boolean,
  headerLine: number,
): void {
  const times = plan.filter((column) => column.role === 'time');
  if (times.length > 1) {
    throw new CsvError(
      'contradictory-header',
      headerLine,
      `${times.length} columns are time (${times.map((column) => column.name).join(', ')}); ` +
        'expected one. Map the others as ignored.',
    );
  }
  const first = plan[0]!;
  const others = plan.slice(1).filter((column) => column.role === 'samples');
  const firstSays = said[0] ?? null;
  const mayBeTime =
    first.role === 'samples' &&
    (firstSays === null || (firstSays.kind === 'unknown' && firstSays.unitText === null));
  if (times.length === 0 && mayBeTime && !firstIsMapped && others.length > 0) {
    first.role = 'time';
    first.timeBy = 'place';
  }
}

function settleUnit(column: PlannedColumn, told: Unit | undefined, headerLine: number): void {
  if (told !== undefined) {
    const otherUnit = column.unit !== null && column.unit !== told;
    const otherQuantity = column.quantity !== null && column.quantity !== quantityOfUnit[told];
    if (otherUnit || otherQuantity) {
      throw new CsvError(
        'contradictory-unit',
        headerLine,
        `${quoteFound(column.name)} is in ${column.unit ?? column.quantity} by the header and in ` +
          `${told} as told; expected one of them. Leave the told unit out or map the column.`,
      );
    }
    column.unit = told;
  }
  if (column.unit !== null) column.quantity = quantityOfUnit[column.unit];
}

function checkChannels(plan: readonly PlannedColumn[], line: number, maxChannels: number): void {
  const channels = plan.filter((column) => column.role === 'samples').length;
  if (channels === 0) {
    throw new CsvError(
      'no-data',
      line,
      'No column holds samples; expected at least one. Map a column as samples.',
    );
  }
  if (channels > maxChannels) {
    throw new CsvError(
      'too-many-columns',
      line,
      `The file has ${channels} channels; expected at most ${maxChannels}. Export fewer channels.`,
    );
  }
}

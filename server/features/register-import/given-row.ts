import type { z } from 'zod';
import type { PlannedValues, RowPlan } from '#server/db/entities/register-import-row.entity.ts';
import type { RowChange, RowFate, RowFault } from '#shared/contracts/register-import.ts';
import { readCell, type CellValue } from './csv-cell.ts';
import { remedyOf, type Column } from './import-columns.ts';
import type { RawRow, Table } from './read-table.ts';

/** A row whose cells are read, by the contract's fields; a column the file lacks is absent. */
export interface GivenRow {
  rowNumber: number;
  given: PlannedValues;
  /** The cells as they stand in the file, to be quoted. */
  raw: Record<string, string>;
  faults: RowFault[];
}

/** What will become of a row, as it is kept. */
export interface JudgedRow {
  rowNumber: number;
  fate: RowFate;
  label: string;
  faults: RowFault[];
  changes: RowChange[];
  plan: RowPlan | null;
  /** The register row that is changed. */
  objectId: number | null;
}

/** Reads the cells of a row; an empty cell that can't be cleared is as good as no column. */
export function readGivenRow(
  { columns, decimalComma }: Pick<Table, 'columns' | 'decimalComma'>,
  { rowNumber, cells }: RawRow,
): GivenRow {
  const row: GivenRow = { rowNumber, given: {}, raw: {}, faults: [] };
  if (cells.length !== columns.length) {
    const odd = columns[cells.length];
    row.faults.push({
      column: odd?.header ?? `column ${columns.length + 1}`,
      reason: `The row has ${cells.length} cells, the header ${columns.length}.`,
      remedy: 'Give the row as many cells as the header; quote cells that hold the separator.',
    });
  }
  for (const [index, column] of columns.entries()) {
    const raw = (cells[index] ?? '').trim();
    const read = readCell(column, raw, decimalComma);
    row.raw[column.key] = raw;
    if ('fault' in read) row.faults.push({ column: column.header, ...read.fault });
    else if (read.value !== null || column.part === 'clearable') {
      row.given[column.key] = read.value;
    }
  }
  return row;
}

/** The text of a cell that finds the row; empty where it can't be read. */
export const textOf = ({ given }: GivenRow, key: string): string => String(given[key] ?? '');

export function columnOf(columns: readonly Column[], key: string): Column {
  const found = columns.find((column) => column.key === key);
  if (found === undefined) throw new Error(`There is no column for the field ${key}.`);
  return found;
}

/** Faults for the cells that a row of this kind must have and that are empty or missing. */
export function emptyFaults(columns: readonly Column[], row: GivenRow, isNew: boolean): RowFault[] {
  return columns.flatMap((column) => {
    const wanted = column.part === 'key' || (isNew && column.part === 'needed');
    if (!wanted || (row.given[column.key] ?? null) !== null) return [];
    if (row.faults.some((fault) => fault.column === column.header)) return [];
    const inFile = column.key in row.raw;
    return [
      {
        column: column.header,
        reason: inFile ? 'The cell is empty.' : 'The file has no such column.',
        remedy: inFile ? remedyOf(column) : 'Add the column: a new row needs it.',
      },
    ];
  });
}

/** Faults as the contract or the fit checks name them, told of their columns. */
export function fieldFaults(
  columns: readonly Column[],
  row: GivenRow,
  faults: readonly { path: string; message: string }[],
): RowFault[] {
  return faults.map(({ path, message }) => {
    // A fault of the whole row is told at its first column.
    const column = columns.find(({ key }) => key === path) ?? columns[0];
    if (column === undefined) throw new Error('A file without columns has no rows.');
    const raw = row.raw[path] ?? '';
    const quoted = raw === '' || message.includes(raw) ? '' : `"${raw.slice(0, 60)}": `;
    return { column: column.header, reason: `${quoted}${message}`, remedy: remedyOf(column) };
  });
}

export const contractFaults = (error: z.ZodError): { path: string; message: string }[] =>
  error.issues.map(({ path, message }) => ({ path: String(path[0] ?? ''), message }));

/** An empty text says as much as none. */
const settled = (value: CellValue | undefined): CellValue => {
  if (value === undefined || value === null) return null;
  if (typeof value !== 'string') return value;
  const text = value.trim();
  return text === '' ? null : text;
};

export const sameValue = (a: CellValue | undefined, b: CellValue | undefined): boolean =>
  settled(a) === settled(b);

/** The fields by which two sets of values differ, out of those the second one has. */
export const differingKeys = (before: PlannedValues, after: PlannedValues): string[] =>
  Object.keys(after).filter((key) => !sameValue(before[key], after[key]));

/** The named properties of a register row. */
export function valuesOf(row: object, keys: readonly string[]): PlannedValues {
  const record = row as Record<string, CellValue>;
  return Object.fromEntries(keys.map((key) => [key, record[key] ?? null]));
}

const shown = (value: CellValue | undefined): string => {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return value === null || value === undefined ? '' : String(value);
};

/** Column by column what was and what will be. */
export const changesOf = (
  columns: readonly Column[],
  keys: readonly string[],
  before: PlannedValues,
  after: PlannedValues,
): RowChange[] =>
  keys.map((key) => ({
    column: columnOf(columns, key).header,
    before: shown(before[key]),
    after: shown(after[key]),
  }));

export const wrongRow = (row: GivenRow, label: string, faults: RowFault[]): JudgedRow => ({
  rowNumber: row.rowNumber,
  fate: 'wrong',
  label,
  faults,
  changes: [],
  plan: null,
  objectId: null,
});

export const sameRow = (row: GivenRow, label: string): JudgedRow => ({
  ...wrongRow(row, label, []),
  fate: 'same',
});

export const newRow = (row: GivenRow, label: string, after: PlannedValues): JudgedRow => ({
  ...wrongRow(row, label, []),
  fate: 'new',
  plan: { before: null, after },
});

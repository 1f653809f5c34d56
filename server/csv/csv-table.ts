import { byteOrderMark, csvText } from './csv-text.ts';
import { guard } from './formula-guard.ts';

/** A cell before it is written; null is an empty cell. */
export type CsvValue = string | number | boolean | null;

/** One column: a header with the unit where there is one, and what of a row stands in it. */
export interface CsvColumn<Row> {
  header: string;
  value: (row: Row) => CsvValue;
}

/** Numbers as they are, with a decimal point; texts with the guard against formulas. */
function cellText(value: CsvValue): string {
  if (value === null) return '';
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return guard(value);
}

/** A file piece by piece as its pages come: UTF-8, comma, header line first. */
export async function* csvTable<Row>(
  columns: readonly CsvColumn<Row>[],
  pages: AsyncIterable<readonly Row[]>,
): AsyncGenerator<string> {
  yield byteOrderMark + csvText([columns.map(({ header }) => header)]);
  for await (const rows of pages) {
    if (rows.length === 0) continue;
    yield csvText(rows.map((row) => columns.map(({ value }) => cellText(value(row)))));
  }
}

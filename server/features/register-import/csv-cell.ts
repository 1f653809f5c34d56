import { guard, unguard } from '#server/csv/formula-guard.ts';
import { isNumeric, remedyOf, type Column } from './import-columns.ts';

export type CellValue = string | number | boolean | null;
type CellFault = { reason: string; remedy: string };

/** A value as it stands in an exported file. */
export function writeCell(column: Column, value: CellValue): string {
  if (value === null) return '';
  if (isNumeric(column)) return String(value);
  if (column.cell === 'yes or no') return value ? 'yes' : 'no';
  return guard(String(value));
}

const yesWords = new Set(['yes', 'true', '1']);
const noWords = new Set(['no', 'false', '0']);
const pointNumber = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
const commaNumber = /^[+-]?(\d+,\d*|,\d+)(e[+-]?\d+)?$/i;
const dottedDate = /^(\d{1,2})\.(\d{1,2})\.(\d{4})$/;

/** Whether the cell of a number column is written with a decimal comma. */
export const hasDecimalComma = (raw: string): boolean => commaNumber.test(unguard(raw).trim());

/**
 * Reads a cell: an empty one is null. In a file with decimal commas a point is refused, since it
 * could as well part the thousands; dates are YYYY-MM-DD, or D.M.YYYY as spreadsheets save them
 * where days come first.
 */
export function readCell(
  column: Column,
  raw: string,
  decimalComma: boolean,
): { value: CellValue } | { fault: CellFault } {
  const text = unguard(raw).trim();
  if (text === '') return { value: null };
  const lower = text.toLowerCase();
  switch (column.cell) {
    case 'text':
      return { value: text };
    case 'number':
    case 'whole number':
      return readNumber(column, text, decimalComma);
    case 'yes or no':
      if (yesWords.has(lower)) return { value: true };
      if (noWords.has(lower)) return { value: false };
      return wrong(column, `"${text}" is neither yes nor no.`);
    case 'date': {
      const [, day = '', month = '', year = ''] = dottedDate.exec(text) ?? [];
      const iso = year === '' ? text : `${year}-${month.padStart(2, '0')}-${day.padStart(2, '0')}`;
      return isDay(iso)
        ? { value: iso }
        : wrong(column, `"${text}" is not a date of the calendar.`);
    }
    case 'word': {
      // Spreadsheets save the taper 1:12 as the time of day 01:12.
      const word = lower.replace(/^0(?=\d:)/, '');
      const found = column.words?.find((one) => one.toLowerCase() === word);
      return found === undefined ? wrong(column, `"${text}" is not known here.`) : { value: found };
    }
  }
}

function readNumber(column: Column, text: string, decimalComma: boolean) {
  const fitting = decimalComma ? text.replace(',', '.') : text;
  if (pointNumber.test(fitting) && !(decimalComma && text.includes('.'))) {
    const value = Number(fitting);
    if (column.cell === 'whole number' && !Number.isSafeInteger(value)) {
      return wrong(column, `"${text}" is not a whole number.`);
    }
    if (Number.isFinite(value)) return { value };
  }
  if (decimalComma && pointNumber.test(text)) {
    return wrong(
      column,
      `"${text}" has a decimal point, other cells of this file a decimal comma.`,
      'Write every number of the file with the same decimal sign, and no sign between thousands.',
    );
  }
  if (commaNumber.test(text)) {
    return wrong(
      column,
      `"${text}" has a decimal comma in a file with commas between its cells.`,
      'Write a decimal point, or save the file with semicolons between its cells.',
    );
  }
  return wrong(column, `"${text}" is not a number.`);
}

const wrong = (column: Column, reason: string, remedy = remedyOf(column)) => ({
  fault: { reason, remedy },
});

function isDay(iso: string): boolean {
  if (!/^\d{4}-\d\d-\d\d$/.test(iso)) return false;
  const moment = new Date(`${iso}T00:00:00Z`);
  return !Number.isNaN(moment.getTime()) && moment.toISOString().startsWith(iso);
}

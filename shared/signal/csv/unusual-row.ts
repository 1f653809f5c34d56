import type { PlannedColumn } from './column-plan.ts';
import { CsvError, quoteFound, type CsvErrorCode } from './csv-error.ts';
import { isControl, refuseControl } from './encoding.ts';
import { isGapText, type NumberScanner } from './number-scanner.ts';
import { splitLine } from './split-line.ts';
import { asciiForMessage, decodeUtf8 } from './utf8.ts';
import type { Separator } from './waveform-csv.ts';

export interface UnusualRow {
  line: number;
  isFirstRow: boolean;
  plan: readonly PlannedColumn[];
  separator: Separator | null;
  scanner: NumberScanner;
  /** Where the values go, one a column. */
  row: Float64Array;
  noteTime: (decimals: number, mantissa: number) => void;
  noteComma: () => void;
}

/**
 * Reads a row with quotes, words for "not a number", ignored text, or a fault.
 *
 * @param from - first byte of the line
 * @param to - its line end
 * @returns false where the line turns out blank
 * @throws {CsvError} naming what stands in the row and what was expected
 */
export function readUnusualRow(
  bytes: Uint8Array,
  from: number,
  to: number,
  into: UnusualRow,
): boolean {
  const { line, plan, separator, scanner, row } = into;
  for (let at = from; at < to; at += 1) if (isControl(bytes[at]!)) refuseControl(bytes[at]!, line);
  const text = decodeUtf8(bytes, from, to) ?? asciiForMessage(bytes, from, to);
  if (/^\s*"?#/u.test(text)) {
    throw new CsvError(
      'comment-after-data',
      line,
      `A comment line ${quoteFound(text.trim())} stands among the samples; expected comment lines ` +
        'before the first row only. Move or delete it.',
    );
  }
  const cells = splitLine(text, separator);
  if (cells === null) {
    throw new CsvError(
      'unclosed-quote',
      line,
      `A quotation mark in ${quoteFound(text.trim())} is not closed, or text follows it; expected ` +
        'it around whole cells. Correct the cell.',
    );
  }
  if (cells.length === 1 && cells[0] === '' && plan.length > 1) return false;

  // A separator at the end of every row makes a last cell that may as well be left out.
  const blankMissing = cells.length === plan.length - 1 && plan.at(-1)!.role === 'blank';
  if (cells.length !== plan.length && !blankMissing) refuseCount(cells, text, into);

  plan.forEach((column, i) => {
    const cell = cells[i] ?? '';
    row[i] = NaN;
    if (column.role === 'ignore') return;
    if (column.role === 'blank') {
      if (cell !== '') refuseCount(cells, text, into);
      return;
    }
    if (isGapText(cell)) return;
    if (!scanner.scanText(cell)) refuseCell(cell, into);
    row[i] = scanner.value;
    if (scanner.mark === 44 && scanner.fractionDigits > 0) into.noteComma();
    if (column.role === 'time') {
      into.noteTime(scanner.fractionDigits - scanner.exponent, scanner.mantissa);
    }
  });
  return true;
}

/** @throws {CsvError} `number-out-of-range`; the value is finite or has run over to infinity */
export function refuseValue(value: number, max: number, line: number): never {
  const found = Number.isFinite(value) ? String(value) : 'larger than a number can be';
  throw new CsvError(
    'number-out-of-range',
    line,
    `The number is ${found}; expected at most ${max} in magnitude. Check the export of this row.`,
  );
}

function refuseCount(cells: readonly string[], text: string, into: UnusualRow): never {
  const { plan, line, separator } = into;
  const expected = plan.length;
  const hint =
    separator === ',' && cells.length === 2 * expected
      ? ' A decimal comma is not possible where commas separate: export with semicolons.'
      : ' Correct the row, or export the file again.';
  throw new CsvError(
    'mixed-columns',
    line,
    `The line ${quoteFound(text.trim())} has ${count(cells.length)}; expected ${expected}, as in ` +
      `the first row.${hint}`,
  );
}

function count(cells: number): string {
  return cells === 1 ? '1 cell' : `${cells} cells`;
}

function refuseCell(cell: string, into: UnusualRow): never {
  const { line, scanner, separator, isFirstRow } = into;
  const fault = describeCell(cell, scanner.mark === 44 ? ',' : '.', separator);
  const hint = isFirstRow
    ? ' A file may have one header row; pass over an instrument’s preamble by telling its lines.'
    : '';
  throw new CsvError(fault.code, line, fault.message + hint);
}

function describeCell(
  cell: string,
  mark: string,
  separator: Separator | null,
): { code: CsvErrorCode; message: string } {
  const found = quoteFound(cell);
  if (/^[+-]?[\d.,]+(?:e[+-]?\d+)?$/iu.test(cell)) {
    const because =
      separator === ','
        ? 'commas separate the cells, so a point marks the decimals'
        : `a ${mark === ',' ? 'comma' : 'point'} marks the decimals in this file`;
    return {
      code: 'mixed-decimal-marks',
      message:
        `${found} stands where a number was expected: ${because}, once in a number and without ` +
        'thousands marks. Export the file with one decimal mark.',
    };
  }
  return {
    code: 'not-a-number',
    message:
      `${found} stands where a number was expected. Correct the cell (a missing sample is left ` +
      'blank), or map its column as ignored.',
  };
}

import { CsvError, quoteFound } from './csv-error.ts';
import type { Line } from './line-cursor.ts';
import { isGapText, NumberScanner } from './number-scanner.ts';
import { splitHeader } from './split-line.ts';
import type { ReadWaveformCsvOptions, Separator } from './waveform-csv.ts';

/** Longest header cell, characters. */
const longestCell = 200;

/** A header row holds something that belongs to no number and to no word for "not a number". */
export function looksLikeHeader(text: string): boolean {
  const rest = text
    .replace(/[+-]?(?:\bnan\b|\binf(?:inity)?\b|1[.,]#(?:qnan|snan|inf|ind)0*)/giu, '')
    .replace(/([\d.,])e(?=[+-]?\d)/giu, '$1');
  return /[^\d+\-.,;\s"]/u.test(rest);
}

/**
 * Reads the cells of a row that `looksLikeHeader`.
 *
 * @param columnCount - cells of the row behind it
 * @returns the cells; null where the row turns out one of numbers, its text in ignored columns
 * @throws {CsvError} `not-a-number` where numbers and text stand together in it
 */
export function readHeader(
  line: Line,
  columnCount: number,
  separator: Separator | null,
  options: ReadWaveformCsvOptions,
): string[] | null {
  const cells = splitHeader(line.text, separator, columnCount);
  if (cells === null) {
    throw new CsvError(
      'unclosed-quote',
      line.number,
      'A quotation mark in the header row is not closed; expected it around whole cells.',
    );
  }
  const long = cells.find((cell) => cell.length > longestCell);
  if (long !== undefined) {
    throw new CsvError(
      'line-too-long',
      line.number,
      `The header cell ${quoteFound(long)} is longer than ${longestCell} characters; expected a ` +
        'name and a unit. Shorten it.',
    );
  }
  const ignored = new Set(
    options.columns?.filter(({ role }) => role === 'ignore').map(({ columnIndex }) => columnIndex),
  );
  const numbers = cells.filter(isNumberText).length;
  const texts = cells.filter(
    (cell, i) => !isGapText(cell) && !isNumberText(cell) && !ignored.has(i),
  );
  if (numbers > 0) {
    if (texts.length === 0) return null;
    throw new CsvError(
      'not-a-number',
      line.number,
      `${quoteFound(texts[0]!)} stands in a row of numbers; expected numbers only, or a header row ` +
        'of names only. Correct the cell, map its column as ignored, or tell how many lines of an ' +
        'instrument’s preamble to pass over.',
    );
  }
  return cells;
}

function isNumberText(cell: string): boolean {
  return new NumberScanner().scanText(cell);
}

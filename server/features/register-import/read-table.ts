import { setImmediate as nextTurn } from 'node:timers/promises';
import papa, { type Parser, type ParseResult } from 'papaparse';
import { AppError } from '#server/http/app-error.ts';
import {
  importLimits,
  type CsvSeparator,
  type RegisterKind,
} from '#shared/contracts/register-import.ts';
import { hasDecimalComma } from './csv-cell.ts';
import { columnsOf, isNumeric, type Column } from './import-columns.ts';

const separators: Readonly<Record<CsvSeparator, string>> = {
  comma: ',',
  semicolon: ';',
  tab: '\t',
};
/** Characters parsed in one go, a few milliseconds of work. */
const chunkCharacters = 64 * 1024;

export interface RawRow {
  /** As a spreadsheet counts: the header is row 1. */
  rowNumber: number;
  cells: string[];
}

/** A file whose header is understood and whose rows are counted. */
export interface Table {
  text: string;
  separator: CsvSeparator;
  /** One for each cell of a row. */
  columns: Column[];
  rowCount: number;
  decimalComma: boolean;
}

function refused(message: string, faults: string[] = [message]): AppError {
  return new AppError('unreadable_file', message, {
    fields: faults.map((fault) => ({ path: 'file', message: fault })),
  });
}

/**
 * Reads the header, counts the rows and sees that the quotation marks close.
 *
 * @throws {AppError} `unreadable_file` naming the header's unknown, missing or doubled columns or
 *   the row; `too_large` where there are more rows than are taken
 */
export async function openTable(text: string, kind: RegisterKind): Promise<Table> {
  const { separator, headers } = readHeader(text, kind);
  const columns = matchColumns(headers, kind);
  const table: Table = { text, separator, columns, rowCount: 0, decimalComma: false };
  await readRows(table, (rows) => {
    table.rowCount += rows.length;
    if (table.rowCount > importLimits.rowsMax) {
      throw new AppError(
        'too_large',
        `The file has more than ${importLimits.rowsMax} rows, the most that is taken. Split it.`,
      );
    }
    // With commas between the cells a comma inside one is no decimal sign.
    table.decimalComma ||= separator !== 'comma' && rows.some((row) => commaIn(row, columns));
  });
  if (table.rowCount === 0) throw refused('The file has a header and no rows below it.');
  return table;
}

const commaIn = ({ cells }: RawRow, columns: Column[]) =>
  columns.some((column, index) => isNumeric(column) && hasDecimalComma(cells[index] ?? ''));

/** Hands the rows with content on, some hundred at a time; others may work in between. */
export async function readRows(
  { text, separator }: Pick<Table, 'text' | 'separator'>,
  take: (rows: RawRow[]) => void | Promise<void>,
): Promise<void> {
  let rowNumber = 0;
  await new Promise<void>((resolve, reject) => {
    papa.parse<string[]>(text, {
      delimiter: separators[separator],
      newline: lineEndingOf(text),
      chunkSize: chunkCharacters,
      chunk: ({ data, errors }: ParseResult<string[]>, parser: Parser) => {
        const quote = errors.find(({ type }) => type === 'Quotes');
        const first = rowNumber + 1;
        const rows = data
          .map((cells, index) => ({ rowNumber: first + index, cells }))
          .filter((row) => row.rowNumber > 1 && row.cells.some((cell) => cell.trim() !== ''));
        rowNumber += data.length;
        parser.pause();
        const work = async () => {
          if (quote !== undefined) {
            throw refused(
              `Row ${first + (quote.row ?? 0)}: a quotation mark is opened and not closed, or closed inside a cell. Put marks inside a cell twice ("").`,
            );
          }
          await take(rows);
          await nextTurn();
        };
        work().then(
          () => parser.resume(),
          (error: unknown) => {
            reject(error instanceof Error ? error : new Error(String(error)));
            // Tells of its completion too, which a refused promise doesn't hear.
            parser.abort();
          },
        );
      },
      complete: () => resolve(),
    });
  });
}

/** The first line ending outside quotation marks. */
function lineEndingOf(text: string): '\r\n' | '\n' | '\r' {
  let quoted = false;
  for (let i = 0; i < text.length; i += 1) {
    const character = text[i];
    if (character === '"') quoted = !quoted;
    else if (!quoted && character === '\n') return '\n';
    else if (!quoted && character === '\r') return text[i + 1] === '\n' ? '\r\n' : '\r';
  }
  return '\n';
}

/** Case, blanks and the two characters for micro make no difference. */
const nameOf = (header: string) =>
  header.trim().toLowerCase().replace(/\s+/g, ' ').replace('\u03BC', '\u00B5');

/** The separator with which most names of the header are known ones. */
function readHeader(text: string, kind: RegisterKind) {
  const known = new Set(columnsOf[kind].map(({ header }) => nameOf(header)));
  const candidates = (Object.keys(separators) as CsvSeparator[]).map((separator) => {
    const { data } = papa.parse<string[]>(text.slice(0, chunkCharacters), {
      delimiter: separators[separator],
      newline: lineEndingOf(text),
      preview: 1,
    });
    const headers = (data[0] ?? []).map((header) => header.trim());
    const score = headers.filter((header) => known.has(nameOf(header))).length;
    return { separator, headers, score };
  });
  // The sort is stable: with nothing known, the most cells, and the comma first.
  const [best] = candidates.sort(
    (a, b) => b.score - a.score || b.headers.length - a.headers.length,
  );
  if (best === undefined) throw new Error('No separator was tried.');
  return best;
}

function matchColumns(headers: string[], kind: RegisterKind): Column[] {
  const columns = columnsOf[kind];
  const byName = new Map(columns.map((column) => [nameOf(column.header), column]));
  const quoted = (names: string[]) => names.map((name) => `"${name}"`).join(', ');
  const unknown = headers.filter((header) => !byName.has(nameOf(header)));
  const names = headers.map(nameOf);
  const doubled = headers.filter((_header, index) => names.indexOf(names[index] ?? '') !== index);
  const missing = columns.filter(
    ({ header, part }) => part === 'key' && !names.includes(nameOf(header)),
  );
  const faults = [
    ...(missing.length === 0
      ? []
      : [`Missing columns: ${quoted(missing.map(({ header }) => header))}.`]),
    ...(unknown.length === 0
      ? []
      : [
          `Unknown columns: ${quoted(unknown)}. Take them out or name them as an export does: ${quoted(columns.map(({ header }) => header))}.`,
        ]),
    ...(doubled.length === 0 ? [] : [`Columns that stand twice: ${quoted(doubled)}.`]),
  ];
  if (faults.length > 0) throw refused(faults.join(' '), faults);
  return headers.flatMap((header) => byName.get(nameOf(header)) ?? []);
}

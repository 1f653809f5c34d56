import type { CommentLines } from './comment-lines.ts';
import { CsvError, quoteFound } from './csv-error.ts';
import { headBytes } from './csv-limits.ts';
import { guessDialect, type Dialect } from './dialect.ts';
import { checkEncoding } from './encoding.ts';
import { looksLikeHeader, readHeader } from './header-cells.ts';
import { LineCursor, type Line } from './line-cursor.ts';
import { splitLine } from './split-line.ts';
import { decodeUtf8 } from './utf8.ts';
import type { ReadWaveformCsvOptions, Separator } from './waveform-csv.ts';

/** What stands before the rows of numbers, and what the head says of them. */
export interface Preamble {
  dialect: Dialect;
  /** Null without a header row. */
  header: string[] | null;
  /** Line of the header row; of the first row without one. */
  headerLine: number;
  columnCount: number;
  /** Every row of the head ends with a separator, so the last cell of each is blank. */
  lastIsBlank: boolean;
  dataFrom: number;
  dataLine: number;
  /** Mean length of a row, bytes. */
  headRowBytes: number;
}

/**
 * Reads the file up to its first row of numbers and settles separator, decimal mark and columns.
 *
 * @param bytes - the head, or more; the whole file if `final`
 */
export function readPreamble(
  bytes: Uint8Array,
  final: boolean,
  options: ReadWaveformCsvOptions,
  comments: CommentLines,
): Preamble {
  if (bytes.length === 0) {
    throw new CsvError('empty-file', null, 'The file is empty; expected samples. Export it again.');
  }
  const head = bytes.subarray(0, headBytes);
  const start = checkEncoding(head);
  const cursor = new LineCursor(bytes, start, final);
  cursor.skip(options.skipLines ?? 0);

  const first = nextContent(cursor, comments);
  if (first === null) refuseEmpty(comments);
  const second = looksLikeHeader(first.text) ? nextContent(cursor, comments) : null;
  if (second !== null) {
    const behind = settleRows(bytes, second, final, options);
    const header = readHeader(first, behind.columnCount, behind.dialect.separator, options);
    if (header !== null) return withHeader(header, first, behind);
  } else if (looksLikeHeader(first.text)) {
    throw new CsvError(
      'no-data',
      first.number,
      `Behind ${quoteFound(first.text.trim())} there are no samples; expected rows of numbers. ` +
        'Export the recording again.',
    );
  }
  return settleRows(bytes, first, final, options);
}

/** Settles what the rows of the head say, from their first one on. */
function settleRows(
  bytes: Uint8Array,
  first: Line,
  final: boolean,
  options: ReadWaveformCsvOptions,
): Preamble {
  const to = lastLineEnd(bytes, first.next, final);
  const dialect = settleDialect(bytes, first.from, to, options);
  const cells = splitLine(first.text, dialect.separator) ?? [first.text];
  return {
    dialect,
    header: null,
    headerLine: first.number,
    columnCount: cells.length,
    lastIsBlank:
      cells.length > 1 &&
      cells.at(-1) === '' &&
      everyLastBlank(bytes, first.from, to, dialect.separator),
    dataFrom: first.from,
    dataLine: first.number,
    headRowBytes: meanRowBytes(bytes, first.from, to),
  };
}

/** A separator at the end of the header or of the rows makes a blank cell more; it means nothing. */
function withHeader(cells: string[], line: Line, rows: Preamble): Preamble {
  const { columnCount } = rows;
  const header =
    cells.length === columnCount + 1 && cells.at(-1) === '' ? cells.slice(0, -1) : cells;
  const rowHasMore = header.length === columnCount - 1 && rows.lastIsBlank;
  if (header.length !== columnCount && !rowHasMore) {
    throw new CsvError(
      'header-mismatch',
      rows.dataLine,
      `The header on line ${line.number} names ${header.length} columns, the first row has ` +
        `${columnCount}; expected as many. Correct the header, or tell the separator.`,
    );
  }
  const lastIsBlank = rows.lastIsBlank && (header[columnCount - 1] ?? '') === '';
  return { ...rows, header, headerLine: line.number, lastIsBlank };
}

function settleDialect(
  bytes: Uint8Array,
  from: number,
  to: number,
  { separator, decimalMark }: ReadWaveformCsvOptions,
): Dialect {
  const guessed = guessDialect(bytes, from, to, decimalMark);
  const settled = separator ?? guessed.separator;
  return { separator: settled, decimalMark: decimalMark ?? (settled === ',' ? '.' : null) };
}

/** @returns end of the last whole line of the head, at least `from` */
function lastLineEnd(bytes: Uint8Array, from: number, final: boolean): number {
  if (final && bytes.length <= headBytes) return bytes.length;
  let at = Math.min(bytes.length, headBytes);
  while (at > from && bytes[at - 1] !== 10 && bytes[at - 1] !== 13) at -= 1;
  return Math.max(at, from);
}

function everyLastBlank(
  bytes: Uint8Array,
  from: number,
  to: number,
  separator: Separator | null,
): boolean {
  const lines = (decodeUtf8(bytes, from, to) ?? '').split(/\r\n|\n|\r/u);
  const isBlank = (line: string) => line.trim() === '' || splitLine(line, separator)?.at(-1) === '';
  return lines.every(isBlank);
}

/** A guess is enough: it sizes the first block of samples. */
function meanRowBytes(bytes: Uint8Array, from: number, to: number): number {
  const end = Math.min(to, from + 2048);
  let rows = 0;
  for (let at = from; at < end; at += 1) if (bytes[at] === 10) rows += 1;
  return rows < 2 ? 4 : (end - from) / rows;
}

/** @returns the next line that is neither blank nor a comment; comments are taken on the way */
function nextContent(cursor: LineCursor, comments: CommentLines): Line | null {
  for (let line = cursor.next(); line !== null; line = cursor.next()) {
    const text = line.text.trim();
    if (text === '') continue;
    const comment = /^"(#.*)"[,;\t ]*$/u.exec(text)?.[1]?.replaceAll('""', '"') ?? text;
    if (!comment.startsWith('#')) return line;
    comments.add(comment, line.number);
  }
  return null;
}

function refuseEmpty(comments: CommentLines): never {
  const hasComments = comments.count > 0;
  throw new CsvError(
    hasComments ? 'no-data' : 'empty-file',
    null,
    hasComments
      ? 'The file holds comment lines only; expected rows of numbers. Export the recording again.'
      : 'The file holds blank lines only; expected samples. Export it again.',
  );
}

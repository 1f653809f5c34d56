import papa from 'papaparse/papaparse.min.js';
import { CsvError, type CsvErrorCode } from './csv-error.ts';
import { splitLine } from './split-line.ts';
import { asciiForMessage, decodeUtf8 } from './utf8.ts';
import { WaveformCsvParser } from './waveform-csv-parser.ts';
import {
  separators,
  type ReadWaveformCsvOptions,
  type Separator,
  type WaveformCsv,
} from './waveform-csv.ts';

/** What is shown of a file before it is sent, read from its first bytes only. */
export interface WaveformCsvPreview {
  /** What the head reads as, without its samples; null where it can't be read as it stands. */
  csv: Omit<WaveformCsv, 'channels'> | null;
  /** Why it can't. */
  fault: { code: CsvErrorCode; line: number | null; message: string } | null;
  /** As read; guessed where the head can't be read. */
  separator: Separator | null;
  /** First lines that are neither comment nor blank, header row included, for the mapping table. */
  rows: readonly { line: number; cells: readonly string[] }[];
  /** Rows of samples in the whole file, estimated by its size; null where it can't be read. */
  estimatedRowCount: number | null;
  /** The same for files a mapping made for one of them fits: separator, columns, header. */
  shape: string;
}

const rowsShown = 25;

/**
 * Reads the head of a file for the preview and the mapping of its columns.
 *
 * @param head - the first bytes; some 64 kB are enough
 * @param totalBytes - size of the whole file; that of `head` where it is all there is
 * @param options - what a person has said of the file so far
 * @returns never throws a CsvError: a fault is part of the preview
 */
export function previewWaveformCsv(
  head: Uint8Array,
  totalBytes: number,
  options: ReadWaveformCsvOptions = {},
): WaveformCsvPreview {
  const isWhole = head.length >= totalBytes;
  const bytes = isWhole ? head : head.subarray(0, wholeLines(head));
  const lines = contentLines(bytes, options.skipLines ?? 0);
  const read = tryRead(bytes, isWhole, options);
  if (read instanceof CsvError) {
    const separator = guessSeparator(lines.map(({ text }) => text));
    const rows = splitRows(lines, separator);
    const { code, line, message } = read;
    const shape = shapeOf(separator, rows[0]?.cells ?? []);
    return {
      csv: null,
      fault: { code, line, message },
      separator,
      rows,
      estimatedRowCount: null,
      shape,
    };
  }
  const { channels: _channels, ...csv } = read;
  const rows = splitRows(lines, csv.separator);
  const header = csv.header.length > 0 ? csv.header : csv.columns.map(() => '');
  return {
    csv,
    fault: null,
    separator: csv.separator,
    rows,
    estimatedRowCount: isWhole
      ? csv.rowCount
      : Math.round((csv.rowCount * totalBytes) / bytes.length),
    shape: shapeOf(csv.separator, header),
  };
}

function tryRead(
  bytes: Uint8Array,
  isWhole: boolean,
  options: ReadWaveformCsvOptions,
): WaveformCsv | CsvError {
  try {
    const parser = new WaveformCsvParser(options);
    return isWhole ? parser.readAll(bytes) : parser.readHead(bytes);
  } catch (error) {
    if (error instanceof CsvError) return error;
    throw error;
  }
}

/** @returns length up to the last line end: what is behind it is half a row */
function wholeLines(head: Uint8Array): number {
  let length = head.length;
  while (length > 0 && head[length - 1] !== 10 && head[length - 1] !== 13) length -= 1;
  return length === 0 ? head.length : length;
}

function contentLines(bytes: Uint8Array, skipLines: number): { line: number; text: string }[] {
  const to = Math.min(bytes.length, 65_536);
  const text = decodeUtf8(bytes, 0, to) ?? asciiForMessage(bytes, 0, to);
  const lines: { line: number; text: string }[] = [];
  const all = text.replace(/^\ufeff/u, '').split(/\r\r\n|\r\n|\n|\r/u);
  for (let i = skipLines; i < all.length && lines.length < rowsShown; i += 1) {
    const content = all[i]!;
    if (content.trim() !== '' && !/^\s*"?#/u.test(content)) {
      lines.push({ line: i + 1, text: content.slice(0, 4096) });
    }
  }
  return lines;
}

/** PapaParse's guess (the separator that makes rows of one width) suits files we can't read. */
function guessSeparator(lines: readonly string[]): Separator | null {
  const guess = papa.parse(lines.join('\n'), {
    delimitersToGuess: [';', '\t', ',', ' '],
    preview: rowsShown,
  });
  const found = separators.find((separator) => separator === guess.meta.delimiter);
  const separates = guess.data.some((cells) => cells.length > 1);
  return separates && found !== undefined ? found : null;
}

function splitRows(
  lines: readonly { line: number; text: string }[],
  separator: Separator | null,
): { line: number; cells: string[] }[] {
  return lines.map(({ line, text }) => ({ line, cells: splitLine(text, separator) ?? [text] }));
}

function shapeOf(separator: Separator | null, cells: readonly string[]): string {
  const names = cells.map((cell) =>
    /^[\d.,+\-eE]*$/u.test(cell) ? '' : cell.toLowerCase().replace(/\s+/gu, ' ').trim(),
  );
  return JSON.stringify([separator, ...names]);
}

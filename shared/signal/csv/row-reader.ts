import { CsvError } from './csv-error.ts';
import { maxLineBytes, maxSampleMagnitude, maxTimeMagnitude } from './csv-limits.ts';
import type { PlannedColumn } from './column-plan.ts';
import { endOfLine } from './line-end.ts';
import { GrowingSamples } from './growing-samples.ts';
import { type NumberScanner } from './number-scanner.ts';
import { readUnusualRow, refuseValue } from './unusual-row.ts';
import { TimeAxis } from './time-axis.ts';
import type { Separator } from './waveform-csv.ts';

// Local copies: an imported constant is looked up at every use by some module loaders.
const lineBytesMax = maxLineBytes;
const sampleMax = maxSampleMagnitude;

const time = 1;
const samples = 2;
const ignore = 0;
const roleCodes = { ignore, time, samples, blank: ignore } as const;

export interface RowReaderSetup {
  plan: readonly PlannedColumn[];
  separator: Separator | null;
  scanner: NumberScanner;
  /** Physical line of the first byte given. */
  line: number;
  maxRows: number;
  maxSamples: number;
  /** Rows to expect, for the first block. */
  expectedRows: number;
}

/**
 * Reads the rows of numbers from bytes, in one pass and without making text of them. A row that
 * holds anything but numbers, blanks and separators is left to `readUnusualRow`.
 *
 * Measured against uDSV 0.7.3 (tests/bench/csv-readers.ts): half the time where numbers have six
 * digits, four fifths where they have 17 or more, since no strings are made and no rows built.
 */
export class RowReader {
  readonly channels: GrowingSamples[];
  readonly axis: TimeAxis | null;
  rowCount = 0;
  /** Rows of gaps that came from blank lines in a file without a time column. */
  blankLineRows = 0;
  firstLine = 0;
  line: number;
  /** Cells with a decimal comma, and whether one of them can't be a thousands comma. */
  commaCells = 0;
  commaProved = false;

  private readonly plan: readonly PlannedColumn[];
  private readonly separator: Separator | null;
  private readonly separatorByte: number;
  private readonly scanner: NumberScanner;
  private readonly roles: Uint8Array;
  private readonly row: Float64Array;
  private readonly maxRows: number;
  private readonly maxSamples: number;
  private pendingBlankLines = 0;
  private columnsRead = 0;
  private timeDecimals = 0;
  private timeMantissa = 0;

  constructor(setup: RowReaderSetup) {
    this.plan = setup.plan;
    this.separator = setup.separator;
    this.separatorByte = setup.separator === null ? 0 : setup.separator.charCodeAt(0);
    this.scanner = setup.scanner;
    this.line = setup.line;
    this.maxRows = setup.maxRows;
    this.maxSamples = setup.maxSamples;
    this.roles = Uint8Array.from(setup.plan, (column) => roleCodes[column.role]);
    this.row = new Float64Array(setup.plan.length);
    this.channels = setup.plan
      .filter((column) => column.role === 'samples')
      .map(() => new GrowingSamples(setup.expectedRows));
    const timeColumn = setup.plan.find((column) => column.role === 'time');
    this.axis =
      timeColumn === undefined ? null : new TimeAxis(timeColumn.timeUnitS, setup.expectedRows);
  }

  /**
   * Reads all complete rows.
   *
   * @param final - whether `to` is the end of the file, so that the last row needs no line end
   * @returns index of the first byte not used: the start of an incomplete row
   */
  read(bytes: Uint8Array, from: number, to: number, final: boolean): number {
    // Behind the last line end no scan is safe from running out of the buffer.
    let safeTo = to;
    while (safeTo > from && bytes[safeTo - 1] !== 10 && bytes[safeTo - 1] !== 13) safeTo -= 1;
    let rowStart = from;
    while (rowStart < safeTo) {
      const lineEnd = this.readUsual(bytes, rowStart);
      let end: number;
      if (lineEnd < 0) {
        end = this.readUnusual(bytes, rowStart, to, final);
        if (end < 0) return rowStart;
      } else {
        end = bytes[lineEnd] === 10 ? lineEnd + 1 : endOfLine(bytes, lineEnd, to, final);
        if (end < 0) return rowStart;
        if (end - rowStart > lineBytesMax) this.refuseLength();
        if (this.columnsRead === 0) this.pendingBlankLines += 1;
        else this.commit();
      }
      this.line += 1;
      rowStart = end;
    }
    if (to - rowStart > lineBytesMax) this.refuseLength();
    if (!final || rowStart >= to) return rowStart;
    this.readUnusual(bytes, rowStart, to, true);
    this.line += 1;
    return to;
  }

  /**
   * Reads a row of nothing but numbers, blank cells, blanks and separators into `row`.
   *
   * @returns index of the line end, or -1 where the row holds anything else or the wrong number of
   *   cells; a blank line reads no column
   */
  private readUsual(bytes: Uint8Array, from: number): number {
    const { scanner, roles, row, separatorByte } = this;
    const columnCount = roles.length;
    let at = from;
    let column = 0;
    let byte = bytes[at]!;
    for (;;) {
      while (byte === 32 || (byte === 9 && separatorByte !== 9)) byte = bytes[++at]!;
      const blank = byte === 10 || byte === 13;
      if (blank && (column === 0 || separatorByte === 32)) break;
      if (column === columnCount) return -1;
      if (blank || byte === separatorByte) {
        row[column] = NaN;
      } else {
        if (roles[column] === ignore) return -1;
        const next = scanner.scan(bytes, at);
        if (next < 0) return -1;
        row[column] = scanner.value;
        if (roles[column] === time) {
          this.timeDecimals = scanner.fractionDigits - scanner.exponent;
          this.timeMantissa = scanner.mantissa;
        }
        if (scanner.mark === 44 && scanner.fractionDigits > 0) this.noteComma();
        byte = bytes[next]!;
        at = next;
        while (byte === 32 || (byte === 9 && separatorByte !== 9)) byte = bytes[++at]!;
      }
      column += 1;
      if (byte === 10 || byte === 13) break;
      if (byte === separatorByte) byte = bytes[++at]!;
      else if (separatorByte !== 32 || bytes[at - 1] !== 32) return -1;
    }
    this.columnsRead = column;
    return column === columnCount || column === 0 ? at : -1;
  }

  /** Keeps the row gathered in `row`. */
  private commit(): void {
    if (this.pendingBlankLines > 0) this.keepBlankLines();
    if (this.rowCount === 0) this.firstLine = this.line;
    const { row, roles } = this;
    let channel = 0;
    for (let column = 0; column < roles.length; column += 1) {
      const role = roles[column]!;
      const value = row[column]!;
      if (role === samples) {
        if (value > sampleMax || value < -sampleMax) refuseValue(value, sampleMax, this.line);
        this.channels[channel]!.push(value);
        channel += 1;
      } else if (role === time) {
        if (!(Math.abs(value) <= maxTimeMagnitude)) {
          if (!Number.isNaN(value)) refuseValue(value, maxTimeMagnitude, this.line);
          throw new CsvError(
            'time-missing',
            this.line,
            'The time is blank or not finite; expected a number in every row. Export the ' +
              'recording unbroken, or map the column as ignored and tell the sampling rate.',
          );
        }
        this.axis!.push(value, this.line, this.timeDecimals, this.timeMantissa);
      }
    }
    this.countRow();
  }

  private countRow(): void {
    this.rowCount += 1;
    const tooMany = this.rowCount > this.maxRows;
    if (tooMany || this.rowCount * this.channels.length > this.maxSamples) {
      throw new CsvError(
        'too-many-rows',
        this.line,
        `The file has more than ${this.rowCount - 1} rows in ${this.channels.length} ` +
          `channels; expected at most ${this.maxRows} rows and ${this.maxSamples} samples in all. ` +
          'Send a shorter recording or fewer channels.',
      );
    }
  }

  /**
   * A blank line between rows is a blank cell in a file of one column, a row of gaps in one of
   * several waveforms; with a time column nothing is missing as long as the times go on evenly.
   */
  private keepBlankLines(): void {
    if (this.rowCount > 0 && this.axis === null) {
      for (let i = 0; i < this.pendingBlankLines; i += 1) {
        for (const channel of this.channels) channel.push(NaN);
        this.blankLineRows += 1;
        this.countRow();
      }
    }
    this.pendingBlankLines = 0;
  }

  private noteComma(): void {
    this.commaCells += 1;
    if (this.commaProved) return;
    const { fractionDigits, integerDigits, exponent, value } = this.scanner;
    // Thousands have one to three digits before the comma, no leading zero, three behind.
    this.commaProved =
      fractionDigits !== 3 ||
      exponent !== 0 ||
      integerDigits === 0 ||
      integerDigits > 3 ||
      Math.abs(value) < 10 ** (integerDigits - 1);
  }

  /** @returns index behind the row, or -1 where it is incomplete */
  private readUnusual(bytes: Uint8Array, from: number, to: number, final: boolean): number {
    let at = from;
    while (at < to && bytes[at] !== 10 && bytes[at] !== 13) at += 1;
    const end = endOfLine(bytes, at, to, final);
    if (at - from > lineBytesMax) this.refuseLength();
    if (end < 0) return -1;
    const isRow = readUnusualRow(bytes, from, at, {
      line: this.line,
      isFirstRow: this.rowCount === 0,
      plan: this.plan,
      separator: this.separator,
      scanner: this.scanner,
      row: this.row,
      noteTime: (decimals, mantissa) => {
        this.timeDecimals = decimals;
        this.timeMantissa = mantissa;
      },
      noteComma: () => this.noteComma(),
    });
    if (isRow) this.commit();
    else this.pendingBlankLines += 1;
    return end;
  }

  private refuseLength(): never {
    throw new CsvError(
      'line-too-long',
      this.line,
      `The line is longer than ${lineBytesMax} bytes; expected one row of numbers. ` +
        'Export the samples one row a line.',
    );
  }
}

import { planColumns, type PlannedColumn } from './column-plan.ts';
import { CommentLines } from './comment-lines.ts';
import { CsvError } from './csv-error.ts';
import { headBytes, maxRows, maxSamples, minSamples } from './csv-limits.ts';
import { NumberScanner } from './number-scanner.ts';
import { checkOptions } from './read-options.ts';
import { readPreamble, type Preamble } from './preamble.ts';
import { RowReader } from './row-reader.ts';
import { settleSampleRate } from './sample-rate.ts';
import type {
  DecimalMark,
  ReadWaveformCsvOptions,
  WaveformChannel,
  WaveformCsv,
} from './waveform-csv.ts';

/**
 * Reads a waveform CSV that arrives in chunks; memory holds the samples and one chunk.
 *
 * @example
 * const parser = new WaveformCsvParser();
 * for await (const chunk of stream) parser.push(chunk);
 * const waveform = parser.finish();
 */
export class WaveformCsvParser {
  private readonly options: ReadWaveformCsvOptions;
  private readonly comments = new CommentLines();
  private readonly scanner = new NumberScanner();
  /** Bytes not used yet: the head while it fills, then the start of an incomplete row. */
  private pending: Uint8Array = new Uint8Array(0);
  private preamble: Preamble | null = null;
  private plan: PlannedColumn[] = [];
  private rows: RowReader | null = null;
  private finished = false;

  /** @throws {CsvError} `bad-option` */
  constructor(options: ReadWaveformCsvOptions = {}) {
    checkOptions(options);
    this.options = options;
  }

  /**
   * Takes the next bytes; they are read or copied before the call returns.
   *
   * @throws {CsvError} as soon as the bytes show a fault; the parser is of no use afterwards
   */
  push(chunk: Uint8Array): void {
    if (this.finished) throw new TypeError('push after finish');
    const bytes = this.pending.length === 0 ? chunk : concat(this.pending, chunk);
    const used = this.advance(bytes, false);
    // A copy: the caller may fill the same chunk again.
    this.pending = bytes.slice(used);
  }

  /** @throws {CsvError} for faults that only the whole file shows */
  finish(): WaveformCsv {
    if (this.finished) throw new TypeError('finish after finish');
    this.advance(this.pending, true);
    this.finished = true;
    return this.result();
  }

  /** Reads a whole file at once, without copying it. */
  readAll(bytes: Uint8Array): WaveformCsv {
    this.advance(bytes, true);
    this.finished = true;
    return this.result();
  }

  /**
   * Reads the first rows of a file, cut behind a line end: what only the whole file can show (too
   * few samples, gaps only, an ambiguous comma) is left open.
   */
  readHead(bytes: Uint8Array): WaveformCsv {
    this.advance(bytes, true);
    this.finished = true;
    return this.result(false);
  }

  /** @returns number of bytes used */
  private advance(bytes: Uint8Array, final: boolean): number {
    let from = 0;
    if (this.rows === null) {
      if (!final && bytes.length < headBytes) return 0;
      from = this.start(bytes, final);
    }
    return this.rows!.read(bytes, from, bytes.length, final);
  }

  /** Settles everything the head settles. @returns index of the first row */
  private start(bytes: Uint8Array, final: boolean): number {
    const preamble = readPreamble(bytes, final, this.options, this.comments);
    this.preamble = preamble;
    const { separator, decimalMark } = preamble.dialect;
    this.scanner.commaMayMark = separator !== ',';
    this.scanner.mark = decimalMark === null ? 0 : decimalMark.charCodeAt(0);
    this.plan = planColumns(
      preamble.header,
      preamble.headerLine,
      preamble.columnCount,
      preamble.lastIsBlank,
      this.options,
    );
    const rowBytes = preamble.headRowBytes;
    this.rows = new RowReader({
      plan: this.plan,
      separator,
      scanner: this.scanner,
      line: preamble.dataLine,
      maxRows: Math.min(this.options.maxRows ?? maxRows, maxRows),
      maxSamples,
      expectedRows:
        Math.ceil((bytes.length - preamble.dataFrom) / Math.max(2, rowBytes * 0.95)) + 16,
    });
    return preamble.dataFrom;
  }

  private result(isWhole = true): WaveformCsv {
    const rows = this.rows!;
    const preamble = this.preamble!;
    if (isWhole) checkRows(rows, preamble, this.options, this.scanner);
    const comments = this.comments.finish();
    const rate = this.settleRate(rows, comments.sampleRateHz);
    const channels = this.channels(rows);
    if (isWhole) checkGaps(channels);
    const mark = this.decimalMark(rows);
    const told = this.options.speedRpm;
    const speedRpm = told ?? comments.speedRpm ?? null;
    return {
      channels,
      sampleRateHz: rate.sampleRateHz,
      sampleRateSource: rate.sampleRateSource,
      speedRpm,
      speedSource: told !== undefined ? 'told' : speedRpm === null ? null : 'comment',
      comments,
      separator: preamble.dialect.separator,
      decimalMark: mark,
      header: preamble.header ?? [],
      columns: this.plan.map(({ role, name, quantity, unit, unitText }, columnIndex) => ({
        columnIndex,
        role,
        name,
        quantity,
        unit,
        unitText,
      })),
      columnCount: preamble.columnCount,
      rowCount: rows.rowCount,
      firstDataLine: rows.firstLine,
      startTimeS: rate.startTimeS,
    };
  }

  private settleRate(rows: RowReader, notedHz: number | undefined) {
    const axis = rows.rowCount < 2 ? null : (rows.axis?.finish() ?? null);
    const column = this.plan.find(({ role }) => role === 'time');
    // Known by its place alone and rising by exactly 1: a running number, not seconds.
    const isIndex = axis !== null && column!.timeBy === 'place' && axis.isRunningNumber;
    const unitNamed = column?.unitText != null;
    const told = this.options.sampleRateHz;
    const used = isIndex ? null : axis;
    const rate = settleSampleRate(used, unitNamed, told, this.comments, notedHz);
    return { ...rate, startTimeS: used?.startTimeS ?? null };
  }

  private channels(rows: RowReader): WaveformChannel[] {
    const channels: WaveformChannel[] = [];
    this.plan.forEach((column, columnIndex) => {
      if (column.role !== 'samples') return;
      const samples = rows.channels[channels.length]!.finish();
      const { name, quantity, unit, unitText } = column;
      const gapCount = countGaps(samples);
      channels.push({ name, columnIndex, quantity, unit, unitText, samples, gapCount });
    });
    return channels;
  }

  private decimalMark(rows: RowReader): DecimalMark | null {
    if (this.scanner.mark === 44) return rows.commaCells > 0 ? ',' : null;
    return this.scanner.mark === 46 ? '.' : null;
  }
}

function checkGaps(channels: readonly WaveformChannel[]): void {
  if (channels.every((channel) => channel.gapCount === channel.samples.length)) {
    throw new CsvError(
      'only-gaps',
      null,
      'Every sample is blank or not finite; expected numbers. Check the export.',
    );
  }
}

/** Faults that only the whole file shows. */
function checkRows(
  rows: RowReader,
  preamble: Preamble,
  options: ReadWaveformCsvOptions,
  scanner: NumberScanner,
): void {
  if (rows.rowCount < minSamples) {
    throw new CsvError(
      'too-few-samples',
      rows.rowCount === 0 ? null : rows.line - 1,
      `The file has ${rows.rowCount} rows of samples; expected at least ${minSamples}, and a ` +
        'recording has thousands. Export the whole recording.',
    );
  }
  if (rows.blankLineRows > 2 && rows.blankLineRows >= (rows.rowCount - 1) / 2) {
    throw new CsvError(
      'blank-lines',
      rows.firstLine + 1,
      `${rows.blankLineRows} of ${rows.rowCount} lines are blank, which would make a gap behind ` +
        'every sample; expected one row a line. Export the file without blank lines.',
    );
  }
  if (options.decimalMark !== undefined || scanner.mark !== 44 || rows.commaCells === 0) return;
  if (!rows.commaProved || isStray(rows, preamble)) {
    throw new CsvError(
      'ambiguous-comma',
      rows.firstLine,
      'The commas in the numbers may mark decimals, thousands or cells; nothing in the file tells. ' +
        'Say which decimal mark the file uses, or export it with a decimal point.',
    );
  }
}

/** In a file of one column commas in a few numbers only are more likely torn rows than decimals. */
function isStray(rows: RowReader, preamble: Preamble): boolean {
  if (preamble.dialect.separator !== null) return false;
  let numbers = 0;
  for (const channel of rows.channels) numbers += channel.countNonZero();
  return rows.commaCells < numbers / 8;
}

function countGaps(samples: Float64Array): number {
  let count = 0;
  for (let i = 0; i < samples.length; i += 1) if (samples[i] !== samples[i]) count += 1;
  return count;
}

function concat(a: Uint8Array, b: Uint8Array): Uint8Array {
  const joined = new Uint8Array(a.length + b.length);
  joined.set(a);
  joined.set(b, a.length);
  return joined;
}

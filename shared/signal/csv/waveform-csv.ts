import type { Quantity, Unit } from '../../quantities/quantity.ts';

export const separators = [',', ';', '\t', ' '] as const;
/** What stands between two cells; a blank stands for any run of blanks. */
export type Separator = (typeof separators)[number];

export const decimalMarks = ['.', ','] as const;
export type DecimalMark = (typeof decimalMarks)[number];

/** The keys a comment line `# key: value` may settle. */
export const commentKeys = [
  'asset',
  'point',
  'taken_at',
  'speed_rpm',
  'sample_rate_hz',
  'full_scale',
  'line_frequency_hz',
  'asset_kind',
] as const;
export type CommentKey = (typeof commentKeys)[number];

/** What the file says of itself; absent means the file doesn't say. */
export interface WaveformComments {
  asset?: string;
  point?: string;
  /** ISO 8601 as written: a moment with its zone, a moment without one, or a day. */
  takenAt?: string;
  speedRpm?: number;
  sampleRateHz?: number;
  fullScale?: number;
  lineFrequencyHz?: number;
  assetKind?: string;
  /** Comment lines with other keys, as written; they settle nothing. */
  other: readonly { key: string; value: string; line: number }[];
}

/** What a column holds. `ignore` columns may hold anything, text included. */
export const columnRoles = ['time', 'samples', 'ignore'] as const;
export type ColumnRole = (typeof columnRoles)[number];

/** What a person has said of one column; it wins over the header. */
export interface ColumnMapping {
  /** Counted from 0. */
  columnIndex: number;
  role?: ColumnRole;
  unit?: Unit;
  name?: string;
}

export interface ReadWaveformCsvOptions {
  /** Physical lines to pass over at the top: an instrument's own preamble. */
  skipLines?: number;
  separator?: Separator;
  decimalMark?: DecimalMark;
  columns?: readonly ColumnMapping[];
  /** Unit of every samples column whose header names none; another unit in the header is an error. */
  unit?: Unit;
  /** Told sampling rate, Hz; wins over the comment line, must agree with a time column. */
  sampleRateHz?: number;
  /** Told speed, r/min; wins over the comment line. */
  speedRpm?: number;
  /** Rows to accept at most; at most the limit of csv-limits.ts. */
  maxRows?: number;
  /** Channels to accept at most. */
  maxChannels?: number;
}

export interface WaveformChannel {
  /** Header cell without its unit, the mapping's name, or `column 2`. */
  name: string;
  /** Counted from 0. */
  columnIndex: number;
  quantity: Quantity | null;
  unit: Unit | null;
  /** What stands in the header's brackets, also where it is none of our units; null without. */
  unitText: string | null;
  /** NaN marks a gap. Owns its buffer, so it can be transferred. */
  samples: Float64Array;
  gapCount: number;
}

/** One column of the file as it was taken. */
export interface WaveformColumn {
  columnIndex: number;
  /** `blank`: behind a separator at the end of every row. */
  role: ColumnRole | 'blank';
  name: string;
  quantity: Quantity | null;
  unit: Unit | null;
  unitText: string | null;
}

/** `time`: from the time column; `comment`: from the file's comment line; `told`: by a person. */
export type SampleRateSource = 'time' | 'comment' | 'told';

export interface WaveformCsv {
  /** One a samples column, in the order of the file; at least one. */
  channels: WaveformChannel[];
  /** Null where neither the file nor anybody says. */
  sampleRateHz: number | null;
  sampleRateSource: SampleRateSource | null;
  speedRpm: number | null;
  speedSource: 'comment' | 'told' | null;
  comments: WaveformComments;
  /** Null in a file of one column. */
  separator: Separator | null;
  /** Null where no number has a fraction. */
  decimalMark: DecimalMark | null;
  /** Header cells as written; empty without a header row. */
  header: readonly string[];
  columns: readonly WaveformColumn[];
  columnCount: number;
  rowCount: number;
  /** Physical line of the first row, counted from 1. */
  firstDataLine: number;
  /** First time of the time column, s; null without one. */
  startTimeS: number | null;
}

/** Every way a waveform CSV is refused. The list is closed. */
export const csvErrorCodes = [
  'empty-file',
  'no-data',
  'binary',
  'utf-16',
  'not-utf-8',
  'line-too-long',
  'too-many-comments',
  'too-many-columns',
  'too-many-rows',
  'too-few-samples',
  'bad-comment',
  'comment-after-data',
  'contradictory-comments',
  'contradictory-header',
  'contradictory-unit',
  'contradictory-rate',
  'header-mismatch',
  'mixed-columns',
  'blank-lines',
  'not-a-number',
  'number-out-of-range',
  'mixed-decimal-marks',
  'ambiguous-comma',
  'unclosed-quote',
  'time-not-uniform',
  'time-not-rising',
  'time-missing',
  'implausible-rate',
  'only-gaps',
  'bad-option',
  'sample-rate-missing',
  'unit-missing',
] as const;
export type CsvErrorCode = (typeof csvErrorCodes)[number];

/**
 * A file that can't be read as a waveform. The message says what was found, what was expected and
 * what to do; the line stands beside it and not in it, so that each page words it its own way.
 */
export class CsvError extends Error {
  override readonly name = 'CsvError';

  constructor(
    readonly code: CsvErrorCode,
    /** Physical line, counted from 1; null where the fault is not on one line. */
    readonly line: number | null,
    message: string,
  ) {
    super(message);
  }
}

/** Puts found text into a message: short, on one line, control characters made visible. */
export function quoteFound(text: string): string {
  const shown = text.replace(/\p{Cc}/gu, '\u00b7');
  return `“${shown.length > 40 ? `${shown.slice(0, 40)}…` : shown}”`;
}

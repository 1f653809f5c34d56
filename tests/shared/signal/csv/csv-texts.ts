import { CsvError, type CsvErrorCode } from '#shared/signal/csv/csv-error.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import type { ReadWaveformCsvOptions } from '#shared/signal/csv/waveform-csv.ts';

/** Rows of a file, one a line, with a line feed behind each. */
export function rowsOf(count: number, row: (i: number) => string, lineEnd = '\n'): string {
  return Array.from({ length: count }, (_, i) => row(i) + lineEnd).join('');
}

/** A few samples that look like a vibration: both signs, fractions, a zero. */
export const someSamples = [0, 0.25, -0.5, 1.75, -2, 0.125, 3.5, -0.75, 1, -1.25];

/** The fault a file is refused with, for comparing; fails where it is read. */
export function faultOf(
  input: Uint8Array | string,
  options?: ReadWaveformCsvOptions,
): { code: CsvErrorCode; line: number | null; message: string } {
  try {
    readWaveformCsv(input, options);
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return { code: error.code, line: error.line, message: error.message };
  }
  throw new Error('The file was read, where a fault was expected.');
}

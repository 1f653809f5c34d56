import { encodeUtf8 } from './utf8.ts';
import { WaveformCsvParser } from './waveform-csv-parser.ts';
import type { ReadWaveformCsvOptions, WaveformCsv } from './waveform-csv.ts';

/**
 * Reads a waveform CSV: UTF-8 with or without byte order mark; `,` `;` tab or blanks between cells;
 * decimal point, or decimal comma where commas don't separate; LF, CRLF or CR; leading comment
 * lines `# key: value`; an optional header row with quantity and unit in brackets. One numeric
 * column holds samples; of several the first is the time unless the header says otherwise.
 *
 * The rest of the rules stands beside the part that applies it: limits in csv-limits.ts, the comma
 * in dialect.ts, the time in time-axis.ts, the sampling rate in sample-rate.ts.
 *
 * @param input - the whole file; bytes are not changed
 * @returns the waveforms; the sampling rate and units are null where nobody says
 * @throws {CsvError} for anything else, naming line and expectation
 */
export function readWaveformCsv(
  input: Uint8Array | string,
  options: ReadWaveformCsvOptions = {},
): WaveformCsv {
  const bytes = typeof input === 'string' ? encodeUtf8(input) : input;
  return new WaveformCsvParser(options).readAll(bytes);
}

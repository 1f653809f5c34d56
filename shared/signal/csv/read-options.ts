import { CsvError } from './csv-error.ts';
import { maxRows, maxSampleRateHz, maxSpeedRpm } from './csv-limits.ts';
import type { ReadWaveformCsvOptions } from './waveform-csv.ts';

/** @throws {CsvError} `bad-option` where a told figure can't be one */
export function checkOptions(options: ReadWaveformCsvOptions): void {
  const { sampleRateHz, speedRpm, skipLines, separator, decimalMark } = options;
  checkNumber('sampling rate', sampleRateHz, maxSampleRateHz, 'Hz');
  checkNumber('speed', speedRpm, maxSpeedRpm, 'r/min');
  if (options.maxRows !== undefined) checkNumber('row limit', options.maxRows, maxRows, 'rows');
  if (skipLines !== undefined && !(Number.isInteger(skipLines) && skipLines >= 0)) {
    refuse(`The lines to pass over are ${skipLines}; expected a whole number from 0.`);
  }
  if (separator === ',' && decimalMark === ',') {
    refuse('The comma is told as separator and as decimal mark; expected one of them.');
  }
}

function checkNumber(what: string, value: number | undefined, max: number, unit: string): void {
  if (value !== undefined && !(value > 0 && value <= max)) {
    refuse(
      `The told ${what} is ${value}; expected a number in ${unit} above 0 and at most ${max}.`,
    );
  }
}

function refuse(message: string): never {
  throw new CsvError('bad-option', null, message);
}

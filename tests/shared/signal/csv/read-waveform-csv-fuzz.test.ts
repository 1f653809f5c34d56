import { describe, expect, it } from 'vitest';
import { CsvError } from '#shared/signal/csv/csv-error.ts';
import { maxSampleMagnitude } from '#shared/signal/csv/csv-limits.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { decodeUtf8, encodeUtf8 } from '#shared/signal/csv/utf8.ts';
import { WaveformCsvParser } from '#shared/signal/csv/waveform-csv-parser.ts';
import type { WaveformCsv } from '#shared/signal/csv/waveform-csv.ts';
import { rowsOf } from './csv-texts.ts';

/** mulberry32: a small generator with a fixed seed, so that a failing run can be run again. */
function random(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

const wave = (i: number) => (2 * Math.sin(i * 0.7) + (i % 5) * 0.125).toFixed(4);
const seconds = (i: number) => (i / 25600).toFixed(8);
const startFiles = [
  rowsOf(40, wave),
  `\ufeff# asset: P-1\r\n# speed_rpm: 1480\r\nacceleration [m/s²]\r\n${rowsOf(40, wave, '\r\n')}`,
  rowsOf(40, (i) => wave(i).replace('.', ',')),
  `time [s],a [g],b [mm/s]\n${rowsOf(40, (i) => `${seconds(i)},${wave(i)},${i % 7}`)}`,
  `Zeit [ms];Weg (µm)\n${rowsOf(40, (i) => `${i / 2};${wave(i)}`.replaceAll('.', ','))}`,
  `# sample_rate_hz: 25600\n${rowsOf(40, (i) => `${seconds(i)}\t"${wave(i)}"\t${i % 9 === 0 ? '' : 'NaN'}`)}`,
  `t [s]  1H [in/s]\n${rowsOf(40, (i) => `  ${seconds(i)}   ${wave(i)}`)}`,
  rowsOf(40, (i) => `${i},${Math.round(100 * Math.sin(i))}`),
];

const inserts = [
  ',',
  ';',
  '\t',
  ' ',
  '"',
  '#',
  '\n',
  '\r',
  '\r\n',
  '.',
  '-',
  'e',
  'E9',
  '1e308',
  'NaN',
  '\0',
  '\xff',
  'µ',
  'time',
  '[g]',
  '0',
  '99999999999999999999',
  '\ufeff',
  '# sample_rate_hz: 7\n',
];

function mutate(bytes: Uint8Array, next: () => number): Uint8Array {
  const at = Math.floor(next() * bytes.length);
  const length = Math.floor(next() ** 3 * 60);
  const before = bytes.subarray(0, at);
  const behind = bytes.subarray(Math.min(bytes.length, at + length));
  const join = (...parts: Uint8Array[]) => Uint8Array.from(parts.flatMap((part) => [...part]));
  switch (Math.floor(next() * 6)) {
    case 0:
      return join(before, behind);
    case 1:
      return join(
        before,
        encodeUtf8(inserts[Math.floor(next() * inserts.length)]!),
        bytes.subarray(at),
      );
    case 2:
      return join(before, Uint8Array.of(Math.floor(next() * 256)), bytes.subarray(at + 1));
    case 3:
      return join(before, bytes.subarray(at, at + length), bytes.subarray(at));
    case 4:
      return join(before);
    default: {
      const from = Math.floor(next() * bytes.length);
      return join(before, bytes.subarray(from, from + length), behind);
    }
  }
}

/** The same rows read the slow and obvious way, by the separator and mark the reader reports. */
function readPlainly(text: string, csv: WaveformCsv): number[][] {
  const lines = text
    .replace(/^\ufeff/u, '')
    .split(/\r\r\n|\r\n|\n|\r/u)
    .slice(csv.firstDataLine - 1);
  while (lines.length > 0 && lines.at(-1)!.trim() === '') lines.pop();
  const columns: number[][] = csv.channels.map(() => []);
  for (const quotedLine of lines) {
    const line = quotedLine.replace(/"[^"]*"/gu, (cell) =>
      cell.replace(/[;,\t]/gu, (mark) => (mark === csv.separator ? ' ' : mark)),
    );
    const blank = line.trim() === '';
    // With a time or a running number before the samples nothing is missing at a blank line.
    if (blank && csv.columnCount > csv.channels.length) continue;
    const cells = blank
      ? []
      : csv.separator === null
        ? [line]
        : csv.separator === ' '
          ? line.trim().split(/[ \t]+/u)
          : line.split(csv.separator);
    csv.channels.forEach((channel, i) => {
      const cell = (cells[channel.columnIndex] ?? '')
        .trim()
        .replace(/^"(.*)"$/u, '$1')
        .trim();
      const number = csv.decimalMark === ',' ? cell.replace(',', '.') : cell;
      columns[i]!.push(/^[+-]?[\d.]/u.test(number) ? Number(number) : NaN);
    });
  }
  return columns;
}

function checkSound(csv: WaveformCsv, bytes: Uint8Array): void {
  for (const channel of csv.channels) {
    expect(channel.samples.length).toBe(csv.rowCount);
    expect(channel.samples.every((value) => !(Math.abs(value) > maxSampleMagnitude))).toBe(true);
    expect(channel.gapCount).toBe(channel.samples.filter(Number.isNaN).length);
  }
  if (csv.sampleRateHz !== null) expect(csv.sampleRateHz).toBeGreaterThan(0);
  expect(csv.channels.map((channel) => [...channel.samples])).toEqual(
    readPlainly(decodeUtf8(bytes, 0, bytes.length)!, csv),
  );
}

/** What becomes of the bytes: the waveform or the fault, and nothing else. */
function outcome(read: () => WaveformCsv): WaveformCsv | CsvError {
  try {
    return read();
  } catch (error) {
    if (error instanceof CsvError) return error;
    throw error;
  }
}

describe('readWaveformCsv under mutation', () => {
  it.each(startFiles.map((text, i) => [i, text] as const))(
    'reads every change of start file %i as it stands or refuses it',
    (index, text) => {
      const next = random(4100 + index);
      let readCount = 0;
      let refusedCount = 0;
      for (let round = 0; round < 600; round += 1) {
        let bytes = encodeUtf8(text);
        const times = 1 + Math.floor(next() * 4);
        for (let i = 0; i < times; i += 1) bytes = mutate(bytes, next);
        const whole = outcome(() => readWaveformCsv(bytes));
        const inPieces = outcome(() => {
          const parser = new WaveformCsvParser();
          const length = 1 + Math.floor(next() * 200);
          for (let at = 0; at < bytes.length; at += length)
            parser.push(bytes.subarray(at, at + length));
          return parser.finish();
        });
        expect(inPieces).toEqual(whole);
        if (whole instanceof CsvError) {
          refusedCount += 1;
          expect(whole.message.length).toBeGreaterThan(20);
        } else {
          readCount += 1;
          checkSound(whole, bytes);
        }
      }
      // The mutations must reach both outcomes, or the test tests nothing.
      expect(readCount).toBeGreaterThan(20);
      expect(refusedCount).toBeGreaterThan(20);
    },
  );
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CsvError } from '#shared/signal/csv/csv-error.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { encodeUtf8 } from '#shared/signal/csv/utf8.ts';
import { WaveformCsvParser } from '#shared/signal/csv/waveform-csv-parser.ts';
import { rowsOf } from './csv-texts.ts';

/** Pushes a file in pieces of the given lengths, over and over, out of one buffer that is reused. */
function readInPieces(bytes: Uint8Array, lengths: readonly number[]) {
  const parser = new WaveformCsvParser();
  const buffer = new Uint8Array(Math.max(...lengths));
  for (let at = 0, i = 0; at < bytes.length; i += 1) {
    const length = Math.min(lengths[i % lengths.length]!, bytes.length - at);
    buffer.set(bytes.subarray(at, at + length));
    parser.push(buffer.subarray(0, length));
    at += length;
  }
  return parser.finish();
}

/** 12,000 rows and 240 kB, so that the head and several chunks behind it are needed. */
function longFile(lineEnd: string): Uint8Array {
  const row = (i: number) =>
    `${(i / 25600).toFixed(9)};${i % 701 === 0 ? 'NaN' : Math.sin(i).toFixed(5)};${i % 13}`;
  return encodeUtf8(
    `# asset: P-1${lineEnd}time [s];a [g];b [µm]${lineEnd}${rowsOf(12_000, row, lineEnd)}`,
  );
}

describe('WaveformCsvParser', () => {
  it.each([
    ['line feeds', '\n'],
    ['CRLF', '\r\n'],
    ['carriage returns', '\r'],
    ['CRCRLF', '\r\r\n'],
  ])('reads the same from pieces of any length as from the whole, with %s', (_, lineEnd) => {
    const bytes = longFile(lineEnd);
    const whole = readWaveformCsv(bytes);
    expect(whole.rowCount).toBe(12_000);
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 90_000 }), { minLength: 1, maxLength: 5 }),
        (lengths) => {
          expect(
            readInPieces(
              bytes,
              lengths.map((length) => Math.max(length, 500)),
            ),
          ).toEqual(whole);
        },
      ),
      { numRuns: 12, seed: 21 },
    );
  });

  it('reads from single bytes', () => {
    const bytes = encodeUtf8(
      `\ufefftime [s],a [g]\r\n${rowsOf(30, (i) => `0.0${10 + i},${i}.5`, '\r\n')}`,
    );
    expect(readInPieces(bytes, [1])).toEqual(readWaveformCsv(bytes));
  });

  it('names the same line for a fault far behind the head as the whole file does', () => {
    const text = rowsOf(30_000, (i) => (i === 28_765 ? 'oops' : '0.125'));
    expect(() => readInPieces(encodeUtf8(text), [1000, 37])).toThrow(
      expect.objectContaining({ code: 'not-a-number', line: 28_766 }),
    );
  });

  it('refuses an endless line as soon as it is too long, without keeping it', () => {
    const parser = new WaveformCsvParser();
    parser.push(encodeUtf8(rowsOf(20_000, () => '1.25')));
    const chunk = encodeUtf8('7'.repeat(10_000));
    expect(() => {
      for (let i = 0; i < 3; i += 1) parser.push(chunk);
    }).toThrow(CsvError);
  });

  it('takes no more once it has finished', () => {
    const parser = new WaveformCsvParser();
    parser.push(encodeUtf8(rowsOf(20, () => '1.25')));
    expect(parser.finish().rowCount).toBe(20);
    expect(() => parser.push(new Uint8Array(1))).toThrow(TypeError);
    expect(() => parser.finish()).toThrow(TypeError);
  });
});

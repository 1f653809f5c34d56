import { describe, expect, it } from 'vitest';
import { previewWaveformCsv } from '#shared/signal/csv/preview-waveform-csv.ts';
import { encodeUtf8 } from '#shared/signal/csv/utf8.ts';
import type { ReadWaveformCsvOptions } from '#shared/signal/csv/waveform-csv.ts';
import { rowsOf } from './csv-texts.ts';

const preview = (text: string, totalBytes?: number, options?: ReadWaveformCsvOptions) => {
  const bytes = encodeUtf8(text);
  return previewWaveformCsv(bytes, totalBytes ?? bytes.length, options);
};
const timedRows = rowsOf(2000, (i) => `${(i / 5120).toFixed(8)};${Math.sin(i).toFixed(4)}`);

describe('previewWaveformCsv', () => {
  it('shows quantity, unit, rate, speed and the first rows of a file that can be read', () => {
    const shown = preview(`# speed_rpm: 1480\n\ntime [s];acceleration [g]\n${timedRows}`);
    expect(shown.fault).toBeNull();
    expect(shown.csv).toMatchObject({ sampleRateHz: 5120, speedRpm: 1480, separator: ';' });
    expect(shown.csv?.columns[1]).toMatchObject({ role: 'samples', unit: 'g' });
    expect(shown.csv).not.toHaveProperty('channels');
    expect(shown.rows[0]).toEqual({ line: 3, cells: ['time [s]', 'acceleration [g]'] });
    expect(shown.rows[1]).toEqual({ line: 4, cells: ['0.00000000', '0.0000'] });
    expect(shown.rows).toHaveLength(25);
    expect(shown.estimatedRowCount).toBe(2000);
  });

  it('leaves out the half row at the end of a head and estimates the rows of the whole file', () => {
    const half = preview(`${timedRows}0.39062500;-0.9`.slice(0, -4), timedRows.length * 10);
    expect(half.fault).toBeNull();
    expect(half.csv?.rowCount).toBe(2000);
    expect(half.estimatedRowCount).toBeGreaterThan(19_900);
    expect(half.estimatedRowCount).toBeLessThan(20_100);
  });

  it('leaves open what only the whole file can show', () => {
    const settling = `# sample_rate_hz: 5120\n${rowsOf(30, () => 'NaN')}`;
    expect(preview(settling, 100_000).fault).toBeNull();
    expect(preview(settling).fault).toMatchObject({ code: 'only-gaps' });
    expect(preview('1.5\n2.5\n', 100_000).fault).toBeNull();
    expect(preview('1.5\n2.5\n').fault).toMatchObject({ code: 'too-few-samples' });
    expect(preview('0.1;2\n', 100_000).csv).toMatchObject({ rowCount: 1, sampleRateHz: null });
  });

  it('shows why a file can’t be read and still its cells, for the mapping', () => {
    const text = `Recorder;17\nSerial;A-9\nclock;1H\n${rowsOf(30, (i) => `10:00:${10 + i};${i}.5`)}`;
    const shown = preview(text);
    expect(shown.csv).toBeNull();
    expect(shown.fault).toMatchObject({ code: 'not-a-number', line: 1 });
    expect(shown.separator).toBe(';');
    expect(shown.rows[3]).toEqual({ line: 4, cells: ['10:00:10', '0.5'] });
  });

  it('reads the same file once a person has said what its columns are', () => {
    const text = `Recorder;17\nSerial;A-9\nclock;1H\n${rowsOf(30, (i) => `10:00:${10 + i};${i}.5`)}`;
    const shown = preview(text, undefined, {
      skipLines: 2,
      columns: [{ columnIndex: 0, role: 'ignore' }],
    });
    expect(shown.fault).toBeNull();
    expect(shown.rows[0]).toEqual({ line: 3, cells: ['clock', '1H'] });
  });

  it('gives files of one shape one key, whatever their numbers, and other files another', () => {
    const head = 'time [s];acceleration [g]\n';
    const one = preview(head + timedRows).shape;
    const two = preview(
      `# asset: other\n${head.toUpperCase()}${timedRows.replaceAll('0.', '1.')}`,
    ).shape;
    expect(two).toBe(one);
    expect(preview(timedRows).shape).not.toBe(one);
    expect(preview(head.replace(']', '] H') + timedRows).shape).not.toBe(one);
    expect(preview(rowsOf(20, () => '1.5')).shape).not.toBe(preview(timedRows).shape);
  });

  it('takes what is not text for a fault, not for a table of signs', () => {
    const shown = previewWaveformCsv(Uint8Array.of(0x50, 0x4b, 3, 4, 0, 1, 2), 7);
    expect(shown.fault).toMatchObject({ code: 'binary', line: 1 });
  });
});

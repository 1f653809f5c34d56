import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CsvError } from '#shared/signal/csv/csv-error.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { rowsOf } from './csv-texts.ts';

const sample = fc.oneof(
  fc.double({ min: -1e3, max: 1e3, noNaN: true }),
  fc.integer({ min: -32_768, max: 32_767 }),
  fc.integer({ min: -5000, max: 5000 }).map((value) => value / 1000),
  fc.constant(NaN),
);
const printers = {
  shortest: String,
  fixed: (value: number) => value.toFixed(6),
  exponential: (value: number) => value.toExponential(9),
  full: (value: number) => value.toExponential(18),
};

const dialect = fc.record({
  separator: fc.constantFrom(',', ';', '\t', ' ', ', ', ' ; ', '   '),
  decimalMark: fc.constantFrom('.', ','),
  lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
  bom: fc.boolean(),
  header: fc.boolean(),
  comment: fc.boolean(),
  quoted: fc.boolean(),
  printer: fc.constantFrom(...(Object.keys(printers) as (keyof typeof printers)[])),
  lastLineEnd: fc.boolean(),
});

type Dialect = typeof dialect extends fc.Arbitrary<infer T> ? T : never;

function write(style: Dialect, columns: readonly (readonly number[])[], withTime: boolean): string {
  const print = printers[style.printer];
  const cell = (value: number) => {
    const text = (Number.isNaN(value) ? 'NaN' : print(value)).replace('.', style.decimalMark);
    return style.quoted ? `"${text}"` : text;
  };
  const names = columns.map((_, i) => (withTime && i === 0 ? 'time [s]' : `ch${i} [mm/s]`));
  const rows = rowsOf(
    columns[0]!.length,
    (i) => columns.map((column) => cell(column[i]!)).join(style.separator),
    style.lineEnd,
  );
  const text =
    (style.bom ? '\ufeff' : '') +
    (style.comment ? `# sample_rate_hz: 2000${style.lineEnd}` : '') +
    (style.header
      ? names.join(style.separator.includes(' ') ? style.separator : style.separator) +
        style.lineEnd
      : '') +
    rows;
  return style.lastLineEnd ? text : text.slice(0, -style.lineEnd.length);
}

const asPrinted = (style: Dialect, values: readonly number[]) =>
  values.map((value) => Number(Number.isNaN(value) ? 'NaN' : printers[style.printer](value)));

describe('readWaveformCsv gives back what was written', () => {
  it('in time and one to three columns, in every dialect of the convention', () => {
    fc.assert(
      fc.property(
        dialect.filter((style) => style.decimalMark === '.' || !style.separator.includes(',')),
        fc.integer({ min: 1, max: 3 }).chain((count) =>
          fc.array(fc.array(sample, { minLength: count, maxLength: count }), {
            minLength: 8,
            maxLength: 60,
          }),
        ),
        (style, rows) => {
          fc.pre(rows[0]!.some((_, c) => rows.some((row) => Number.isFinite(row[c]!))));
          const time = rows.map((_, i) => i / 2000);
          const columns = rows[0]!.map((_, c) => rows.map((row) => row[c]!));
          const csv = readWaveformCsv(write(style, [time, ...columns], true));
          expect(csv.sampleRateHz).toBe(2000);
          expect(csv.channels.map((channel) => [...channel.samples])).toEqual(
            columns.map((column) => asPrinted(style, column)),
          );
        },
      ),
      { numRuns: 600, seed: 31 },
    );
  });

  it('in one column, or refuses a comma it cannot tell', () => {
    fc.assert(
      fc.property(dialect, fc.array(sample, { minLength: 8, maxLength: 200 }), (style, values) => {
        fc.pre(values.some(Number.isFinite));
        const text = write(style, [values], false);
        try {
          const { channels } = readWaveformCsv(text);
          expect(channels).toHaveLength(1);
          expect([...channels[0]!.samples]).toEqual(asPrinted(style, values));
        } catch (error) {
          if (!(error instanceof CsvError) || style.decimalMark === '.') throw error;
          expect([
            'ambiguous-comma',
            'mixed-columns',
            'time-not-uniform',
            'time-not-rising',
          ]).toContain(error.code);
        }
      }),
      { numRuns: 1500, seed: 32 },
    );
  });

  it('in one column of decimal commas that looks like a vibration, without fail', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -4000, max: 4000 }), { minLength: 64, maxLength: 300 }),
        fc.integer({ min: 1, max: 4 }),
        (values, decimals) => {
          const texts = values.map((value) => (value / 1000).toFixed(decimals).replace('.', ','));
          const { channels } = readWaveformCsv(rowsOf(texts.length, (i) => texts[i]!));
          expect([...channels[0]!.samples]).toEqual(
            texts.map((text) => Number(text.replace(',', '.'))),
          );
        },
      ),
      { numRuns: 300, seed: 33 },
    );
  });
});

/**
 * Time of reading waveforms of 16,384 samples with our reader, with uDSV and with PapaParse, in
 * turn in one process.
 *
 *   npx tsx tests/bench/csv-readers.ts
 */
import papa from 'papaparse';
import { inferSchema, initParser } from 'udsv';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';

const sampleCount = 16_384;
const rounds = 60;

/** A repeatable signal; what the numbers are matters less than how many digits they are printed with. */
const wave = (i: number) => 2 * Math.sin(i * 0.7) + Math.sin(i * 0.013) + ((i * 7919) % 1000) / 997;
const rowsOf = (row: (i: number) => string) =>
  Array.from({ length: sampleCount }, (_, i) => `${row(i)}\n`).join('');

const files: Record<string, string> = {
  'one column, 6 digits': `acceleration [g]\n${rowsOf((i) => wave(i).toPrecision(6))}`,
  'one column, 17 digits': `acceleration [g]\n${rowsOf((i) => String(wave(i)))}`,
  'one column, 18 decimals, exponent': `acceleration [g]\n${rowsOf((i) => wave(i).toExponential(18))}`,
  'time and one column': `time [s],acceleration [g]\n${rowsOf((i) => `${(i / 25600).toFixed(8)},${wave(i).toFixed(5)}`)}`,
};

const decoder = new TextDecoder();
const readers: Record<string, (bytes: Uint8Array) => number> = {
  ours: (bytes) => readWaveformCsv(bytes, { sampleRateHz: 25_600 }).channels[0]!.samples.length,
  uDSV: (bytes) => {
    const text = decoder.decode(bytes);
    const columns = initParser(inferSchema(text)).typedCols(text);
    return Float64Array.from(columns.at(-1) as number[]).length;
  },
  PapaParse: (bytes) => {
    const { data } = papa.parse<string[]>(decoder.decode(bytes), { skipEmptyLines: true });
    return Float64Array.from(data.slice(1), (row) => Number(row.at(-1))).length;
  },
};

const median = (values: number[]) => values.sort((a, b) => a - b)[values.length >> 1]!;

for (const [name, text] of Object.entries(files)) {
  const bytes = new TextEncoder().encode(text);
  const times: Record<string, number[]> = {};
  for (let round = 0; round < rounds; round += 1) {
    for (const [reader, read] of Object.entries(readers)) {
      const start = performance.now();
      const count = read(bytes);
      const time = performance.now() - start;
      if (count !== sampleCount) throw new Error(`${reader} read ${count} samples`);
      // The first rounds run before the code is compiled.
      if (round >= 10) (times[reader] ??= []).push(time);
    }
  }
  const shown = Object.entries(times).map(
    ([reader, list]) => `${reader} ${median(list).toFixed(2)} ms`,
  );
  process.stdout.write(`${name}: ${shown.join(', ')}\n`);
}

/**
 * Peak memory of reading a file of ten million rows in chunks, as the command line does.
 *
 *   npx tsx tests/bench/ten-million-rows.ts
 *
 * The file is written by one process and read by another, so that the figure is the reader's alone.
 * Aim: below 400 MB. Prints one line for a file of samples and one for a file of time and samples.
 */
import { spawnSync } from 'node:child_process';
import { closeSync, mkdtempSync, openSync, rmSync, statSync, writeSync } from 'node:fs';
import { createReadStream } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { WaveformCsvParser } from '#shared/signal/csv/waveform-csv-parser.ts';

const rowCount = 10_000_000;
const aimMb = 400;

function write(path: string, withTime: boolean): void {
  const file = openSync(path, 'w');
  writeSync(file, withTime ? 'time [s],acceleration [g]\n' : 'acceleration [g]\n');
  for (let from = 0; from < rowCount; from += 10_000) {
    let text = '';
    for (let i = from; i < from + 10_000; i += 1) {
      const sample = (2 * Math.sin(i * 0.07) + Math.sin(i * 1.3)).toFixed(5);
      text += withTime ? `${(i / 25600).toFixed(7)},${sample}\n` : `${sample}\n`;
    }
    writeSync(file, text);
  }
  closeSync(file);
}

async function read(path: string): Promise<void> {
  const start = performance.now();
  const parser = new WaveformCsvParser();
  for await (const chunk of createReadStream(path, { highWaterMark: 1024 * 1024 })) {
    parser.push(chunk as Uint8Array);
  }
  const csv = parser.finish();
  const seconds = (performance.now() - start) / 1000;
  const peakMb = process.resourceUsage().maxRSS / 1024;
  const fileMb = statSync(path).size / 1024 ** 2;
  process.stdout.write(
    `${csv.columnCount} column(s), ${csv.rowCount} rows, ${fileMb.toFixed(0)} MB: peak memory ` +
      `${peakMb.toFixed(0)} MB (aim ${aimMb}), ${seconds.toFixed(1)} s, rate ${csv.sampleRateHz} Hz\n`,
  );
}

const [mode, path] = process.argv.slice(2);
if (mode === 'read' && path !== undefined) {
  await read(path);
} else {
  const folder = mkdtempSync(join(tmpdir(), 'fretline-bench-'));
  try {
    for (const withTime of [false, true]) {
      const file = join(folder, 'long.csv');
      write(file, withTime);
      const own = fileURLToPath(import.meta.url);
      spawnSync(process.execPath, ['--import', 'tsx', own, 'read', file], { stdio: 'inherit' });
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
}

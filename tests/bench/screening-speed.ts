/**
 * CSV text to verdict on one core, beside the script an engineer would otherwise write
 * (usual_script.py), run in turn with it on the same files.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { drawLookAlike, drawLooseCondition } from '#fixtures/signals/draw-condition.ts';
import { drawMachine } from '#fixtures/signals/draw-machine.ts';
import { drawRecording } from '#fixtures/signals/draw-recording.ts';
import { RandomStream } from '#fixtures/signals/random-stream.ts';
import { lookAlikeNames, simulatedLoosenessKinds } from '#fixtures/signals/signal-types.ts';
import { simulateWaveform } from '#fixtures/signals/simulate-waveform.ts';
import { writeWaveformCsv } from '#fixtures/signals/write-waveform-csv.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import { profileByFile, type FileShare } from './profile-by-file.ts';

const fileCount = 200;
const sampleCount = 16_384;
const rounds = 5;
export const screeningAims = { ratio: 1, aimedRatio: 0.6 } as const;

interface BenchFile {
  file: string;
  sampleRateHz: number;
  speedRpm: number;
}

export interface ScreeningSpeedResult {
  files: number;
  /** Median over the rounds of the mean time of a file, ms. */
  oursMs: number;
  /** Null where Python or its packages are missing. */
  usualMs: number | null;
  ratio: number | null;
  profile: FileShare[];
}

/** Writes simulated machines of every look-alike and kind of looseness, half of them loose. */
function writeFiles(folder: string): BenchFile[] {
  const files = Array.from({ length: fileCount }, (_, index): BenchFile => {
    const random = new RandomStream(['bench', index]);
    const machine = drawMachine(random.bits() >>> 0, {
      background: random.pick(['quiet', 'ordinary', 'noise-dominated']),
      id: `bench-${index}`,
    });
    const condition =
      index % 2 === 0
        ? drawLooseCondition(
            machine,
            simulatedLoosenessKinds[(index / 2) % simulatedLoosenessKinds.length]!,
            'moderate',
            random.fork('loose'),
          )
        : drawLookAlike(
            machine,
            lookAlikeNames[index % lookAlikeNames.length]!,
            random.fork('like'),
          );
    const recording = drawRecording(machine, random.fork('recording'), {
      sampleCount,
      unit: 'g',
      toldSpeedError: 0.002,
    });
    const waveform = simulateWaveform(machine, condition, recording, index);
    const file = `waveform-${String(index).padStart(3, '0')}.csv`;
    writeFileSync(join(folder, file), writeWaveformCsv(waveform));
    return { file, sampleRateHz: waveform.sampleRateHz, speedRpm: waveform.toldSpeedRpm ?? 1500 };
  });
  writeFileSync(join(folder, 'index.json'), JSON.stringify(files));
  return files;
}

const meanOf = (values: readonly number[]) =>
  values.reduce((sum, value) => sum + value, 0) / values.length;
const medianOf = (values: readonly number[]) =>
  [...values].sort((a, b) => a - b)[values.length >> 1]!;

/** Screens every file once. @returns the mean time of one, ms */
function ours(folder: string, files: readonly BenchFile[]): number {
  return meanOf(
    files.map(({ file, sampleRateHz, speedRpm }) => {
      const started = performance.now();
      const csv = readWaveformCsv(readFileSync(join(folder, file)), { sampleRateHz });
      const { samples, unit } = csv.channels[0]!;
      screenWaveform({ samples, sampleRateHz, unit: unit ?? 'g', toldSpeedRpm: speedRpm });
      return performance.now() - started;
    }),
  );
}

/** The same by the usual script; null where it can't run. */
function usual(folder: string): number | null {
  const script = fileURLToPath(new URL('./usual_script.py', import.meta.url));
  // Debian's own interpreter: its packages belong to it.
  for (const python of ['/usr/bin/python3', 'python3']) {
    const run = spawnSync(python, [script, folder], { encoding: 'utf8' });
    if (run.status === 0) return 1000 * meanOf(JSON.parse(run.stdout) as number[]);
  }
  return null;
}

/** Measures both in turn, and where our time goes. */
export async function benchScreeningSpeed(): Promise<ScreeningSpeedResult> {
  const folder = mkdtempSync(join(tmpdir(), 'fretline-bench-'));
  try {
    const files = writeFiles(folder);
    // Once before the clock: neither side is measured with cold code or a cold disk.
    ours(folder, files);
    const [oursMs, usualMs, ratios]: [number[], number[], number[]] = [[], [], []];
    for (let round = 0; round < rounds; round += 1) {
      const mine = ours(folder, files);
      const theirs = usual(folder);
      oursMs.push(mine);
      if (theirs === null) continue;
      usualMs.push(theirs);
      ratios.push(mine / theirs);
    }
    const profile = await profileByFile(() => void ours(folder, files));
    return {
      files: files.length,
      oursMs: medianOf(oursMs),
      usualMs: usualMs.length === 0 ? null : medianOf(usualMs),
      ratio: ratios.length === 0 ? null : medianOf(ratios),
      profile,
    };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

export function describeScreeningSpeed(result: ScreeningSpeedResult): string[] {
  const { oursMs, usualMs, ratio, profile } = result;
  return [
    `CSV text of ${sampleCount} samples to verdict, mean of ${result.files} files, one core: ${oursMs.toFixed(2)} ms`,
    usualMs === null || ratio === null
      ? 'The usual script did not run: install python3-pandas and python3-scipy from Debian to compare.'
      : `the usual script beside it: ${usualMs.toFixed(2)} ms; ratio ${ratio.toFixed(2)} (at most ${screeningAims.ratio}, aim ${screeningAims.aimedRatio}; ${ratio <= screeningAims.ratio ? 'met' : 'falls short'})`,
    'where our time goes, by file (own time):',
    ...profile
      .slice(0, 16)
      .map(({ file, share }) => `  ${(100 * share).toFixed(1).padStart(5)} %  ${file}`),
  ];
}

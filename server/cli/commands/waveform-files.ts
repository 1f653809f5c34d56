import { createReadStream } from 'node:fs';
import { readdir, readFile, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { CsvError } from '#shared/signal/csv/csv-error.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { WaveformCsvParser } from '#shared/signal/csv/waveform-csv-parser.ts';
import type { ReadWaveformCsvOptions, WaveformCsv } from '#shared/signal/csv/waveform-csv.ts';

/** Why a file could not be used; printed on its line of the output. */
export interface FileFault {
  code: string;
  /** Physical line, counted from 1; null where the fault is not on one line. */
  line: number | null;
  message: string;
}

export type FoundFile = { file: string } | { file: string; fault: FileFault };

/** Larger files are read in chunks, so that their text never stands in memory as a whole. */
const wholeFileMaxBytes = 32 * 1024 * 1024;

/**
 * Names the files meant by the arguments, in their order; a folder stands for the `.csv` files in it
 * and below, sorted by path (by code unit, the same on every machine).
 */
export async function findWaveformFiles(paths: readonly string[]): Promise<FoundFile[]> {
  const found: FoundFile[] = [];
  for (const path of paths) {
    try {
      if ((await stat(path)).isDirectory()) {
        const files = await listFolder(path);
        if (files.length === 0) {
          const message = 'The folder holds no .csv file; expected waveforms. Name another folder.';
          found.push({ file: path, fault: { code: 'no-files', line: null, message } });
        }
        for (const file of files) found.push({ file });
      } else {
        found.push({ file: path });
      }
    } catch (error) {
      found.push({ file: path, fault: systemFault(error) });
    }
  }
  return found;
}

async function listFolder(folder: string): Promise<string[]> {
  const names = await readdir(folder, { recursive: true });
  return (
    names
      // Names with a leading dot are the system's leavings, such as `._survey.csv`.
      .filter((name) => /^[^.].*\.csv$/iu.test(basename(name)))
      .map((name) => join(folder, name))
      .sort((a, b) => (a < b ? -1 : a > b ? 1 : 0))
  );
}

/** Reads one file. @returns the waveform, or why it can't be read */
export async function readWaveformFile(
  file: string,
  options: ReadWaveformCsvOptions,
): Promise<WaveformCsv | { fault: FileFault }> {
  try {
    if ((await stat(file)).size <= wholeFileMaxBytes) {
      return readWaveformCsv(await readFile(file), options);
    }
    const parser = new WaveformCsvParser(options);
    for await (const chunk of createReadStream(file, { highWaterMark: 1024 * 1024 })) {
      parser.push(chunk as Uint8Array);
    }
    return parser.finish();
  } catch (error) {
    if (error instanceof CsvError) {
      const { code, line, message } = error;
      return { fault: { code, line, message } };
    }
    return { fault: systemFault(error) };
  }
}

/** A refusal of the file system, in its own words. @throws whatever else it was */
function systemFault(error: unknown): FileFault {
  const { code, message } = error as NodeJS.ErrnoException;
  if (!(error instanceof Error) || code === undefined) throw error;
  const known: Record<string, string> = { ENOENT: 'not-found', EACCES: 'not-allowed' };
  return { code: known[code] ?? 'unreadable', line: null, message };
}

/** For files that tell no sampling rate, where nobody else does. */
export const missingRate: FileFault = {
  code: 'sample-rate-missing',
  line: null,
  message:
    'Neither a time column nor a comment line tells the sampling rate; expected one of them. Add ' +
    'a line "# sample_rate_hz: N" to the file, or tell it with --sample-rate-hz.',
};

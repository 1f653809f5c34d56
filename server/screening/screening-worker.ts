import { open } from 'node:fs/promises';
import { move, transferableSymbol, valueSymbol } from 'piscina';
import { CsvError } from '#shared/signal/csv/csv-error.ts';
import { WaveformCsvParser } from '#shared/signal/csv/waveform-csv-parser.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import type { ReadAnswer, ReadTask, ScreenAnswer, ScreenTask, WorkerTask } from './worker-tasks.ts';

const chunkBytes = 1024 * 1024;

/** What the worker threads run: pure work on files and samples, never the database. */
export async function runTask(task: WorkerTask): Promise<unknown> {
  return task.task === 'read' ? transferring(await read(task)) : screen(task);
}

/** Reads in pieces, so that a long file never lies in memory as text. */
async function read({ path, options }: ReadTask): Promise<ReadAnswer> {
  const file = await open(path, 'r');
  try {
    const parser = new WaveformCsvParser(options);
    for await (const chunk of file.createReadStream({ highWaterMark: chunkBytes })) {
      parser.push(chunk as Buffer);
    }
    const { channels, ...rest } = parser.finish();
    return {
      read: {
        ...rest,
        channels: channels.map(({ samples, ...channel }) => ({
          ...channel,
          samples:
            samples.buffer instanceof ArrayBuffer
              ? (samples as Float64Array<ArrayBuffer>)
              : new Float64Array(samples),
        })),
      },
    };
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return { error: { code: error.code, line: error.line, message: error.message } };
  } finally {
    await file.close();
  }
}

function screen({ input, limits }: ScreenTask): ScreenAnswer {
  const { result, plots } = screenWaveform(input, limits);
  return {
    result,
    spectrum: {
      stepHz: plots.spectrum.stepHz,
      amplitudePeak: new Float32Array(plots.spectrum.amplitudePeak),
    },
    averagedRevolution:
      plots.averagedRevolution === null ? null : new Float32Array(plots.averagedRevolution),
  };
}

/** Hands long samples over to the main thread without copying them. */
function transferring(answer: ReadAnswer): ReadAnswer {
  if (!('read' in answer)) return answer;
  return move({
    get [transferableSymbol]() {
      return answer.read.channels.map((channel) => channel.samples.buffer);
    },
    get [valueSymbol]() {
      return answer;
    },
  } as never) as unknown as ReadAnswer;
}

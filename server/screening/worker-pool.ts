import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import type { ReadWaveformCsvOptions } from '#shared/signal/csv/waveform-csv.ts';
import type { ScreeningInput, ScreeningLimits } from '#shared/signal/screening-types.ts';
import type { ReadAnswer, ScreenAnswer, WorkerTask } from './worker-tasks.ts';

/** Longest time one waveform may take; a hundred times what the longest admitted record needs. */
const taskLimitMs = 5 * 60_000;

/** Starts a worker thread that runs the `runTask` of a TypeScript module (workerData.module). */
export const typescriptWorkerPath = fileURLToPath(
  new URL('./typescript-worker.mjs', import.meta.url),
);

/** A task took longer than it may; its worker was ended. */
export class TaskTimeout extends Error {}

/** The threads that read and screen; the event loop stays free for people. */
export class WorkerPool {
  private readonly pool: Piscina;

  constructor(threads: number) {
    this.pool = new Piscina({
      filename: typescriptWorkerPath,
      workerData: { module: new URL('./screening-worker.ts', import.meta.url).href },
      name: 'runTask',
      // Threads come with the first task; a server that only answers pages needs none.
      minThreads: 0,
      maxThreads: threads,
      idleTimeout: 30_000,
      execArgv: [],
    });
    // The task that a dying worker held is rejected by itself; without a listener the event would
    // end the whole server.
    this.pool.on('error', () => undefined);
  }

  get threads(): number {
    return this.pool.options.maxThreads;
  }

  /** Reads a CSV; a file that isn't one comes back as an error with its line. */
  read(path: string, options: ReadWaveformCsvOptions): Promise<ReadAnswer> {
    return this.run<ReadAnswer>({ task: 'read', path, options }, []);
  }

  /** Screens a waveform. Its samples are handed over and empty here afterwards. */
  screen(
    input: ScreeningInput & { samples: Float64Array<ArrayBuffer> },
    limits: Partial<ScreeningLimits> = {},
  ): Promise<ScreenAnswer> {
    return this.run<ScreenAnswer>({ task: 'screen', input, limits }, [input.samples.buffer]);
  }

  private async run<Answer>(task: WorkerTask, transferList: ArrayBuffer[]): Promise<Answer> {
    const limit = AbortSignal.timeout(taskLimitMs);
    try {
      return (await this.pool.run(task, { transferList, signal: limit })) as Answer;
    } catch (error) {
      if (limit.aborted) {
        throw new TaskTimeout(`It took longer than ${taskLimitMs / 60_000} minutes.`, {
          cause: error,
        });
      }
      throw error;
    }
  }

  /** Ends the threads; what runs is broken off. */
  async close(): Promise<void> {
    await this.pool.destroy();
  }
}

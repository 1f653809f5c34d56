import { setTimeout as sleep } from 'node:timers/promises';
import type { Logger } from 'pino';
import type { Database } from '#server/db/database.ts';
import type { FileStore } from '#server/storage/file-store.ts';
import { machineFactsOf } from './machine-facts.ts';
import { ScreeningJobRepository, type WaveformJob } from './screening-job.repository.ts';
import type { WorkerPool } from './worker-pool.ts';
import type { ScreenAnswer } from './worker-tasks.ts';

/** What may be waited for: ids of waveforms that want screening. */
export interface ScreeningQueue {
  /** Says that there are waveforms to screen; what they are stands in the database. */
  wake: () => void;
  start: () => Promise<void>;
  /** Takes nothing new, hands back what runs. */
  stop: () => Promise<void>;
  /** Resolves when nothing waits or runs. */
  idle: () => Promise<void>;
}

interface Dependencies {
  database: Database;
  files: FileStore;
  workers: Pick<WorkerPool, 'threads' | 'screen' | 'close'>;
  logger: Logger;
  now?: () => Date;
}

/** A worker that dies or hangs is tried again this often; a plain fault of the method is not. */
const attemptsMax = 3;
const batch = 50;
const restMs = 5_000;

/** The queue in this process: nothing to install, and nothing lost when the process dies. */
export class InProcessScreeningQueue implements ScreeningQueue {
  private readonly deps: Dependencies;
  private readonly running = new Map<number, Promise<void>>();
  private started = false;
  private stopping = false;
  private pumping: Promise<void> | null = null;
  private woken = false;
  private waiting: (() => void)[] = [];
  private tellStopped: () => void = () => undefined;
  private readonly stopped = new Promise<void>((resolve) => (this.tellStopped = resolve));

  constructor(dependencies: Dependencies) {
    this.deps = dependencies;
  }

  async start(): Promise<void> {
    await this.takeUp();
    this.started = true;
    this.wake();
  }

  private takeUp(): Promise<void> {
    const jobs = new ScreeningJobRepository(this.deps.database.db);
    return jobs.takeUpRunning(attemptsMax, [...this.running.keys()]);
  }

  wake(): void {
    this.woken = true;
    if (!this.started || this.stopping || this.pumping !== null) return;
    this.pumping = this.pump()
      .catch(async (error: unknown) => {
        this.deps.logger.error({ err: error }, 'the screening queue rests after a fault');
        await this.rest();
      })
      .finally(() => {
        this.pumping = null;
        if (this.woken && !this.stopping) this.wake();
        else this.tellIdle();
      });
  }

  async idle(): Promise<void> {
    if (this.pumping === null) return;
    await new Promise<void>((resolve) => this.waiting.push(resolve));
  }

  async stop(): Promise<void> {
    this.stopping = true;
    this.tellStopped();
    const ids = [...this.running.keys()];
    await this.deps.workers.close();
    await Promise.allSettled(this.running.values());
    await this.pumping;
    await new ScreeningJobRepository(this.deps.database.db).handBack(ids);
  }

  /** Most likely the database is away: waits, and takes up what its absence left half done. */
  private async rest(): Promise<void> {
    await Promise.race([sleep(restMs, undefined, { ref: false }), this.stopped]);
    if (this.stopping) return;
    this.woken = true;
    await this.takeUp().catch((error: unknown) =>
      this.deps.logger.error({ err: error }, 'the screening queue'),
    );
  }

  private tellIdle(): void {
    for (const resolve of this.waiting.splice(0)) resolve();
  }

  /** Keeps as many waveforms under way as there are threads, until none waits. */
  private async pump(): Promise<void> {
    const jobs = new ScreeningJobRepository(this.deps.database.db);
    while (!this.stopping) {
      this.woken = false;
      const ids = (await jobs.queuedIds(batch)).filter((id) => !this.running.has(id));
      if (ids.length === 0 && this.running.size === 0) return;
      for (const id of ids) {
        if (this.stopping) break;
        while (this.running.size >= this.deps.workers.threads) {
          await Promise.race(this.running.values());
        }
        const work = this.screenOne(id).finally(() => this.running.delete(id));
        // A fault of several at once would else be one that nobody looks at.
        work.catch(() => undefined);
        this.running.set(id, work);
      }
      if (this.running.size > 0) await Promise.race(this.running.values());
    }
  }

  private async screenOne(id: number): Promise<void> {
    const { database, logger } = this.deps;
    const jobs = new ScreeningJobRepository(database.db);
    const job = await jobs.claim(id);
    if (job === null) return;
    try {
      const answer = await this.screen(job);
      await this.keep(job, answer);
    } catch (error) {
      if (this.stopping) return;
      const reason = error instanceof Error ? error.message : String(error);
      logger.warn({ waveformId: id, err: error }, 'a screening failed');
      const again = job.waveform.screeningAttempts < attemptsMax && !isFaultOfTheMethod(error);
      await jobs.giveUp(id, reason, again);
    }
  }

  private async screen(job: WaveformJob): Promise<ScreenAnswer> {
    const { waveform, point, limits } = job;
    const samples = await this.deps.files.readSamples(waveform.contentHash, waveform.channelIndex);
    const input = {
      samples,
      sampleRateHz: waveform.sampleRateHz,
      unit: waveform.unit,
      ...(waveform.toldSpeedRpm === null ? {} : { toldSpeedRpm: waveform.toldSpeedRpm }),
      ...(waveform.fullScale === null ? {} : { fullScale: waveform.fullScale }),
      machine: machineFactsOf(point, job.otherShaftRatios, waveform.toldLineFrequencyHz),
      earlier: job.earlier,
    };
    return this.deps.workers.screen(input, limits);
  }

  /** Plots first, then the row: a row whose plots are missing would be worse than plots without a row. */
  private async keep({ waveform }: WaveformJob, answer: ScreenAnswer): Promise<void> {
    const { database, files, now = () => new Date() } = this.deps;
    const { result, spectrum, averagedRevolution } = answer;
    const run = waveform.screeningRun;
    await files.write(
      files.plotPath(waveform.id, run, 'spectrum'),
      spectrumBytes(spectrum.stepHz, spectrum.amplitudePeak),
    );
    if (averagedRevolution !== null) {
      await files.write(
        files.plotPath(waveform.id, run, 'averaged-revolution'),
        new Uint8Array(averagedRevolution.buffer),
      );
    }
    await database.transaction((db) =>
      new ScreeningJobRepository(db).finish(waveform, {
        waveformId: waveform.id,
        run,
        verdict: result.verdict,
        score: result.score,
        speedHz: result.speed.speedHz,
        overallMmPerSRms: result.overallVelocity?.mmPerSRms ?? null,
        methodVersion: result.methodVersion,
        result,
        screenedAt: now(),
        decision: null,
        decisionReason: null,
        decidedByUserId: null,
        decidedAt: null,
      }),
    );
  }
}

/** A range or type fault of the method comes again with the same samples; a dead worker may not. */
const isFaultOfTheMethod = (error: unknown) =>
  error instanceof RangeError || error instanceof TypeError || error instanceof SyntaxError;

/** A spectrum as it is kept and sent: the step in Hz as the first value, then the lines. */
export function spectrumBytes(stepHz: number, amplitudePeak: Float32Array): Uint8Array {
  const values = new Float32Array(amplitudePeak.length + 1);
  values[0] = stepHz;
  values.set(amplitudePeak, 1);
  return new Uint8Array(values.buffer);
}

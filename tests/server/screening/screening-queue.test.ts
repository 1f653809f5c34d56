import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterAll, afterEach, beforeEach, describe, expect, it } from 'vitest';
import { Database } from '#server/db/database.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { InProcessScreeningQueue } from '#server/screening/screening-queue.ts';
import type { ScreenAnswer } from '#server/screening/worker-tasks.ts';
import { FileStore } from '#server/storage/file-store.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildWaveform } from '#tests/support/screening-factories.ts';
import { aScreeningResult } from '#tests/support/screening-result.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();
const directory = mkdtempSync(join(tmpdir(), 'fretline-queue-'));
const files = new FileStore(directory);
let plant: Plant;
let started: InProcessScreeningQueue[] = [];
beforeEach(async () => {
  plant = await buildPlant(dataSource());
});
afterEach(async () => {
  await Promise.all(started.map((queue) => queue.stop()));
  started = [];
});
afterAll(() => rmSync(directory, { recursive: true, force: true }));

const anAnswer = (): ScreenAnswer => ({
  result: aScreeningResult(),
  spectrum: { stepHz: 0.5, amplitudePeak: Float32Array.from([0, 1, 0.5]) },
  averagedRevolution: null,
});

/** A queue over workers that answer as told. */
async function startQueue(screen: () => Promise<ScreenAnswer>) {
  const queue = new InProcessScreeningQueue({
    database: new Database(dataSource()),
    files,
    workers: { threads: 2, screen, close: () => Promise.resolve() },
    logger: pino({ level: 'silent' }),
  });
  started.push(queue);
  await queue.start();
  return queue;
}

async function aQueuedWaveform(overrides: Partial<Waveform> = {}): Promise<Waveform> {
  const waveform = await buildWaveform(
    dataSource(),
    {
      surveyId: plant.survey.id,
      measuringPointId: plant.points.horizontal.id,
      uploadedByUserId: plant.analyst.id,
    },
    { screeningState: 'queued', screeningAttempts: 0, sampleCount: 8, ...overrides },
  );
  await files.write(files.samplesPath(waveform.contentHash, 0), new Uint8Array(64));
  return waveform;
}
const now = (waveform: Waveform) =>
  dataSource().getRepository(Waveform).findOneByOrFail({ id: waveform.id });
const resultsOf = (waveform: Waveform) =>
  dataSource().getRepository(Screening).countBy({ waveformId: waveform.id });

describe('the screening queue', () => {
  it('screens everything that waits, each once', async () => {
    const waveforms = await Promise.all(Array.from({ length: 12 }, () => aQueuedWaveform()));
    const queue = await startQueue(() => Promise.resolve(anAnswer()));
    queue.wake();
    queue.wake();
    await queue.idle();
    for (const waveform of waveforms) {
      expect(await now(waveform)).toMatchObject({ screeningState: 'done', screeningAttempts: 1 });
      expect(await resultsOf(waveform)).toBe(1);
    }
  });

  it('takes up at the start what was running when the process died', async () => {
    const waveform = await aQueuedWaveform({ screeningState: 'running', screeningAttempts: 1 });
    await (await startQueue(() => Promise.resolve(anAnswer()))).idle();
    expect(await now(waveform)).toMatchObject({ screeningState: 'done', screeningAttempts: 2 });
  });

  it('ends a waveform as failed that was running each of three times the process died', async () => {
    const waveform = await aQueuedWaveform({ screeningState: 'running', screeningAttempts: 3 });
    await (await startQueue(() => Promise.resolve(anAnswer()))).idle();
    expect(await now(waveform)).toMatchObject({
      screeningState: 'failed',
      screeningFailure: 'The server stopped 3 times while this waveform was being screened.',
    });
  });

  it('tries a waveform three times whose worker dies, then keeps the reason', async () => {
    const waveform = await aQueuedWaveform();
    let tries = 0;
    const queue = await startQueue(() => {
      tries += 1;
      return Promise.reject(new Error('The worker ended with code 134.'));
    });
    await queue.idle();
    expect(tries).toBe(3);
    expect(await now(waveform)).toMatchObject({
      screeningState: 'failed',
      screeningFailure: 'The worker ended with code 134.',
    });
  });

  it('does not repeat what the method itself refuses, and screens the others', async () => {
    const first = await aQueuedWaveform();
    const second = await aQueuedWaveform();
    let tries = 0;
    const queue = await startQueue(() => {
      tries += 1;
      return tries === 1
        ? Promise.reject(new RangeError('The sampling rate must be above 0.'))
        : Promise.resolve(anAnswer());
    });
    await queue.idle();
    expect(tries).toBe(2);
    const states = [await now(first), await now(second)].map((row) => row.screeningState).sort();
    expect(states).toEqual(['done', 'failed']);
  });

  it('keeps one result where two processes finish the same waveform', async () => {
    const waveform = await aQueuedWaveform();
    const letGo: (() => void)[] = [];
    const slowly = () =>
      new Promise<ScreenAnswer>((resolve) => letGo.push(() => resolve(anAnswer())));
    const first = await startQueue(slowly);
    while (letGo.length < 1) await new Promise((resolve) => setTimeout(resolve, 5));
    // The second takes the first for dead.
    const second = await startQueue(slowly);
    while (letGo.length < 2) await new Promise((resolve) => setTimeout(resolve, 5));
    for (const go of letGo) go();
    await Promise.all([first.idle(), second.idle()]);
    expect(await resultsOf(waveform)).toBe(1);
    expect((await now(waveform)).screeningState).toBe('done');
  });

  it('hands back what runs when it stops, and does not count it as an attempt', async () => {
    const waveform = await aQueuedWaveform();
    let end: (reason: Error) => void = () => undefined;
    const queue = new InProcessScreeningQueue({
      database: new Database(dataSource()),
      files,
      workers: {
        threads: 1,
        screen: () => new Promise((_resolve, reject) => (end = reject)),
        close: () => {
          end(new Error('Terminating worker thread'));
          return Promise.resolve();
        },
      },
      logger: pino({ level: 'silent' }),
    });
    await queue.start();
    while ((await now(waveform)).screeningState !== 'running') {
      await new Promise((resolve) => setTimeout(resolve, 5));
    }
    await new Promise((resolve) => setTimeout(resolve, 50));
    await queue.stop();
    expect(await now(waveform)).toMatchObject({ screeningState: 'queued', screeningAttempts: 0 });
  });

  it('keeps the plots of each run beside its result', async () => {
    const waveform = await aQueuedWaveform();
    await (await startQueue(() => Promise.resolve(anAnswer()))).idle();
    const bytes = await files.readBytes(files.plotPath(waveform.id, 1, 'spectrum'));
    // The step first, then the lines.
    expect([0, 1, 2, 3].map((index) => bytes?.readFloatLE(index * 4))).toEqual([0.5, 0, 1, 0.5]);
  });
});

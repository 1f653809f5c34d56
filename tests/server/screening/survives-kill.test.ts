import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeEach, describe, expect, it } from 'vitest';
import { accessCookie, signAccessToken } from '#server/auth/access-token.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { uploadResponse } from '#shared/contracts/waveform.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { startRealServer, type RealServer } from '#tests/support/real-server.ts';
import { testDatabaseEnvironment, useTestDatabase } from '#tests/support/test-database.ts';
import { aWaveformCsv } from '#tests/support/waveform-csv.ts';

const dataSource = useTestDatabase();
const dataDirectory = mkdtempSync(join(tmpdir(), 'fretline-kill-'));
const authSecret = 'a secret of the tests, long enough to sign with';
const fileCount = 24;
let plant: Plant;
let server: RealServer | null = null;

beforeEach(async () => {
  plant = await buildPlant(dataSource());
});
afterEach(async () => {
  await server?.kill('SIGKILL');
});
afterAll(() => rmSync(dataDirectory, { recursive: true, force: true }));

const start = async () => {
  server = await startRealServer({
    ...testDatabaseEnvironment(),
    DATA_DIR: dataDirectory,
    AUTH_SECRET: authSecret,
  });
  return server;
};

const files = Array.from({ length: fileCount }, (_, index) =>
  aWaveformCsv({ rows: 16_384, sampleRateHz: 5120, amplitude: 0.1 + index / 100 }),
);

/** @returns whether the server took it; false where it died meanwhile */
async function send(url: string, index: number): Promise<boolean> {
  const form = new FormData();
  const points = Object.values(plant.points);
  const measuringPointId = points[index % points.length]?.id;
  form.append('mapping', JSON.stringify({ channels: [{ channelIndex: 0, measuringPointId }] }));
  form.append('file', new Blob([files[index] ?? '']), `record-${index}.csv`);
  const cookie = `${accessCookie}=${signAccessToken(plant.analyst.id, authSecret, 600)}`;
  try {
    const answer = await fetch(`${url}${plant.path(`/surveys/${plant.survey.id}/waveforms`)}`, {
      method: 'POST',
      body: form,
      headers: { cookie },
    });
    uploadResponse.parse(await answer.json());
    return true;
  } catch {
    return false;
  }
}

const inState = (state: Waveform['screeningState']) =>
  dataSource().getRepository(Waveform).countBy({ screeningState: state });

/** Waits for a state of the database, and not for ever. */
async function until(reached: () => Promise<boolean>, pauseMs: number): Promise<void> {
  const limit = Date.now() + 30_000;
  while (!(await reached())) {
    if (Date.now() > limit || (await inState('failed')) > 0) {
      const rows = await dataSource().query(
        'SELECT screening_state, screening_failure, COUNT(*) AS n FROM waveform GROUP BY 1, 2',
      );
      throw new Error(`It is never reached: ${JSON.stringify(rows)}`);
    }
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
  }
}

/** Kills the server in the middle of a screening. */
async function killWhileScreening(running: RealServer): Promise<void> {
  await until(async () => (await inState('running')) > 0, 1);
  await running.kill('SIGKILL');
}

describe('a server that is killed while it screens a survey', () => {
  it('has exactly one waveform of each file and one result of each waveform after the next starts', async () => {
    // Killed while files still arrive …
    const first = await start();
    const sending = files.map((_, index) => send(first.url, index));
    await until(async () => (await inState('done')) >= 3, 5);
    await killWhileScreening(first);
    await Promise.all(sending);
    const left = (await inState('running')) + (await inState('queued'));
    expect(left).toBeGreaterThan(0);

    // … killed again while what was left is screened and everything is sent once more …
    const second = await start();
    const again = files.map((_, index) => send(second.url, index));
    await until(async () => (await inState('done')) >= 12, 5);
    await killWhileScreening(second);
    await Promise.all(again);

    // … and left in peace.
    const third = await start();
    const taken = await Promise.all(files.map((_, index) => send(third.url, index)));
    expect(taken.every(Boolean)).toBe(true);
    await until(async () => (await inState('queued')) + (await inState('running')) === 0, 50);
    const [waveforms] = await dataSource().query(
      `SELECT COUNT(*) AS total, COUNT(DISTINCT content_hash) AS contents,
              SUM(screening_state = 'done') AS done FROM waveform`,
    );
    expect(waveforms).toEqual({
      total: String(fileCount),
      contents: String(fileCount),
      done: String(fileCount),
    });
    const results = await dataSource().query(
      'SELECT waveform_id FROM screening GROUP BY waveform_id HAVING COUNT(*) = 1',
    );
    expect(results).toHaveLength(fileCount);
    expect(readdirSync(join(dataDirectory, 'incoming'))).toEqual([]);
    await third.kill('SIGTERM');
  });
});

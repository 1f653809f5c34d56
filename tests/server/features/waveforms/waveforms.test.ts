import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { waveformResponse } from '#shared/contracts/waveform.ts';
import { buildSurvey } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildScreening, buildWaveform } from '#tests/support/screening-factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();
const dataDirectory = mkdtempSync(join(tmpdir(), 'fretline-waveforms-'));
let plant: Plant;
beforeEach(async () => {
  plant = await buildPlant(dataSource());
});
afterAll(() => rmSync(dataDirectory, { recursive: true, force: true }));

const app = () => buildTestApp(dataSource(), dataDirectory);
const as = (user: { id: number }) => app().as(user);

describe('GET …/waveforms/:waveformId', () => {
  it('names the other directions of the position in the same survey, and those alone', async () => {
    const { waveformId } = await plant.flag('vertical');
    const axial = await plant.flag('axial');
    const earlier = await buildSurvey(dataSource(), { id: plant.survey.routeId }, plant.analyst, {
      surveyedOn: '2026-08-03',
    });
    const before = await buildWaveform(dataSource(), {
      surveyId: earlier.id,
      measuringPointId: plant.points.horizontal.id,
      uploadedByUserId: plant.analyst.id,
    });
    await buildScreening(dataSource(), before);
    const res = await as(plant.lead).get(plant.path(`/waveforms/${waveformId}`));
    const { alongside } = waveformResponse.parse(res.body);
    expect(alongside.map(({ screeningId, direction }) => [screeningId, direction])).toEqual([
      [axial.id, 'axial'],
    ]);
    expect(alongside[0]?.waveformId).toBe(axial.waveformId);
  });

  it('names the same point’s screening in the survey before', async () => {
    const earlier = await buildSurvey(dataSource(), { id: plant.survey.routeId }, plant.analyst, {
      surveyedOn: '2026-08-03',
    });
    const before = await buildWaveform(dataSource(), {
      surveyId: earlier.id,
      measuringPointId: plant.points.vertical.id,
      uploadedByUserId: plant.analyst.id,
    });
    const screening = await buildScreening(dataSource(), before);
    const { waveformId } = await plant.flag('vertical');
    const res = await as(plant.lead).get(plant.path(`/waveforms/${waveformId}`));
    expect(waveformResponse.parse(res.body).previous).toEqual({
      waveformId: before.id,
      screeningId: screening.id,
      surveyedOn: '2026-08-03',
    });
  });

  it('is shown to the owner of the machine and to no other owner', async () => {
    const { waveformId, id } = await plant.flag();
    for (const path of [`/waveforms/${waveformId}`, `/screenings/${id}`]) {
      expect((await as(plant.owner).get(plant.path(path))).status).toBe(200);
      expect((await as(plant.otherOwner).get(plant.path(path))).status).toBe(404);
    }
  });
});

describe('GET …/waveforms/:waveformId/samples', () => {
  /** Saw teeth of ten with a gap, as the reader would have kept them. */
  async function aRecord(count: number): Promise<string> {
    const samples = Float64Array.from({ length: count }, (_, i) => i % 10);
    samples[25] = Number.NaN;
    const waveform = await buildWaveform(
      dataSource(),
      {
        surveyId: plant.survey.id,
        measuringPointId: plant.points.vertical.id,
        uploadedByUserId: plant.analyst.id,
      },
      { sampleCount: count },
    );
    const { files } = app().product;
    await files.write(files.samplesPath(waveform.contentHash, 0), new Uint8Array(samples.buffer));
    return plant.path(`/waveforms/${waveform.id}/samples`);
  }
  const read = async (path: string) => {
    const res = await as(plant.analyst).get(path).responseType('arraybuffer');
    const body = Buffer.from(res.body as ArrayBuffer);
    const values = Array.from({ length: body.length / 4 }, (_, i) => body.readFloatLE(i * 4));
    return { values, perPair: res.headers['x-samples-per-pair'] as string };
  };

  it('sends every sample, a gap as NaN', async () => {
    const { values, perPair } = await read(await aRecord(300_001));
    expect(perPair).toBe('0');
    expect(values).toHaveLength(300_001);
    expect(values[25]).toBeNaN();
    expect(values.slice(299_999)).toEqual([9, 0]);
  });

  it('draws more than maxPoints together to lowest and highest', async () => {
    const { values, perPair } = await read(`${await aRecord(300_001)}?maxPoints=1000`);
    expect(perPair).toBe('601');
    expect(values).toHaveLength(Math.ceil(300_001 / 601) * 2);
    expect(values.slice(0, 4)).toEqual([0, 9, 0, 9]);
    expect(values.some(Number.isNaN)).toBe(false);
  });

  it('leaves a stretch that is all gap empty', async () => {
    const { values } = await read(`${await aRecord(26)}?maxPoints=26`);
    expect(values[25]).toBeNaN();
    const { values: pairs, perPair } = await read(`${await aRecord(26)}?maxPoints=10`);
    expect(perPair).toBe('6');
    // Four pairs of six, then 24 and the gap.
    expect(pairs.slice(-2)).toEqual([4, 4]);
  });
});

describe('POST …/waveforms/:waveformId/screen-again', () => {
  const again = (waveformId: number, body: object = {}, user = plant.analyst) =>
    as(user).post(plant.path(`/waveforms/${waveformId}/screen-again`), body);

  it('asks for a new run with the corrected speed and keeps the screening before', async () => {
    const { waveformId, id } = await plant.flag();
    const res = await again(waveformId, { toldSpeedRpm: 2960 });
    expect(res.status).toBe(200);
    expect(res.body).toMatchObject({
      screeningState: 'queued',
      toldSpeedRpm: 2960,
      screeningId: null,
    });
    const kept = await dataSource().getRepository(Screening).findOneBy({ id });
    expect(kept).toMatchObject({ run: 1, verdict: 'likely' });
    const row = await dataSource().getRepository(Waveform).findOneByOrFail({ id: waveformId });
    expect(row.screeningRun).toBe(2);
  });

  it('changes the quantity with the unit', async () => {
    const { waveformId } = await plant.flag();
    const res = await again(waveformId, { unit: 'mm/s' });
    expect(res.body).toMatchObject({ unit: 'mm/s', quantity: 'velocity' });
  });

  it('takes a failed screening up again as the same run', async () => {
    const waveform = await buildWaveform(
      dataSource(),
      {
        surveyId: plant.survey.id,
        measuringPointId: plant.points.axial.id,
        uploadedByUserId: plant.analyst.id,
      },
      { screeningState: 'failed', screeningAttempts: 3, screeningFailure: 'A worker died.' },
    );
    const res = await again(waveform.id);
    expect(res.body).toMatchObject({ screeningState: 'queued', screeningFailure: null });
    const row = await dataSource().getRepository(Waveform).findOneByOrFail({ id: waveform.id });
    expect(row).toMatchObject({ screeningRun: 1, screeningAttempts: 0 });
  });

  it('refuses while it is being screened, and once it has been decided', async () => {
    const { waveformId } = await plant.flag();
    expect((await again(waveformId)).status).toBe(200);
    expect((await again(waveformId)).status).toBe(409);
    const decided = await plant.flag('axial');
    await dataSource()
      .getRepository(Screening)
      .update({ id: decided.id }, { decision: 'rejected' });
    const res = await again(decided.waveformId);
    expect(res.status).toBe(409);
    expect(res.body.error.message).toContain('Undo the decision');
  });

  it('is nothing for an asset owner', async () => {
    const { waveformId } = await plant.flag();
    expect((await again(waveformId, {}, plant.owner)).status).toBe(403);
  });
});

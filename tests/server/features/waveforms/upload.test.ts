import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { surveyResponse } from '#shared/contracts/survey.ts';
import { uploadResponse, waveformResponse } from '#shared/contracts/waveform.ts';
import { buildMachine, buildPoint, buildPosition, buildSite } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aWaveformCsv } from '#tests/support/waveform-csv.ts';

const dataSource = useTestDatabase();
const dataDirectory = mkdtempSync(join(tmpdir(), 'fretline-upload-'));
let plant: Plant;
beforeEach(async () => {
  plant = await buildPlant(dataSource());
});
afterAll(() => rmSync(dataDirectory, { recursive: true, force: true }));

const as = (user: { id: number }) => buildTestApp(dataSource(), dataDirectory).as(user);
/** One channel at the horizontal point, unless told otherwise. */
const aMapping = (more: object = {}) => ({
  channels: [{ channelIndex: 0, measuringPointId: plant.points.horizontal.id }],
  ...more,
});
const send = (
  content: string | Buffer,
  { name = 'P-101_DE_H.csv', mapping = aMapping() as unknown, user = plant.analyst } = {},
) =>
  as(user)
    .post(plant.path(`/surveys/${plant.survey.id}/waveforms`))
    .field('mapping', typeof mapping === 'string' ? mapping : JSON.stringify(mapping))
    .attach('file', Buffer.from(content), name);
const readSurvey = async () =>
  surveyResponse.parse(
    (await as(plant.analyst).get(plant.path(`/surveys/${plant.survey.id}`))).body,
  );
const incoming = () => readdirSync(join(dataDirectory, 'incoming'));

describe('sending a waveform file', () => {
  it('keeps what the file says, the samples and the original', async () => {
    const csv = aWaveformCsv({
      comments: { taken_at: '2026-11-02T09:30:00+01:00', full_scale: 50 },
    });
    const res = await send(csv);
    expect(res.status).toBe(200);
    const { alreadyThere, waveforms } = uploadResponse.parse(res.body);
    expect(alreadyThere).toBe(false);
    expect(waveforms).toMatchObject([
      {
        pointLabel: 'P-101/DE/H',
        fileName: 'P-101_DE_H.csv',
        fileBytes: Buffer.byteLength(csv),
        quantity: 'acceleration',
        unit: 'g',
        sampleRateHz: 2560,
        sampleCount: 4096,
        durationS: 1.6,
        toldSpeedRpm: 1476,
        takenAt: '2026-11-02T08:30:00.000Z',
        screeningState: 'queued',
      },
    ]);
    const path = plant.path(`/waveforms/${waveforms[0]?.id}`);
    const file = await as(plant.lead).get(`${path}/file`).responseType('arraybuffer');
    expect(Buffer.from(file.body as ArrayBuffer).toString()).toBe(csv);
    expect(file.headers['content-disposition']).toBe('attachment; filename=P-101_DE_H.csv');
    const samples = await as(plant.lead).get(`${path}/samples`).responseType('arraybuffer');
    const body = Buffer.from(samples.body as ArrayBuffer);
    expect(body.byteLength).toBe(4096 * 4);
    const said = csv.trim().split('\n').slice(-4096).map(Number);
    for (const index of [0, 1, 1000, 4095]) {
      expect(body.readFloatLE(index * 4)).toBe(Math.fround(said[index] ?? Number.NaN));
    }
    const detail = waveformResponse.parse((await as(plant.lead).get(path)).body);
    expect(detail).toMatchObject({ fullScale: 50, positionCode: 'DE', direction: 'horizontal' });
    expect(incoming()).toEqual([]);
  });

  it('takes the same file twice as one waveform, whatever its name', async () => {
    const first = uploadResponse.parse((await send(aWaveformCsv())).body);
    const second = await send(aWaveformCsv(), { name: 'again.csv' });
    expect(second.status).toBe(200);
    expect(uploadResponse.parse(second.body)).toEqual({ ...first, alreadyThere: true });
    expect((await readSurvey()).waveforms).toHaveLength(1);
  });

  it('makes one waveform of the same file sent several times at once', async () => {
    const answers = await Promise.all(
      [1, 2, 3].map(() => send(aWaveformCsv()).then((res) => uploadResponse.parse(res.body))),
    );
    expect(answers.filter(({ alreadyThere }) => !alreadyThere)).toHaveLength(1);
    expect((await readSurvey()).waveforms).toHaveLength(1);
    expect(incoming()).toEqual([]);
  });

  it('reads semicolons with decimal commas and a velocity in mm/s', async () => {
    const rows = Array.from({ length: 64 }, (_, i) => `0,${String(i).padStart(3, '0')};${i % 7},5`);
    const res = await send(`time (s);velocity (mm/s)\n${rows.join('\n')}\n`);
    expect(uploadResponse.parse(res.body).waveforms).toMatchObject([
      {
        quantity: 'velocity',
        unit: 'mm/s',
        sampleRateHz: 1000,
        sampleCount: 64,
        toldSpeedRpm: null,
      },
    ]);
  });

  it('takes unit, rate and speed from the person where the file is silent', async () => {
    const rows = Array.from({ length: 32 }, (_, i) => Math.sin(i).toFixed(4));
    const bare = `${rows.join('\n')}\n`;
    const missing = await send(bare);
    expect(missing.status).toBe(422);
    expect(missing.body.error.message).toContain('sampling rate');
    const mapping = aMapping({
      channels: [{ channelIndex: 0, measuringPointId: plant.points.axial.id, unit: 'µm' }],
      sampleRateHz: 1024,
      toldSpeedRpm: 990,
    });
    const res = await send(bare, { mapping, name: 'other name.csv' });
    expect(uploadResponse.parse(res.body).waveforms).toMatchObject([
      { pointLabel: 'P-101/DE/A', unit: 'µm', sampleRateHz: 1024, toldSpeedRpm: 990 },
    ]);
    // What the first attempt lacked has been said: it is no unreadable file any more.
    expect((await readSurvey()).rejectedFiles).toEqual([]);
  });

  it('gives each column of a file to its own point, and a column left out can follow later', async () => {
    const rows = Array.from({ length: 64 }, (_, i) => `${i / 1000},${i % 5},${i % 7}`);
    const csv = `time [s],H [g],V [g]\n${rows.join('\n')}\n`;
    const { horizontal, vertical } = plant.points;
    const channel = (channelIndex: number, point: { id: number }) => ({
      channelIndex,
      measuringPointId: point.id,
    });
    const one = await send(csv, { mapping: { channels: [channel(0, horizontal)] } });
    expect(uploadResponse.parse(one.body).waveforms).toHaveLength(1);
    const mapping = { channels: [channel(0, horizontal), channel(1, vertical)] };
    const both = uploadResponse.parse((await send(csv, { mapping })).body);
    expect(both.alreadyThere).toBe(false);
    expect(both.waveforms.map(({ pointLabel }) => pointLabel)).toEqual([
      'P-101/DE/H',
      'P-101/DE/V',
    ]);
    expect(uploadResponse.parse((await send(csv, { mapping })).body).alreadyThere).toBe(true);
  });

  it('takes a point of the site that is not on the route', async () => {
    const point = await buildPoint(dataSource(), await buildPosition(dataSource(), plant.machine));
    const mapping = { channels: [{ channelIndex: 0, measuringPointId: point.id }] };
    expect((await send(aWaveformCsv(), { mapping })).status).toBe(200);
  });

  it('keeps a name with letters of any language and drops the folders', async () => {
    const res = await send(aWaveformCsv(), { name: 'Förderpumpe „Süd“ № 3.csv' });
    const [waveform] = uploadResponse.parse(res.body).waveforms;
    expect(waveform?.fileName).toBe('Förderpumpe „Süd“ № 3.csv');
    const file = await as(plant.lead).get(plant.path(`/waveforms/${waveform?.id}/file`));
    expect(file.headers['content-disposition']).toContain("filename*=UTF-8''F%C3%B6rderpumpe");
  });
});

describe('a file that can’t be taken', () => {
  it('names line and reason, keeps them with the survey, and lets others go on', async () => {
    const lines = aWaveformCsv().split('\n');
    lines[40] = 'overflow';
    const res = await send(lines.join('\n'), { name: 'broken.csv' });
    expect(res.status).toBe(422);
    expect(res.body.error.code).toBe('unreadable_file');
    expect(res.body.error.message).toMatch(/^Line 41: .*overflow/);
    expect((await send(aWaveformCsv(), { name: 'good.csv' })).status).toBe(200);
    const survey = await readSurvey();
    expect(survey.waveforms.map(({ fileName }) => fileName)).toEqual(['good.csv']);
    expect(survey.rejectedFiles).toMatchObject([{ fileName: 'broken.csv', errorLine: 41 }]);
    expect(incoming()).toEqual([]);
  });

  it('is forgotten once a mended file of its name has arrived', async () => {
    await send('nothing but words', { name: 'pump.csv' });
    expect((await readSurvey()).rejectedFiles).toHaveLength(1);
    await send(aWaveformCsv(), { name: 'pump.csv' });
    expect((await readSurvey()).rejectedFiles).toEqual([]);
  });

  it.each([
    ['an empty file', ''],
    ['bytes that are no text', Buffer.from([0, 1, 2, 3, 255, 254, 0, 0])],
    ['words', 'this is a letter, not a waveform'],
    ['a page', '<!doctype html><p>Sign in</p>'],
  ])('answers 422 with a reason for %s', async (_what, content) => {
    const res = await send(content);
    expect(res.status).toBe(422);
    expect(res.body.error.code).toBe('unreadable_file');
    expect(res.body.error.message.length).toBeGreaterThan(20);
  });

  it('asks for a point of this site', async () => {
    const site = await buildSite(dataSource());
    const machine = await buildMachine(dataSource(), site);
    const point = await buildPoint(dataSource(), await buildPosition(dataSource(), machine));
    const mapping = { channels: [{ channelIndex: 0, measuringPointId: point.id }] };
    const res = await send(aWaveformCsv(), { mapping });
    expect(res.status).toBe(422);
    expect(res.body.error.fields[0].path).toBe('mapping.channels.0.measuringPointId');
  });

  it.each([
    ['no mapping', '{}'],
    ['a mapping that is no JSON', '{'],
    [
      'an unknown unit',
      JSON.stringify({ channels: [{ channelIndex: 0, measuringPointId: 1, unit: 'furlong' }] }),
    ],
  ])('refuses %s and keeps nothing', async (_what, mapping) => {
    const res = await send(aWaveformCsv(), { mapping });
    expect(res.status).toBe(422);
    expect(res.body.error.code).toBe('validation');
    expect(incoming()).toEqual([]);
  });

  it('refuses a form without a file', async () => {
    const res = await as(plant.analyst)
      .post(plant.path(`/surveys/${plant.survey.id}/waveforms`))
      .field('mapping', JSON.stringify(aMapping()));
    expect(res.status).toBe(422);
    expect(res.body.error.fields[0].path).toBe('file');
  });

  it('refuses a body that only claims to be a form', async () => {
    const res = await as(plant.analyst)
      .post(plant.path(`/surveys/${plant.survey.id}/waveforms`))
      .set('content-type', 'multipart/form-data; boundary=x')
      .send('--x\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n1\n2\n');
    expect(res.status).toBe(422);
    expect(incoming()).toEqual([]);
  });

  it('is taken from analysts and leads alone, into their own site’s surveys', async () => {
    expect((await send(aWaveformCsv(), { user: plant.owner })).status).toBe(403);
    const res = await as(plant.analyst)
      .post(plant.path('/surveys/999999/waveforms'))
      .field('mapping', JSON.stringify(aMapping()))
      .attach('file', Buffer.from(aWaveformCsv()), 'a.csv');
    expect(res.status).toBe(404);
    expect(incoming()).toEqual([]);
  });
});

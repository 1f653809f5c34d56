import { beforeEach, describe, expect, it } from 'vitest';
import { RejectedFile } from '#server/db/entities/rejected-file.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { surveyListResponse, surveyResponse } from '#shared/contracts/survey.ts';
import {
  buildMember,
  buildPoint,
  buildPosition,
  buildRoute,
  buildSite,
} from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildWaveform } from '#tests/support/screening-factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();
let plant: Plant;
beforeEach(async () => {
  plant = await buildPlant(dataSource());
});
const as = (user: { id: number }) => buildTestApp(dataSource()).as(user);
const readSurvey = async () => {
  const res = await as(plant.analyst).get(plant.path(`/surveys/${plant.survey.id}`));
  expect(res.status).toBe(200);
  return surveyResponse.parse(res.body);
};

describe('POST …/surveys', () => {
  const make = (user: { id: number }, body: object) => as(user).post(plant.path('/surveys'), body);

  it('makes a survey of a route and a day, with every point of the route still missing', async () => {
    const res = await make(plant.analyst, {
      routeId: plant.survey.routeId,
      surveyedOn: '2026-11-09',
    });
    expect(res.status).toBe(201);
    const survey = surveyResponse.parse(res.body);
    expect(survey.createdByName).toBe('Ada Analyst');
    expect(survey.missingPoints.map(({ label }) => label)).toEqual([
      'P-101/DE/H',
      'P-101/DE/V',
      'P-101/DE/A',
    ]);
  });

  it('refuses a second survey of the same route and day', async () => {
    const res = await make(plant.lead, {
      routeId: plant.survey.routeId,
      surveyedOn: plant.survey.surveyedOn,
    });
    expect(res.status).toBe(409);
    expect(res.body.error.message).toContain('already has a survey of 2026-11-02');
  });

  it('refuses a day in the future', async () => {
    const res = await make(plant.analyst, {
      routeId: plant.survey.routeId,
      surveyedOn: '2999-01-01',
    });
    expect(res.status).toBe(422);
    expect(res.body.error.fields).toEqual([
      { path: 'surveyedOn', message: 'The date lies in the future.' },
    ]);
  });

  it('refuses the route of another site', async () => {
    const other = await buildPlant(dataSource());
    const res = await make(plant.analyst, {
      routeId: other.survey.routeId,
      surveyedOn: '2026-11-09',
    });
    expect(res.status).toBe(422);
  });

  it('is nothing for an asset owner', async () => {
    const body = { routeId: plant.survey.routeId, surveyedOn: '2026-11-09' };
    expect((await make(plant.owner, body)).status).toBe(403);
  });
});

describe('GET …/surveys/:surveyId', () => {
  it('lists points and gaps in the order of the walk, and counts waveforms by state and verdict', async () => {
    await plant.flag('vertical');
    await plant.flag('vertical', { verdict: 'none', score: 0.1 });
    await buildWaveform(
      dataSource(),
      {
        surveyId: plant.survey.id,
        measuringPointId: plant.points.axial.id,
        uploadedByUserId: plant.analyst.id,
      },
      { screeningState: 'failed', screeningFailure: 'It took longer than 5 minutes.' },
    );
    const survey = await readSurvey();
    expect(survey.points.map(({ label }) => label)).toEqual([
      'P-101/DE/H',
      'P-101/DE/V',
      'P-101/DE/A',
    ]);
    expect(survey.missingPoints.map(({ label }) => label)).toEqual(['P-101/DE/H']);
    expect(survey.counts).toMatchObject({
      pointCount: 3,
      measuredPointCount: 2,
      waveformCount: 3,
      doneCount: 2,
      failedCount: 1,
      likelyCount: 1,
      noneCount: 1,
      undecidedFlagCount: 1,
    });
    expect(survey.waveforms[2]?.screeningFailure).toBe('It took longer than 5 minutes.');
    expect(survey.waveforms[0]).toMatchObject({ verdict: 'likely', speedRpm: 1476 });
    expect(survey.waveforms[0]?.orders).toHaveLength(6);
  });

  it('counts a point off the route as a waveform and not as a measured point', async () => {
    const elsewhere = await buildPoint(
      dataSource(),
      await buildPosition(dataSource(), plant.machine),
    );
    await buildRoute(dataSource(), plant.site, [elsewhere]);
    await buildWaveform(dataSource(), {
      surveyId: plant.survey.id,
      measuringPointId: elsewhere.id,
      uploadedByUserId: plant.analyst.id,
    });
    const { counts } = await readSurvey();
    expect(counts).toMatchObject({ waveformCount: 1, measuredPointCount: 0 });
  });

  it('shows the verdict of the newest run only', async () => {
    const screening = await plant.flag();
    await dataSource()
      .getRepository(Waveform)
      .update({ id: screening.waveformId }, { screeningRun: 2, screeningState: 'queued' });
    const survey = await readSurvey();
    expect(survey.waveforms[0]).toMatchObject({ screeningState: 'queued', verdict: null });
    expect(survey.counts).toMatchObject({ queuedCount: 1, likelyCount: 0, undecidedFlagCount: 0 });
  });

  it('is not there for a member of another site, nor under another site’s address', async () => {
    const site = await buildSite(dataSource());
    const stranger = await buildMember(dataSource(), site, 'lead');
    const own = `/api/sites/${site.id}/surveys/${plant.survey.id}`;
    expect((await as(stranger).get(plant.path(`/surveys/${plant.survey.id}`))).status).toBe(404);
    expect((await as(stranger).get(own)).status).toBe(404);
    expect((await as(stranger).get(`${own}/progress`)).status).toBe(404);
  });
});

describe('GET …/surveys/:surveyId/progress', () => {
  it('answers the counts alone', async () => {
    await plant.flag();
    const res = await as(plant.lead).get(plant.path(`/surveys/${plant.survey.id}/progress`));
    expect(res.body).toEqual((await readSurvey()).counts);
  });
});

describe('GET …/surveys', () => {
  it('lists the newest first and finds by route', async () => {
    await as(plant.analyst).post(plant.path('/surveys'), {
      routeId: plant.survey.routeId,
      surveyedOn: '2026-11-09',
    });
    const read = async (query: string) =>
      surveyListResponse.parse((await as(plant.lead).get(plant.path(`/surveys${query}`))).body);
    expect((await read('')).items.map(({ surveyedOn }) => surveyedOn)).toEqual([
      '2026-11-09',
      '2026-11-02',
    ]);
    expect((await read('?sort=surveyedOn&direction=asc&pageSize=1')).items[0]?.surveyedOn).toBe(
      '2026-11-02',
    );
    expect((await read('?search=no such route')).total).toBe(0);
  });
});

describe('DELETE …/surveys/:surveyId/rejected-files/:rejectedFileId', () => {
  const aRejectedFile = () =>
    dataSource()
      .getRepository(RejectedFile)
      .save({
        surveyId: plant.survey.id,
        fileName: 'broken.csv',
        contentHash: 'a'.repeat(64),
        errorCode: 'not-a-number',
        errorLine: 17,
        errorMessage: 'It holds “overflow”.',
        rejectedAt: new Date(),
      });

  it('puts the note of an unreadable file away', async () => {
    const file = await aRejectedFile();
    expect((await readSurvey()).rejectedFiles).toMatchObject([
      { fileName: 'broken.csv', errorLine: 17, errorMessage: 'It holds “overflow”.' },
    ]);
    const path = plant.path(`/surveys/${plant.survey.id}/rejected-files/${file.id}`);
    expect((await as(plant.analyst).delete(path)).status).toBe(204);
    expect((await readSurvey()).rejectedFiles).toEqual([]);
    expect((await as(plant.analyst).delete(path)).status).toBe(404);
  });

  it('leaves the files of other surveys alone', async () => {
    const file = await aRejectedFile();
    const created = await as(plant.analyst).post(plant.path('/surveys'), {
      routeId: plant.survey.routeId,
      surveyedOn: '2026-11-09',
    });
    const path = plant.path(`/surveys/${created.body.id}/rejected-files/${file.id}`);
    expect((await as(plant.analyst).delete(path)).status).toBe(404);
    expect((await readSurvey()).rejectedFiles).toHaveLength(1);
  });
});

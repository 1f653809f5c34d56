import { describe, expect, it } from 'vitest';
import { Activity } from '#server/db/entities/activity.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Database } from '#server/db/database.ts';
import { LimitsRepository } from '#server/screening/limits.repository.ts';
import { ScreeningJobRepository } from '#server/screening/screening-job.repository.ts';
import type { LimitsResponse, LimitsTrialResponse } from '#shared/contracts/limits.ts';
import { defaultLimits, methodVersion } from '#shared/signal/screen-waveform.ts';
import { buildMachine, buildPoint, buildPosition } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildScreening, buildWaveform } from '#tests/support/screening-factories.ts';
import { aScreeningResult } from '#tests/support/screening-result.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const story = inspectionStory(database);

const set = (plant: Plant, body: object) =>
  story
    .app()
    .as(plant.lead)
    .post(plant.path('/limits'), {
      machineKind: null,
      suspectedScore: 0.6,
      likelyScore: 0.9,
      reason: 'Too many flags on the fans.',
      version: 0,
      ...body,
    });
const limitsOf = async (plant: Plant) =>
  (await story.app().as(plant.lead).get(plant.path('/limits'))).body as LimitsResponse;
const trial = async (plant: Plant, query: string) =>
  (
    await story
      .app()
      .as(plant.lead)
      .get(plant.path(`/limits/trial?${query}`))
  ).body as LimitsTrialResponse;
const screened = (plant: Plant, score: number) =>
  plant.flag('axial', {
    score,
    verdict: score >= 0.8 ? 'likely' : score >= 0.5 ? 'suspected' : 'none',
  });

/** A fan of the same site with a judged screening. */
async function fan(plant: Plant, score: number) {
  const machine = await buildMachine(database(), plant.site, { kind: 'fan', tag: 'F-1' });
  const point = await buildPoint(database(), await buildPosition(database(), machine));
  const waveform = await buildWaveform(database(), {
    surveyId: plant.survey.id,
    measuringPointId: point.id,
    uploadedByUserId: plant.analyst.id,
  });
  return buildScreening(database(), waveform, aScreeningResult({ score }));
}

describe('the limits of the verdict', () => {
  it('are the method’s until a lead sets others', async () => {
    const plant = await buildPlant(database());
    const { suspectedScore, likelyScore } = defaultLimits;
    expect(await limitsOf(plant)).toMatchObject({
      site: { suspectedScore, likelyScore, own: false, machineCount: 1 },
      kinds: [{ machineKind: 'pump', suspectedScore, likelyScore, own: false, machineCount: 1 }],
      method: { suspectedScore, likelyScore },
      history: [],
      version: 0,
    });
  });

  it('are set for the site, and for a kind, which then no longer follows the site', async () => {
    const plant = await buildPlant(database());
    const first = (await set(plant, {})).body as LimitsResponse;
    expect(first.kinds).toMatchObject([{ suspectedScore: 0.6, own: false }]);
    const second = (
      await set(plant, { machineKind: 'pump', suspectedScore: 0.4, version: first.version })
    ).body as LimitsResponse;
    expect(second.kinds).toMatchObject([{ suspectedScore: 0.4, likelyScore: 0.9, own: true }]);
    expect(second.site).toMatchObject({ suspectedScore: 0.6, own: true });
    expect(second.history).toMatchObject([
      { machineKind: 'pump', changedByName: 'Lena Lead' },
      { machineKind: null, reason: 'Too many flags on the fans.' },
    ]);
    const third = (
      await set(plant, {
        machineKind: 'pump',
        suspectedScore: null,
        likelyScore: null,
        version: second.version,
      })
    ).body as LimitsResponse;
    expect(third.kinds).toMatchObject([{ suspectedScore: 0.6, own: false }]);
  });

  it('stand in the activity record with what they were', async () => {
    const plant = await buildPlant(database());
    const { version } = (await set(plant, {})).body as LimitsResponse;
    await set(plant, { suspectedScore: 0.7, version });
    const rows = await database()
      .getRepository(Activity)
      .find({ where: { action: 'limits.changed' }, order: { id: 'ASC' } });
    expect(rows.map(({ details }) => details)).toMatchObject([
      { from: null, to: { suspectedScore: 0.6, likelyScore: 0.9 } },
      { from: { suspectedScore: 0.6 }, to: { suspectedScore: 0.7 }, machineKind: null },
    ]);
    expect(rows[1]).toMatchObject({ userId: plant.lead.id, siteId: plant.site.id });
  });

  it('reach new screenings by site and kind, and leave earlier ones as they were', async () => {
    const plant = await buildPlant(database());
    const earlier = await screened(plant, 0.55);
    await set(plant, { machineKind: 'pump' });

    const kept = await database().getRepository(Screening).findOneByOrFail({ id: earlier.id });
    expect(kept.verdict).toBe('suspected');
    expect(kept.result.limits.suspectedScore).toBe(earlier.result.limits.suspectedScore);

    const { id } = await buildWaveform(
      database(),
      {
        surveyId: plant.survey.id,
        measuringPointId: plant.points.vertical.id,
        uploadedByUserId: plant.analyst.id,
      },
      { screeningState: 'queued' },
    );
    const { db } = new Database(database());
    const job = await new ScreeningJobRepository(db).claim(id);
    expect(job?.limits).toEqual({ suspectedScore: 0.6, likelyScore: 0.9 });
    const limits = new LimitsRepository(db);
    expect(await limits.inForce(plant.site.id, 'fan')).toMatchObject({ suspectedScore: 0.5 });
  });

  it.each([
    ['suspected above likely', { suspectedScore: 0.95 }, 'suspectedScore', /at or below/],
    ['below 0', { suspectedScore: -0.1 }, 'suspectedScore', /between 0 and 1/],
    ['above 1', { likelyScore: 1.2 }, 'likelyScore', /between 0 and 1/],
    ['text', { likelyScore: 'high' }, 'likelyScore', /number/],
    ['one of two', { likelyScore: null }, 'likelyScore', /both/],
    ['no reason', { reason: '  ' }, 'reason', /reason/],
  ])('are refused at the field: %s', async (_name, body, path, message) => {
    const plant = await buildPlant(database());
    const res = await set(plant, body);
    expect(res.status).toBe(422);
    const { fields } = (res.body as { error: { fields: { path: string; message: string }[] } })
      .error;
    expect(fields[0]?.path).toBe(path);
    expect(fields[0]?.message).toMatch(message);
    expect((await limitsOf(plant)).history).toEqual([]);
  });

  it('are refused where another lead changed them meanwhile, and where nothing would change', async () => {
    const plant = await buildPlant(database());
    const { version } = (await set(plant, {})).body as LimitsResponse;
    const late = await set(plant, { suspectedScore: 0.3 });
    expect(late.status).toBe(409);
    expect((late.body as { error: { message: string } }).error.message).toMatch(
      /Lena Lead changed the limits of the whole site meanwhile: “Too many flags on the fans\.”/,
    );
    expect((await set(plant, { version })).status).toBe(409);
    expect((await limitsOf(plant)).history).toHaveLength(1);
  });

  it('are taken from one of two leads who save at once', async () => {
    const plant = await buildPlant(database());
    const answers = await Promise.all([set(plant, {}), set(plant, { suspectedScore: 0.7 })]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });
});

describe('limits on trial', () => {
  it('show which flags would come and go, and change nothing', async () => {
    const plant = await buildPlant(database());
    for (const score of [0.3, 0.45, 0.55, 0.85]) await screened(plant, score);

    const higher = await trial(plant, 'suspectedScore=0.6&likelyScore=0.9');
    expect(higher).toMatchObject({
      screeningCount: 4,
      flagsNowCount: 2,
      flagsThenCount: 1,
      coming: { flagCount: 0 },
      going: { flagCount: 1 },
      changingCount: 1,
    });
    expect(higher.changes).toMatchObject([
      { score: 0.85, verdictNow: 'likely', verdictThen: 'suspected', pointLabel: 'P-101/DE/A' },
      { score: 0.55, verdictNow: 'suspected', verdictThen: 'none', surveyedOn: '2026-11-02' },
    ]);
    const lower = await trial(plant, 'suspectedScore=0.4&likelyScore=0.8');
    expect(lower.coming.flagCount).toBe(1);
    expect(lower.changes).toMatchObject([{ score: 0.45, verdictThen: 'suspected' }]);
    expect((await limitsOf(plant)).history).toEqual([]);
  });

  it('say how many scores another version of the method gave', async () => {
    const plant = await buildPlant(database());
    await screened(plant, 0.3);
    await plant.flag('vertical', { score: 0.4, methodVersion });
    expect(await trial(plant, '')).toMatchObject({ screeningCount: 2, otherMethodCount: 1 });
  });

  it('say what the inspection after the survey found', async () => {
    const plant = await buildPlant(database());
    const task = await story.accepted(plant);
    await story.report(plant, task.inspectionId, aReport());
    // The story's flag has a score of 0.82 and was accepted.
    const { going, changes } = await trial(plant, 'suspectedScore=0.9&likelyScore=0.95');
    expect(going).toEqual({ flagCount: 1, looseCount: 1, notLooseCount: 0 });
    expect(changes).toMatchObject([{ decision: 'accepted', inspection: { outcome: 'loose' } }]);
  });

  it('look at the machines they are for', async () => {
    const plant = await buildPlant(database());
    await screened(plant, 0.55);
    await fan(plant, 0.57);
    const scores = async (query: string) =>
      (await trial(plant, `suspectedScore=0.6&likelyScore=0.9${query}`)).changes.map(
        ({ score }) => score,
      );
    expect(await scores('')).toEqual([0.57, 0.55]);
    expect(await scores('&machineKind=fan')).toEqual([0.57]);
    // A kind with limits of its own no longer follows the site.
    await set(plant, { machineKind: 'fan', suspectedScore: 0.55 });
    expect(await scores('')).toEqual([0.55]);
    // Without scores: as the site.
    expect((await trial(plant, 'machineKind=fan')).tried).toMatchObject({ suspectedScore: 0.5 });
  });

  it('see no other site, and only the newest run of a waveform', async () => {
    const plant = await buildPlant(database());
    const other = await buildPlant(database());
    await screened(other, 0.55);
    const waveform = await buildWaveform(
      database(),
      {
        surveyId: plant.survey.id,
        measuringPointId: plant.points.axial.id,
        uploadedByUserId: plant.analyst.id,
      },
      { screeningRun: 2 },
    );
    await buildScreening(database(), waveform, aScreeningResult({ score: 0.55 }));
    expect(await trial(plant, 'suspectedScore=0.6&likelyScore=0.9')).toMatchObject({
      screeningCount: 0,
      flagsNowCount: 0,
      changes: [],
    });
  });

  it('refuse what cannot be limits', async () => {
    const plant = await buildPlant(database());
    const status = async (query: string) =>
      (
        await story
          .app()
          .as(plant.lead)
          .get(plant.path(`/limits/trial?${query}`))
      ).status;
    expect(await status('suspectedScore=0.9&likelyScore=0.5')).toBe(422);
    expect(await status('suspectedScore=0.9')).toBe(422);
    expect(await status('suspectedScore=2&likelyScore=3')).toBe(422);
  });
});

import { describe, expect, it } from 'vitest';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { Survey } from '#server/db/entities/survey.entity.ts';
import type { FindingListResponse, FindingResponse } from '#shared/contracts/finding.ts';
import { buildSurvey } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildWaveform } from '#tests/support/screening-factories.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const story = inspectionStory(database);

const decide = (plant: Plant, findingId: number, body: object, version = 1) =>
  story
    .app()
    .as(plant.lead)
    .post(plant.path(`/findings/${findingId}/decision`), {
      action: 'monitor',
      reason: 'Low level.',
      version,
      ...body,
    });

async function survey(plant: Plant, surveyedOn: string) {
  const { routeId } = await database()
    .getRepository(Survey)
    .findOneByOrFail({ id: plant.survey.id });
  const { id } = await buildSurvey(database(), { id: routeId }, plant.analyst, { surveyedOn });
  // Two directions of one survey count once.
  for (const point of [plant.points.vertical, plant.points.axial]) {
    await buildWaveform(database(), {
      surveyId: id,
      measuringPointId: point.id,
      uploadedByUserId: plant.analyst.id,
    });
  }
}

const monitoringOf = async (plant: Plant, findingId: number) =>
  (
    (
      await story
        .app()
        .as(plant.lead)
        .get(plant.path(`/findings/${findingId}`))
    ).body as FindingResponse
  ).monitoring;

const overdueIds = async (plant: Plant) =>
  (
    (await story.app().as(plant.lead).get(plant.path('/findings?overdue=true')))
      .body as FindingListResponse
  ).items.map(({ id }) => id);

describe('monitoring', () => {
  it('lasts until a day and is overdue after it', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    const res = await decide(plant, findingId, { monitorUntilOn: '2099-01-12' });
    expect(res.body).toMatchObject({
      state: 'monitoring',
      monitoring: { untilOn: '2099-01-12', surveyLimit: null, surveyCount: 0, overdue: false },
    });
    expect(await overdueIds(plant)).toEqual([]);

    await database().getRepository(Finding).update(findingId, { monitorUntilOn: '2026-01-12' });

    expect(await monitoringOf(plant, findingId)).toMatchObject({ overdue: true });
    expect(await overdueIds(plant)).toEqual([findingId]);
  });

  it('lasts for a number of surveys of the position', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    await decide(plant, findingId, { monitorSurveys: 2 });
    await survey(plant, '2099-01-01');
    expect(await monitoringOf(plant, findingId)).toMatchObject({
      surveyLimit: 2,
      surveyCount: 1,
      overdue: false,
    });
    expect(await overdueIds(plant)).toEqual([]);
    await survey(plant, '2099-02-01');
    expect(await monitoringOf(plant, findingId)).toMatchObject({ surveyCount: 2, overdue: true });
    expect(await overdueIds(plant)).toEqual([findingId]);
  });

  it('is prolonged by deciding again, from that day on', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    await decide(plant, findingId, { monitorSurveys: 1 });
    const res = await decide(plant, findingId, { monitorUntilOn: '2099-06-01' }, 2);
    expect(res.body).toMatchObject({
      version: 3,
      monitoring: { untilOn: '2099-06-01', surveyLimit: null },
      history: [{}, { toState: 'monitoring' }, { fromState: 'monitoring', toState: 'monitoring' }],
    });
  });

  it('ends with the next decision', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    await decide(plant, findingId, { monitorSurveys: 1 });
    await decide(plant, findingId, { action: 'dismiss', reason: 'Resonance.' }, 2);
    expect(await monitoringOf(plant, findingId)).toBeNull();
    const row = await database().getRepository(Finding).findOneByOrFail({ id: findingId });
    expect(row).toMatchObject({ monitoredSince: null, monitorSurveys: null });
  });

  it('follows an inspection that found the fit sound, until the next survey', async () => {
    const plant = await buildPlant(database());
    const task = await story.accepted(plant);
    await story.report(
      plant,
      task.inspectionId,
      aReport({ outcome: 'not loose', repaired: false, workDone: 'Nothing.' }),
    );
    expect(await monitoringOf(plant, task.findingId)).toMatchObject({ surveyLimit: 1 });
  });

  it.each([
    ['no end', {}, 'Say until which day or for how many surveys.', 'monitorUntilOn'],
    ['a day in the past', { monitorUntilOn: '2026-01-01' }, /past/, 'monitorUntilOn'],
    ['no day at all', { monitorUntilOn: '2099-02-30' }, /date/, 'monitorUntilOn'],
    ['no survey', { monitorSurveys: 0 }, 'At least 1.', 'monitorSurveys'],
    ['half a survey', { monitorSurveys: 1.5 }, 'Enter a whole number.', 'monitorSurveys'],
    ['no reason', { monitorSurveys: 1, reason: ' ' }, 'Give a reason.', 'reason'],
    [
      'an end where nothing is monitored',
      { action: 'dismiss', monitorSurveys: 1 },
      'Only monitoring has an end.',
      'monitorUntilOn',
    ],
  ])('with %s is refused at the field', async (_name, body, message, path) => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    const res = await decide(plant, findingId, body);
    expect(res.status).toBe(422);
    const { fields } = (res.body as { error: { fields: { path: string; message: string }[] } })
      .error;
    expect(fields[0]?.path).toBe(path);
    expect(fields[0]?.message).toMatch(message);
    expect(await story.stateOf(plant, findingId)).toBe('open');
  });
});

import { describe, expect, it } from 'vitest';
import { Survey } from '#server/db/entities/survey.entity.ts';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import type { ScreeningResult } from '#shared/signal/screening-types.ts';
import { buildSurvey } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildScreening, buildWaveform } from '#tests/support/screening-factories.ts';
import { anOrderLine, aScreeningResult } from '#tests/support/screening-result.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const story = inspectionStory(database);

const quiet: Partial<ScreeningResult> = {
  verdict: 'none',
  score: 0.05,
  kind: null,
  orders: [1, 2, 3].map((order) => anOrderLine(order, { velocityMmPerSRms: 0.1 })),
};

async function repaired(plant: Plant) {
  const task = await story.accepted(plant);
  await story.report(plant, task.inspectionId, aReport());
  return task.findingId;
}

/** A survey with one screening at the vertical point. */
async function survey(
  plant: Plant,
  surveyedOn: string,
  result: Partial<ScreeningResult>,
  uploadedAt = new Date(),
) {
  const { routeId } = await database()
    .getRepository(Survey)
    .findOneByOrFail({ id: plant.survey.id });
  const { id } = await buildSurvey(database(), { id: routeId }, plant.analyst, { surveyedOn });
  const waveform = await buildWaveform(
    database(),
    {
      surveyId: id,
      measuringPointId: plant.points.vertical.id,
      uploadedByUserId: plant.analyst.id,
    },
    { uploadedAt },
  );
  return buildScreening(database(), waveform, aScreeningResult(result));
}

const read = async (plant: Plant, findingId: number) =>
  (
    await story
      .app()
      .as(plant.lead)
      .get(plant.path(`/findings/${findingId}`))
  ).body as FindingResponse;

const today = () => new Date().toISOString().slice(0, 10);

describe('the verification of a repaired finding', () => {
  it('waits for a survey after the repair', async () => {
    const plant = await buildPlant(database());
    const findingId = await repaired(plant);
    expect((await read(plant, findingId)).verification).toEqual({
      repairedOn: today(),
      surveyCount: 0,
      comparison: null,
    });
  });

  it('is not there before the repair', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    expect((await read(plant, findingId)).verification).toBeNull();
  });

  it('sets the first survey after the repair against the one that raised the finding', async () => {
    const plant = await buildPlant(database());
    const findingId = await repaired(plant);
    await survey(plant, '2099-01-01', quiet);
    await survey(plant, '2099-02-01', { verdict: 'likely', score: 0.9 });

    const { verification } = await read(plant, findingId);

    expect(verification?.surveyCount).toBe(2);
    expect(verification?.comparison).toMatchObject({
      surveyedOn: '2099-01-01',
      proposal: 'verified',
      points: [
        {
          pointLabel: 'P-101/DE/V',
          before: { surveyedOn: '2026-11-02', score: 0.82 },
          after: { surveyedOn: '2099-01-01', score: 0.05 },
        },
      ],
    });
  });

  it('goes on to the next survey where the first could not tell', async () => {
    const plant = await buildPlant(database());
    const findingId = await repaired(plant);
    await survey(plant, '2099-01-01', { verdict: 'retake', score: null });
    expect((await read(plant, findingId)).verification?.comparison?.proposal).toBe('measure again');
    await survey(plant, '2099-02-01', { verdict: 'likely', score: 0.9 });
    expect((await read(plant, findingId)).verification?.comparison).toMatchObject({
      surveyedOn: '2099-02-01',
      proposal: 'reopen',
    });
  });

  it('takes a survey of the very day only where its record came after the report', async () => {
    const plant = await buildPlant(database());
    const before = new Date(Date.now() - 3_600_000);
    const findingId = await repaired(plant);
    await survey(plant, today(), quiet, before);
    expect((await read(plant, findingId)).verification?.surveyCount).toBe(0);
  });

  it('keeps a flag accepted after the repair out of what raised the finding', async () => {
    const plant = await buildPlant(database());
    const findingId = await repaired(plant);
    const again = await survey(plant, '2099-01-01', { verdict: 'likely', score: 0.9 });
    await story
      .app()
      .as(plant.analyst)
      .post(plant.path(`/screenings/${again.id}/decision`), { decision: 'accepted' });

    const { comparison } = (await read(plant, findingId)).verification ?? {};

    expect(comparison).toMatchObject({
      proposal: 'reopen',
      points: [{ before: { score: 0.82 }, after: { score: 0.9 } }],
    });
  });
});

describe('two leads who decide on one finding', () => {
  it('the second is told who came first, with what and why', async () => {
    const plant = await buildPlant(database());
    const findingId = await repaired(plant);
    const { version } = await read(plant, findingId);
    const decide = (action: string, reason: string) =>
      story
        .app()
        .as(plant.lead)
        .post(plant.path(`/findings/${findingId}/decision`), { action, reason, version });

    expect((await decide('verify', 'Gone at both points.')).status).toBe(200);
    const second = await decide('reopen', 'I saw it differently.');

    expect(second.status).toBe(409);
    const { error } = second.body as { error: { code: string; message: string } };
    expect(error.code).toBe('conflict');
    expect(error.message).toMatch(
      /is now verified\. Lena Lead closed it as verified on \d{4}-\d\d-\d\d \d\d:\d\d UTC: “Gone at both points\.”\. Your decision was not saved/,
    );
    expect(await story.stateOf(plant, findingId)).toBe('verified');
  });

  it('is told of a flag accepted meanwhile too', async () => {
    const plant = await buildPlant(database());
    const findingId = await story.openFinding(plant);
    const more = await plant.flag('horizontal');
    await story
      .app()
      .as(plant.otherAnalyst)
      .post(plant.path(`/screenings/${more.id}/decision`), { decision: 'accepted' });
    const res = await story
      .app()
      .as(plant.lead)
      .post(plant.path(`/findings/${findingId}/decision`), {
        action: 'dismiss',
        reason: 'Resonance.',
        version: 1,
      });
    expect((res.body as { error: { message: string } }).error.message).toContain(
      'is now open. Otto Analyst accepted another flag for it',
    );
  });
});

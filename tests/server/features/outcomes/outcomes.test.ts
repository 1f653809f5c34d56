import { describe, expect, it } from 'vitest';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import type { OutcomesResponse } from '#shared/contracts/outcomes.ts';
import { buildPlant } from '#tests/support/plant.ts';
import { buildScreening } from '#tests/support/screening-factories.ts';
import { aScreeningResult } from '#tests/support/screening-result.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const story = inspectionStory(database);

const outcomesOf = async (plant: Awaited<ReturnType<typeof buildPlant>>) =>
  (await story.app().as(plant.analyst).get(plant.path('/outcomes'))).body as OutcomesResponse;

describe('the outcomes of a site', () => {
  it('are empty before the first flag', async () => {
    const plant = await buildPlant(database());
    expect(await outcomesOf(plant)).toMatchObject({
      flags: { flaggedCount: 0 },
      site: { confirmedCount: 0, waitingCount: 0, predictiveValue: null },
      traits: [],
    });
  });

  it('follow a flag from the review desk through its inspection', async () => {
    const plant = await buildPlant(database());
    await plant.flag('axial', { verdict: 'suspected', score: 0.55 });
    await plant.flag('horizontal', { verdict: 'none', score: 0.1, kind: null });
    const task = await story.accepted(plant);
    expect(await outcomesOf(plant)).toMatchObject({
      flags: { flaggedCount: 2, acceptedCount: 1, rejectedCount: 0, waitingCount: 1 },
      site: { waitingCount: 1 },
    });
    await story.report(plant, task.inspectionId, aReport());
    const outcomes = await outcomesOf(plant);
    expect(outcomes.site).toMatchObject({ confirmedCount: 1, waitingCount: 0 });
    expect(outcomes.site.predictiveValue?.share).toBe(1);
    expect(outcomes.byMachineKind).toMatchObject([{ machineKind: 'pump', confirmedCount: 1 }]);
    expect(outcomes.traits).toEqual([
      { trait: 'machine kind', value: 'pump', confirmedCount: 1, notFoundCount: 0 },
      { trait: 'speed source', value: 'refined', confirmedCount: 1, notFoundCount: 0 },
      { trait: 'kind of looseness', value: 'seat', confirmedCount: 1, notFoundCount: 0 },
      { trait: 'direction', value: 'vertical', confirmedCount: 1, notFoundCount: 0 },
    ]);
    expect(outcomes.times[0]).toMatchObject({ step: 'survey to inspection', findingCount: 1 });
  });

  it('count the newest screening of a waveform only', async () => {
    const plant = await buildPlant(database());
    const { waveformId } = await plant.flag('axial');
    await database().getRepository(Waveform).update(waveformId, { screeningRun: 2 });
    await buildScreening(database(), { id: waveformId }, aScreeningResult(), { run: 2 });
    expect((await outcomesOf(plant)).flags).toMatchObject({ flaggedCount: 1, waitingCount: 1 });
  });

  it('say nothing of another site', async () => {
    const plant = await buildPlant(database());
    const task = await story.accepted(plant);
    await story.report(plant, task.inspectionId, aReport());
    const other = await buildPlant(database());
    expect(await outcomesOf(other)).toMatchObject({
      flags: { flaggedCount: 0 },
      site: { confirmedCount: 0 },
    });
  });
});

import { describe, expect, it } from 'vitest';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import type { ReviewQueueItem } from '#shared/contracts/review.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildPlant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();
const idsOf = (body: unknown) =>
  (body as { items: ReviewQueueItem[] }).items.map((item) => item.screeningId);

describe('the review queue', () => {
  it('lists what waits, worst first: likely, suspected, retake, each by score', async () => {
    const plant = await buildPlant(database());
    const retake = await plant.flag('axial', { verdict: 'retake', score: null, kind: null });
    const suspected = await plant.flag('vertical', { verdict: 'suspected', score: 0.69 });
    const likelyLow = await plant.flag('horizontal', { verdict: 'likely', score: 0.71 });
    const likelyHigh = await plant.flag('vertical', { verdict: 'likely', score: 0.95 });
    await plant.flag('axial', { verdict: 'none', score: 0.1 });

    const res = await buildTestApp(database()).as(plant.analyst).get(plant.path('/review-queue'));

    expect(idsOf(res.body)).toEqual([likelyHigh.id, likelyLow.id, suspected.id, retake.id]);
    expect((res.body as { items: ReviewQueueItem[] }).items[0]).toMatchObject({
      pointLabel: 'P-101/DE/V',
      verdict: 'likely',
      score: 0.95,
    });
  });

  it('shows only the newest screening of a waveform that was screened again', async () => {
    const plant = await buildPlant(database());
    const first = await plant.flag();
    await database().getRepository(Waveform).update({ id: first.waveformId }, { screeningRun: 2 });
    const { id: _old, ...rest } = first;
    const second = await database()
      .getRepository(Screening)
      .save({ ...rest, run: 2 });
    const { as } = buildTestApp(database());

    expect(idsOf((await as(plant.analyst).get(plant.path('/review-queue'))).body)).toEqual([
      second.id,
    ]);
    const late = await as(plant.analyst).post(plant.path(`/screenings/${first.id}/decision`), {
      decision: 'accepted',
    });
    expect(late.status).toBe(409);
    expect(late.body).toMatchObject({ error: { code: 'wrong_state' } });
  });

  it('keeps another site’s flags to that site', async () => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const elsewhere = await buildSite(database());
    const stranger = await buildMember(database(), elsewhere, 'analyst');
    const { as } = buildTestApp(database());

    const own = await as(stranger).get(`/api/sites/${elsewhere.id}/review-queue`);
    expect(idsOf(own.body)).toEqual([]);
    const decided = await as(stranger).post(
      `/api/sites/${elsewhere.id}/screenings/${flag.id}/decision`,
      { decision: 'accepted' },
    );
    expect(decided.status).toBe(404);
  });

  it('is not for asset owners', async () => {
    const plant = await buildPlant(database());
    const res = await buildTestApp(database()).as(plant.owner).get(plant.path('/review-queue'));
    expect(res.status).toBe(403);
  });
});

describe('deciding on a flag', () => {
  it('makes a finding of the first accepted flag and extends it with the next', async () => {
    const plant = await buildPlant(database());
    const [first, second] = [await plant.flag('vertical'), await plant.flag('horizontal')];
    const analyst = buildTestApp(database()).as(plant.analyst);
    const accept = (id: number) =>
      analyst.post(plant.path(`/screenings/${id}/decision`), { decision: 'accepted' });

    const made = await accept(first.id);
    const extended = await accept(second.id);

    const { findingId } = made.body as { findingId: number };
    expect(made.body).toMatchObject({ decision: 'accepted', findingIsNew: true });
    expect(extended.body).toMatchObject({ findingId, findingIsNew: false });
    const finding = await analyst.get(plant.path(`/findings/${findingId}`));
    expect(finding.body).toMatchObject({ state: 'open', screeningCount: 2 });
  });

  it('makes one finding where two analysts accept at the same moment', async () => {
    const plant = await buildPlant(database());
    const flags = await Promise.all([
      plant.flag('vertical'),
      plant.flag('horizontal'),
      plant.flag('axial'),
    ]);
    const { as } = buildTestApp(database());
    const people = [plant.analyst, plant.otherAnalyst, plant.lead];

    const answers = await Promise.all(
      flags.map(({ id }, index) =>
        as(people[index] ?? plant.analyst).post(plant.path(`/screenings/${id}/decision`), {
          decision: 'accepted',
        }),
      ),
    );

    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200]);
    const bodies = answers.map(({ body }) => body as { findingId: number; findingIsNew: boolean });
    expect(new Set(bodies.map(({ findingId }) => findingId)).size).toBe(1);
    expect(bodies.filter(({ findingIsNew }) => findingIsNew)).toHaveLength(1);
  });

  it('tells the second of two people who decided what', async () => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const path = plant.path(`/screenings/${flag.id}/decision`);
    await as(plant.analyst).post(path, { decision: 'rejected', reason: 'Coupling misaligned.' });

    const res = await as(plant.otherAnalyst).post(path, { decision: 'accepted' });

    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({
      error: {
        code: 'conflict',
        message: expect.stringMatching(/^Ada Analyst rejected this flag/) as string,
      },
    });
    const findings = await as(plant.lead).get(plant.path('/findings'));
    expect(findings.body).toMatchObject({ total: 0 });
  });

  it.each(['rejected', 'retake'])('asks for a reason where it is %s', async (decision) => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const res = await buildTestApp(database())
      .as(plant.analyst)
      .post(plant.path(`/screenings/${flag.id}/decision`), { decision, reason: '  ' });
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({
      error: { fields: [{ path: 'reason', message: 'Give a reason.' }] },
    });
  });

  it('starts a new finding once the old one is dismissed', async () => {
    const plant = await buildPlant(database());
    const [first, second] = [await plant.flag('vertical'), await plant.flag('horizontal')];
    const { as } = buildTestApp(database());
    const accept = async (id: number) =>
      (
        await as(plant.analyst).post(plant.path(`/screenings/${id}/decision`), {
          decision: 'accepted',
        })
      ).body as { findingId: number };
    const { findingId } = await accept(first.id);
    await as(plant.lead).post(plant.path(`/findings/${findingId}/decision`), {
      action: 'dismiss',
      reason: 'Resonance of the guard.',
      version: 1,
    });

    expect(await accept(second.id)).toMatchObject({ findingIsNew: true });
    const reopened = await as(plant.lead).post(plant.path(`/findings/${findingId}/decision`), {
      action: 'reopen',
      reason: 'Seen again.',
      version: 2,
    });
    expect(reopened.status).toBe(409);
    expect(reopened.body).toMatchObject({ error: { code: 'wrong_state' } });
  });
});

describe('taking a decision back', () => {
  it('removes the finding that it made, and the flag waits again', async () => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const path = plant.path(`/screenings/${flag.id}/decision`);
    await as(plant.analyst).post(path, { decision: 'accepted' });

    expect((await as(plant.analyst).delete(path)).status).toBe(204);

    expect((await as(plant.lead).get(plant.path('/findings'))).body).toMatchObject({ total: 0 });
    const queue = await as(plant.analyst).get(plant.path('/review-queue'));
    expect(idsOf(queue.body)).toEqual([flag.id]);
  });

  it('leaves the finding that it only extended', async () => {
    const plant = await buildPlant(database());
    const [first, second] = [await plant.flag('vertical'), await plant.flag('horizontal')];
    const { as } = buildTestApp(database());
    for (const { id } of [first, second]) {
      await as(plant.analyst).post(plant.path(`/screenings/${id}/decision`), {
        decision: 'accepted',
      });
    }

    await as(plant.analyst).delete(plant.path(`/screenings/${second.id}/decision`));

    const findings = await as(plant.lead).get(plant.path('/findings'));
    expect(findings.body).toMatchObject({ total: 1, items: [{ screeningCount: 1 }] });
  });

  it('is refused to anybody else', async () => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const path = plant.path(`/screenings/${flag.id}/decision`);
    await as(plant.analyst).post(path, { decision: 'accepted' });

    const res = await as(plant.otherAnalyst).delete(path);

    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({
      error: { message: expect.stringMatching(/Ada Analyst/) as string },
    });
  });

  it('is refused once the lead has acted on the finding', async () => {
    const plant = await buildPlant(database());
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const path = plant.path(`/screenings/${flag.id}/decision`);
    const { findingId } = (await as(plant.analyst).post(path, { decision: 'accepted' })).body as {
      findingId: number;
    };
    await as(plant.lead).post(plant.path(`/findings/${findingId}/decision`), {
      action: 'monitor',
      monitorSurveys: 1,
      reason: 'Until the next survey.',
      version: 1,
    });

    const res = await as(plant.analyst).delete(path);

    expect(res.status).toBe(409);
    expect((await as(plant.lead).get(plant.path(`/findings/${findingId}`))).body).toMatchObject({
      state: 'monitoring',
      screeningCount: 1,
    });
  });
});

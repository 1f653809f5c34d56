import { describe, expect, it } from 'vitest';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();

async function openFinding(plant: Plant) {
  const flag = await plant.flag();
  const res = await buildTestApp(database())
    .as(plant.analyst)
    .post(plant.path(`/screenings/${flag.id}/decision`), {
      decision: 'accepted',
      reason: 'A clear run.',
    });
  return (res.body as { findingId: number }).findingId;
}

const addRecord = (plant: Plant, record: Partial<FitRecord>) =>
  database()
    .getRepository(FitRecord)
    .insert({
      bearingPositionId: plant.position.id,
      seat: 'shaft',
      recordedOn: '2024-05-01',
      source: 'drawing',
      toleranceClass: null,
      seatMeasuredMm: null,
      ringMeasuredMm: null,
      condition: null,
      note: null,
      inspectionId: null,
      recordedByUserId: plant.lead.id,
      createdAt: new Date(),
      ...record,
    });

describe('a finding', () => {
  it('shows what was seen, who accepted it and why', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/findings/${findingId}`));
    expect(res.body).toMatchObject({
      state: 'open',
      machineTag: 'P-101',
      ownerName: 'Oskar Owner',
      screenings: [
        {
          pointLabel: 'P-101/DE/V',
          surveyedOn: '2026-11-02',
          verdict: 'likely',
          speedRpm: 1476,
          decidedByName: 'Ada Analyst',
          decisionReason: 'A clear run.',
        },
      ],
      history: [{ subject: 'finding', fromState: null, toState: 'open' }],
      can: { assign: true, monitor: true, dismiss: true, reopen: false, verify: false },
    });
  });

  it('says that getting the record is the first step where nothing is recorded', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/findings/${findingId}`));
    const { seats } = res.body as FindingResponse;
    expect(seats.seats.map(({ verdict }) => verdict)).toEqual(['not recorded', 'not recorded']);
    expect(seats.seats.map(({ suspicion }) => suspicion)).toEqual([null, null]);
    expect(seats.conclusion).toMatch(/Nothing is recorded of any seat.*first step/);
  });

  it('points to the seat whose measured diameter leaves clearance', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { seat: 'shaft', toleranceClass: 'k5' });
    await addRecord(plant, {
      seat: 'shaft',
      source: 'inspection',
      recordedOn: '2026-01-10',
      seatMeasuredMm: 59.97,
      ringMeasuredMm: 59.996,
      condition: 'creep marks',
    });
    await addRecord(plant, { seat: 'housing', toleranceClass: 'H7' });
    const findingId = await openFinding(plant);
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/findings/${findingId}`));
    const { seats } = res.body as FindingResponse;
    const shaft = seats.seats.find(({ seat }) => seat === 'shaft');
    // ISO 286-2: k5 at 60 mm is +2 to +15 µm (from memory).
    expect(shaft).toMatchObject({
      toleranceClass: 'k5',
      seatLimitsUm: [2, 15],
      verdict: 'looser',
      lastCondition: 'creep marks',
      suspicionRank: 1,
    });
    expect(shaft?.seatLimitsMm).toEqual([60.002, 60.015]);
    expect(shaft?.measuredUm?.value).toBeCloseTo(-26, 6);
    expect(shaft?.chanceOfClearance).toBeGreaterThan(0.95);
    expect(seats.conclusion).toMatch(/The shaft seat of Pump, drive end explains the finding best/);
  });

  it('is 404 for the owner of another machine and for another site', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const elsewhere = await buildSite(database());
    const stranger = await buildMember(database(), elsewhere, 'lead');
    const { as } = buildTestApp(database());
    const status = async (user: { id: number }, path: string) => (await as(user).get(path)).status;

    expect(await status(plant.owner, plant.path(`/findings/${findingId}`))).toBe(200);
    expect(await status(plant.otherOwner, plant.path(`/findings/${findingId}`))).toBe(404);
    expect(await status(stranger, plant.path(`/findings/${findingId}`))).toBe(404);
    expect(await status(stranger, `/api/sites/${elsewhere.id}/findings/${findingId}`)).toBe(404);
    expect((await as(plant.otherOwner).get(plant.path('/findings'))).body).toMatchObject({
      total: 0,
    });
    expect((await as(plant.owner).get(plant.path('/findings'))).body).toMatchObject({ total: 1 });
  });
});

describe('the lead’s decision', () => {
  it('is kept with who, why and what came of it', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await buildTestApp(database())
      .as(plant.lead)
      .post(plant.path(`/findings/${findingId}/decision`), {
        action: 'monitor',
        monitorSurveys: 1,
        reason: 'Low level; look again in December.',
        version: 1,
      });
    expect(res.body).toMatchObject({
      state: 'monitoring',
      version: 2,
      history: [
        { toState: 'open' },
        {
          fromState: 'open',
          toState: 'monitoring',
          reason: 'Low level; look again in December.',
          changedByName: 'Lena Lead',
        },
      ],
    });
  });

  it('is refused where the finding was changed meanwhile', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const more = await plant.flag('horizontal');
    const { as } = buildTestApp(database());
    // New evidence after the lead has opened the page.
    await as(plant.analyst).post(plant.path(`/screenings/${more.id}/decision`), {
      decision: 'accepted',
    });

    const res = await as(plant.lead).post(plant.path(`/findings/${findingId}/decision`), {
      action: 'dismiss',
      reason: 'Resonance.',
      version: 1,
    });

    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({ error: { code: 'conflict' } });
  });

  it('is taken from one of two leads who decide at once', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const lead = buildTestApp(database()).as(plant.lead);
    const decide = (action: string) =>
      lead.post(plant.path(`/findings/${findingId}/decision`), {
        action,
        reason: 'Decided.',
        version: 1,
      });
    const answers = await Promise.all([decide('dismiss'), decide('dismiss')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is refused in a state that does not allow it, in words', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await buildTestApp(database())
      .as(plant.lead)
      .post(plant.path(`/findings/${findingId}/decision`), {
        action: 'verify',
        reason: 'Gone.',
        version: 1,
      });
    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({
      error: { code: 'wrong_state', message: "A finding that is open can't be verified." },
    });
  });

  it('is the lead’s alone', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const { as, signedOut } = buildTestApp(database());
    const path = plant.path(`/findings/${findingId}/decision`);
    const body = { action: 'dismiss', reason: 'No.', version: 1 };
    expect((await as(plant.analyst).post(path, body)).status).toBe(403);
    expect((await as(plant.owner).post(path, body)).status).toBe(403);
    expect((await signedOut.post(path, body)).status).toBe(401);
  });
});

import { describe, expect, it } from 'vitest';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { buildPosition } from '#tests/support/factories.ts';
import { buildPlant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();

describe('the seats of a bearing position', () => {
  it('take their sizes from the designation where none is recorded', async () => {
    const plant = await buildPlant(database());
    const position = await buildPosition(database(), plant.machine, {
      designation: '6312',
      boreMm: null,
      outsideMm: null,
      widthMm: null,
    });
    const res = await buildTestApp(database())
      .as(plant.analyst)
      .get(plant.path(`/positions/${position.id}/seats`));
    const { seats } = res.body as SeatAssessmentsResponse;
    // ISO 15: 6312 is 60 × 130 × 31 (from memory).
    expect(seats.map(({ seat, nominalMm }) => [seat, nominalMm])).toEqual([
      ['shaft', 60],
      ['housing', 130],
    ]);
    expect(seats.map(({ suspicionRank }) => suspicionRank)).toEqual([null, null]);
  });

  it('combine the drawing’s class with a later measurement and condition', async () => {
    const plant = await buildPlant(database());
    const record = {
      bearingPositionId: plant.position.id,
      seat: 'housing',
      toleranceClass: null,
      seatMeasuredMm: null,
      ringMeasuredMm: null,
      condition: null,
      note: null,
      inspectionId: null,
      recordedByUserId: plant.lead.id,
      createdAt: new Date(),
    } as const;
    const records = database().getRepository(FitRecord);
    await records.insert({
      ...record,
      recordedOn: '2020-01-01',
      source: 'drawing',
      toleranceClass: 'H7',
    });
    await records.insert({
      ...record,
      recordedOn: '2025-06-01',
      source: 'inspection',
      seatMeasuredMm: 130.055,
      condition: 'fretting corrosion',
    });
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/positions/${plant.position.id}/seats`));
    const housing = (res.body as SeatAssessmentsResponse).seats.find(
      ({ seat }) => seat === 'housing',
    );
    // ISO 286-2: H7 at 130 mm is 0 to +40 µm (from memory).
    expect(housing).toMatchObject({
      toleranceClass: 'H7',
      seatLimitsUm: [0, 40],
      verdict: 'looser',
      outsideLimitsUm: 15,
      lastCondition: 'fretting corrosion',
      lastRecordedOn: '2025-06-01',
    });
  });

  it('say that a plain bearing has none', async () => {
    const plant = await buildPlant(database());
    const plain = await buildPosition(database(), plant.machine, {
      kind: 'plain',
      designation: null,
    });
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/positions/${plain.id}/seats`));
    expect(res.body).toMatchObject({
      seats: [],
      conclusion: expect.stringMatching(/plain bearing has no seats/) as string,
    });
  });

  it('tell a contradiction in the register instead of failing', async () => {
    const plant = await buildPlant(database());
    const wrong = await buildPosition(database(), plant.machine, {
      designation: '6312',
      boreMm: 65,
    });
    const res = await buildTestApp(database())
      .as(plant.lead)
      .get(plant.path(`/positions/${wrong.id}/seats`));
    expect(res.status).toBe(200);
    expect((res.body as SeatAssessmentsResponse).conclusion).toMatch(
      /register contradicts itself.*65 mm.*first step/,
    );
  });

  it('are not shown to the owner of another machine', async () => {
    const plant = await buildPlant(database());
    const path = plant.path(`/positions/${plant.position.id}/seats`);
    const { as } = buildTestApp(database());
    expect((await as(plant.owner).get(path)).status).toBe(200);
    expect((await as(plant.otherOwner).get(path)).status).toBe(404);
  });
});

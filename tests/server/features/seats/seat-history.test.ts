import { describe, expect, it } from 'vitest';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { ReportedSeat } from '#shared/contracts/inspection.ts';
import type { SeatHistoryResponse } from '#shared/contracts/seat-history.ts';
import { buildPosition } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();

async function addRecord(plant: Plant, record: Partial<FitRecord>) {
  const saved = await database()
    .getRepository(FitRecord)
    .save({
      bearingPositionId: plant.position.id,
      seat: 'shaft',
      recordedOn: '2020-05-01',
      source: 'mounting',
      recordedByUserId: plant.lead.id,
      createdAt: new Date(),
      ...record,
    });
  return saved.id;
}

const directions = [0, 45, 90, 135] as const;
/** A shaft of two planes: 60.002 to 60.008 mm near the shoulder, 60.000 mm near the end. */
const reportedShaft: ReportedSeat = {
  seat: 'shaft',
  stage: 'as found',
  condition: 'fretting corrosion',
  readings: directions.flatMap((directionDeg, index) => [
    { part: 'seat' as const, plane: 1 as const, directionDeg, diameterMm: 60.002 + index * 0.002 },
    { part: 'seat' as const, plane: 2 as const, directionDeg, diameterMm: 60 },
  ]),
};

/** A finding with the inspection that reported on it. */
async function addInspection(plant: Plant) {
  const finding = await database()
    .getRepository(Finding)
    .save({
      siteId: plant.site.id,
      bearingPositionId: plant.position.id,
      state: 'repaired',
      openedAt: new Date('2024-04-02T08:00:00Z'),
      version: 1,
    });
  const inspection = await database()
    .getRepository(Inspection)
    .save({
      findingId: finding.id,
      state: 'reported',
      assigneeUserId: plant.owner.id,
      assignedByUserId: plant.lead.id,
      assignedAt: new Date('2024-04-10T08:00:00Z'),
      dueOn: '2024-05-10',
      checkShaftSeat: true,
      checkHousingSeat: false,
      checkInPlace: false,
      workOrderReference: null,
      instructions: null,
      report: {
        cautionsRead: true,
        outcome: 'loose',
        seats: [reportedShaft],
        inPlaceResult: null,
        inPlaceChecks: [],
        causeInPlace: false,
        workDone: 'Shaft sprayed and ground.',
        repaired: true,
      } as never,
      reportedAt: new Date('2024-05-01T10:00:00Z'),
      version: 3,
    });
  return { findingId: finding.id, inspectionId: inspection.id };
}

async function historyOf(plant: Plant, seat: 'shaft' | 'housing' = 'shaft') {
  const res = await buildTestApp(database())
    .as(plant.lead)
    .get(plant.path(`/positions/${plant.position.id}/seats/${seat}/history`));
  expect(res.status).toBe(200);
  return res.body as SeatHistoryResponse;
}

describe('the history of a seat', () => {
  it('puts its records in line with the findings and inspections of the position', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { recordedOn: '2019-01-01', source: 'drawing', toleranceClass: 'k5' });
    await addRecord(plant, { seat: 'housing', toleranceClass: 'H7' });
    const { inspectionId, findingId } = await addInspection(plant);
    await addRecord(plant, {
      recordedOn: '2024-05-01',
      source: 'inspection',
      stage: 'as found',
      inspectionId,
      seatMeasuredMm: 60.0025,
      condition: 'fretting corrosion',
    });
    const { entries } = await historyOf(plant);
    expect(entries.map(({ kind, on }) => [on, kind])).toEqual([
      ['2024-05-01', 'record'],
      ['2024-05-01', 'inspection'],
      ['2024-04-02', 'finding'],
      ['2019-01-01', 'record'],
    ]);
    expect(entries[0]).toMatchObject({
      corrected: false,
      record: {
        source: 'inspection',
        condition: 'fretting corrosion',
        recordedByName: 'Lena Lead',
      },
    });
    expect(entries[1]).toMatchObject({ inspectionId, outcome: 'loose', checksThisSeat: true });
    expect(entries[2]).toMatchObject({ findingId, state: 'repaired' });
  });

  it('shows taper and out-of-roundness of the readings, by plane', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await addInspection(plant);
    await addRecord(plant, {
      recordedOn: '2024-05-01',
      source: 'inspection',
      stage: 'as found',
      inspectionId,
      seatMeasuredMm: 60.0025,
    });
    const { entries } = await historyOf(plant);
    const record = entries.find(({ kind }) => kind === 'record');
    const [figures] = record?.kind === 'record' ? record.figures : [];
    // By hand: plane 1 means 60.005 and is 6 µm out of round, plane 2 is round at 60.000.
    expect(figures?.planes.map(({ plane, readingCount }) => [plane, readingCount])).toEqual([
      [1, 4],
      [2, 4],
    ]);
    expect(figures?.planes[0]?.meanMm).toBeCloseTo(60.005, 9);
    expect(figures?.planes[0]?.outOfRoundnessUm).toBeCloseTo(6, 6);
    expect(figures?.planes[1]?.outOfRoundnessUm).toBeCloseTo(0, 6);
    expect(figures?.taperUm).toBeCloseTo(5, 6);
  });

  it('tells wear between two measurements, and work from wear', async () => {
    const plant = await buildPlant(database());
    const made = await addRecord(plant, { recordedOn: '2020-05-01', seatMeasuredMm: 60.012 });
    const found = await addRecord(plant, { recordedOn: '2024-05-01', seatMeasuredMm: 59.992 });
    const left = await addRecord(plant, {
      recordedOn: '2024-05-01',
      source: 'inspection',
      inspectionId: (await addInspection(plant)).inspectionId,
      stage: 'as left',
      seatMeasuredMm: 60.01,
    });
    const { wear } = await historyOf(plant);
    expect(wear.map((step) => [step.fromRecordId, step.toRecordId, step.isWork])).toEqual([
      [found, left, true],
      [made, found, false],
    ]);
    // By hand: 20 µm in 1461 days, 4 years of 365.25; U = 2·√(2² + 2²).
    expect(wear[1]?.lossUm).toBeCloseTo(20, 9);
    expect(wear[1]?.perYearUm).toBeCloseTo(5, 9);
    expect(wear[1]?.expandedUncertaintyUm).toBeCloseTo(5.657, 3);
    expect(wear[1]).toMatchObject({ isSignificant: true });
    expect(wear[0]).toMatchObject({ perYearUm: null });
  });

  it('keeps a corrected record in sight and takes no wear from it', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { recordedOn: '2020-05-01', seatMeasuredMm: 60.012 });
    await addRecord(plant, { recordedOn: '2024-05-01', seatMeasuredMm: 59.9 });
    await addRecord(plant, { recordedOn: '2024-05-01', seatMeasuredMm: 60.002 });
    const { entries, wear } = await historyOf(plant);
    expect(entries.map((entry) => entry.kind === 'record' && entry.corrected)).toEqual([
      false,
      true,
      false,
    ]);
    expect(wear).toHaveLength(1);
    expect(wear[0]?.lossUm).toBeCloseTo(10, 9);
  });

  it('says how to measure the seat', async () => {
    const plant = await buildPlant(database());
    const { plan, nominalMm } = await historyOf(plant, 'housing');
    expect(nominalMm).toBe(130);
    // A quarter of the width of 31 mm from either side (common practice, no source).
    expect(plan).toMatchObject({ planesMm: [7.75, 23.25], directionsDeg: [0, 45, 90, 135] });
  });

  it('is not told of a plain bearing, of an unknown seat or to strangers', async () => {
    const plant = await buildPlant(database());
    const plain = await buildPosition(database(), plant.machine, { kind: 'plain' });
    const { as } = buildTestApp(database());
    const status = async (user: { id: number }, positionId: number, seat: string) =>
      (await as(user).get(plant.path(`/positions/${positionId}/seats/${seat}/history`))).status;
    expect(await status(plant.lead, plain.id, 'shaft')).toBe(404);
    expect(await status(plant.lead, plant.position.id, 'pedestal')).toBe(404);
    expect(await status(plant.otherOwner, plant.position.id, 'shaft')).toBe(404);
    expect(await status(plant.owner, plant.position.id, 'shaft')).toBe(200);
  });
});

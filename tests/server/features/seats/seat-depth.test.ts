import { describe, expect, it } from 'vitest';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { buildPoint, buildPosition } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import {
  aScreeningResult,
  buildScreening,
  buildWaveform,
} from '#tests/support/screening-factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();

const addRecord = (plant: Plant, record: Partial<FitRecord>) =>
  database()
    .getRepository(FitRecord)
    .insert({
      bearingPositionId: plant.position.id,
      seat: 'shaft',
      recordedOn: '2024-05-01',
      source: 'drawing',
      recordedByUserId: plant.lead.id,
      createdAt: new Date(),
      ...record,
    });

async function seatsOf(plant: Plant, positionId = plant.position.id) {
  const res = await buildTestApp(database())
    .as(plant.lead)
    .get(plant.path(`/positions/${positionId}/seats`));
  expect(res.status).toBe(200);
  return res.body as SeatAssessmentsResponse;
}

const seatOf = (answer: SeatAssessmentsResponse, name: 'shaft' | 'housing') => {
  const seat = answer.seats.find(({ seat }) => seat === name);
  if (seat === undefined) throw new Error(`The answer has no ${name} seat.`);
  return seat;
};

const addFinding = (plant: Plant, finding: Partial<Finding> = {}) =>
  database()
    .getRepository(Finding)
    .insert({
      siteId: plant.site.id,
      bearingPositionId: plant.position.id,
      state: 'monitoring',
      openedAt: new Date('2025-06-01T08:00:00Z'),
      version: 1,
      ...finding,
    });

const change = (plant: Plant, changes: Partial<BearingPosition>) =>
  database().getRepository(BearingPosition).update({ id: plant.position.id }, changes);

describe('a tapered seat', () => {
  it('is judged by its drive-up, not by an interference', async () => {
    const plant = await buildPlant(database());
    const sleeve = await buildPosition(database(), plant.machine, {
      designation: '22220',
      bearingType: 'spherical roller',
      boreMm: 100,
      outsideMm: 180,
      widthMm: 46,
      shaftSeatForm: 'adapter sleeve',
      seatTaper: '1:12',
    });
    expect(seatOf(await seatsOf(plant, sleeve.id), 'shaft')).toMatchObject({
      verdict: 'not recorded',
      sentence: expect.stringMatching(/judged by drive-up.*neither is recorded/) as string,
    });
    await addRecord(plant, { bearingPositionId: sleeve.id, source: 'mounting', driveUpMm: 0.5 });
    // A bearing maker's mounting card: 0.66 to 0.79 mm for 80 to 100 mm, 1:12 (one source).
    expect(seatOf(await seatsOf(plant, sleeve.id), 'shaft')).toMatchObject({
      verdict: 'looser',
      interferenceUm: null,
      sentence: expect.stringMatching(/driven up 0.5 mm/) as string,
    });
  });
});

describe('a seat that is bonded on purpose', () => {
  it('gets no chance of clearance and says why', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { toleranceClass: 'g6' });
    const loose = seatOf(await seatsOf(plant), 'shaft');
    expect(loose.chanceOfClearance).toBeGreaterThan(0.9);
    await addRecord(plant, { recordedOn: '2024-06-01', source: 'mounting', bonding: 'bonded' });
    const bonded = seatOf(await seatsOf(plant), 'shaft');
    expect(bonded.chanceOfClearance).toBeNull();
    expect(bonded.sentence).toMatch(/bonded with adhesive on purpose/);
  });
});

describe('an earlier finding of the position', () => {
  const drawnSeat = (plant: Plant) => addRecord(plant, { toleranceClass: 'k5' });
  const chanceOf = async (plant: Plant) =>
    seatOf(await seatsOf(plant), 'shaft').chanceOfClearance ?? NaN;

  it('raises the chance of clearance until it is repaired', async () => {
    const plant = await buildPlant(database());
    await drawnSeat(plant);
    const before = await chanceOf(plant);
    await addFinding(plant, { state: 'verified' });
    expect(await chanceOf(plant)).toBeCloseTo(before, 6);
    await addFinding(plant);
    expect(await chanceOf(plant)).toBeGreaterThan(before + 0.1);
  });

  it('counts no more once the seat was measured after it', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { recordedOn: '2025-07-01', seatMeasuredMm: 59.995 });
    const before = await chanceOf(plant);
    await addFinding(plant);
    expect(await chanceOf(plant)).toBeCloseTo(before, 6);
  });

  it('is not the finding at hand', async () => {
    const plant = await buildPlant(database());
    await drawnSeat(plant);
    const before = await chanceOf(plant);
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const accepted = await as(plant.analyst).post(plant.path(`/screenings/${flag.id}/decision`), {
      decision: 'accepted',
      reason: 'A clear run.',
    });
    const { findingId } = accepted.body as { findingId: number };
    const res = await as(plant.lead).get(plant.path(`/findings/${findingId}`));
    const { seats } = res.body as FindingResponse;
    expect(seatOf(seats, 'shaft').chanceOfClearance).toBeCloseTo(before, 6);
    // On the position's own page the open finding does count.
    expect(await chanceOf(plant)).toBeGreaterThan(before);
  });
});

describe('hollow shafts and thin housings', () => {
  it('leave more of the internal clearance than solid ones', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { toleranceClass: 'm5' });
    await addRecord(plant, { seat: 'housing', toleranceClass: 'N7' });
    const mounted = async () => (await seatsOf(plant)).internalClearanceUm?.mounted?.mean ?? NaN;
    const solid = await mounted();
    await change(plant, { shaftBoreMm: 40 });
    const hollow = await mounted();
    await change(plant, { housingWallMm: 8 });
    expect(hollow).toBeGreaterThan(solid + 1);
    expect(await mounted()).toBeGreaterThan(hollow + 0.5);
  });

  it('show the interference that the radial load needs', async () => {
    const plant = await buildPlant(database());
    await addRecord(plant, { toleranceClass: 'k5' });
    expect(seatOf(await seatsOf(plant), 'shaft').neededUm).toBeNull();
    await change(plant, { radialLoadN: 10_000 });
    // 0.08·√(d·Fr/B) = 0.08·√(60·10000/31), by hand.
    expect(seatOf(await seatsOf(plant), 'shaft').neededUm).toBeCloseTo(11.13, 2);
  });
});

describe('the level at the neighbouring position', () => {
  it('moves suspicion towards the louder of the two', async () => {
    const plant = await buildPlant(database());
    const neighbour = await buildPosition(database(), plant.machine, { code: 'NDE', sequence: 1 });
    for (const bearingPositionId of [plant.position.id, neighbour.id]) {
      await addRecord(plant, { bearingPositionId, toleranceClass: 'k5' });
      await addRecord(plant, { bearingPositionId, seat: 'housing', toleranceClass: 'H7' });
    }
    const flag = await plant.flag();
    const { as } = buildTestApp(database());
    const accepted = await as(plant.analyst).post(plant.path(`/screenings/${flag.id}/decision`), {
      decision: 'accepted',
      reason: 'A clear run.',
    });
    const { findingId } = accepted.body as { findingId: number };
    const neighbours = async () => {
      const res = await as(plant.lead).get(plant.path(`/findings/${findingId}`));
      const { seats } = res.body as FindingResponse;
      return seats.neighbours.reduce((sum, { suspicion }) => sum + (suspicion ?? 0), 0);
    };
    const unmeasured = await neighbours();
    const point = await buildPoint(database(), neighbour);
    const waveform = await buildWaveform(database(), {
      surveyId: plant.survey.id,
      measuringPointId: point.id,
      uploadedByUserId: plant.analyst.id,
    });
    const result = aScreeningResult();
    await buildScreening(database(), waveform, {
      ...result,
      orders: result.orders.map((line) => ({
        ...line,
        velocityMmPerSRms: line.velocityMmPerSRms * 3,
      })),
    });
    expect(await neighbours()).toBeGreaterThan(unmeasured * 1.5);
  });
});

import { describe, expect, it } from 'vitest';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { buildPlant } from '#tests/support/plant.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from './inspection-story.ts';

const database = useTestDatabase();
const { app, accepted, report, stateOf, mails } = inspectionStory(database);

describe('reporting an inspection', () => {
  it('writes a fit record of the mean, moves the finding and tells the lead', async () => {
    const plant = await buildPlant(database());
    const { findingId, inspectionId } = await accepted(plant);

    const res = await report(plant, inspectionId, aReport());

    expect(res.body).toMatchObject({ state: 'reported', report: { outcome: 'loose' } });
    expect(await stateOf(plant, findingId)).toBe('repaired');
    const records = await database().getRepository(FitRecord).find();
    expect(records).toMatchObject([
      {
        seat: 'shaft',
        source: 'inspection',
        inspectionId,
        seatMeasuredMm: 59.973,
        ringMeasuredMm: null,
        condition: 'creep marks',
        recordedByUserId: plant.owner.id,
      },
    ]);
    expect((await mails()).at(-1)).toMatchObject({
      toAddress: plant.lead.email,
      subject: expect.stringMatching(/found loose/) as string,
    });
  });

  it('lets the seat as left be the newer word', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const [found] = aReport().seats;
    if (found === undefined) throw new Error('the report has a seat');
    const left = {
      ...found,
      stage: 'as left' as const,
      condition: 'sound' as const,
      readings: [
        { part: 'seat' as const, plane: 1 as const, directionDeg: 0 as const, diameterMm: 60.009 },
      ],
    };

    const res = await report(plant, inspectionId, aReport({ seats: [left, found] }));

    const { seats } = (res.body as InspectionResponse).seats;
    expect(seats.find(({ seat }) => seat === 'shaft')).toMatchObject({ lastCondition: 'sound' });
    const records = await database()
      .getRepository(FitRecord)
      .find({ order: { id: 'ASC' } });
    expect(records.map(({ seatMeasuredMm }) => seatMeasuredMm)).toEqual([59.973, 60.009]);
  });

  it.each([
    ['repaired', { repaired: true, outcome: 'loose' }, 'repaired'],
    ['found sound', { repaired: false, outcome: 'not loose' }, 'monitoring'],
    ['found loose and left', { repaired: false, outcome: 'loose' }, 'open'],
    ['not clear', { repaired: false, outcome: 'not clear' }, 'open'],
  ] as const)('leaves the finding right where the fit was %s', async (_what, told, state) => {
    const plant = await buildPlant(database());
    const { findingId, inspectionId } = await accepted(plant);
    await report(plant, inspectionId, aReport(told));
    expect(await stateOf(plant, findingId)).toBe(state);
  });

  it('refuses a reading in inches at its field and changes nothing', async () => {
    const plant = await buildPlant(database());
    const { findingId, inspectionId } = await accepted(plant);
    const [seat] = aReport().seats;
    const inches = {
      ...seat,
      readings: [{ part: 'seat', plane: 1, directionDeg: 0, diameterMm: 2.361 }],
    };
    const res = await report(plant, inspectionId, { ...aReport(), seats: [inches] });
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({
      error: {
        fields: [
          {
            path: 'report.seats.0.readings.0.diameterMm',
            message: expect.stringMatching(/inches/) as string,
          },
        ],
      },
    });
    expect(await stateOf(plant, findingId)).toBe('inspecting');
    expect(await database().getRepository(FitRecord).count()).toBe(0);
  });

  it('keeps the checks in place, each once and with readings where there is one', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const movement = {
      check: 'movement across the joint' as const,
      finding: 'fault' as const,
      reading: 0.8,
      readingAbove: 2.9,
      note: null,
    };
    const send = (inPlaceChecks: unknown[]) =>
      report(plant, inspectionId, {
        ...aReport(),
        seats: [],
        causeInPlace: true,
        inPlaceChecks,
      });
    expect((await send([movement, movement])).status).toBe(422);
    const withReading = { ...movement, check: 'grout', readingAbove: null };
    expect((await send([withReading])).status).toBe(422);
    const res = await send([movement]);
    expect(res.status).toBe(200);
    expect(res.body).toMatchObject({
      report: { seats: [], causeInPlace: true, inPlaceChecks: [movement] },
    });
  });

  it('is refused until the cautions are ticked', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const res = await report(plant, inspectionId, { ...aReport(), cautionsRead: false });
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({ error: { fields: [{ path: 'report.cautionsRead' }] } });
  });

  it('happens once where it is sent twice at the same moment', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const answers = await Promise.all([
      report(plant, inspectionId, aReport()),
      report(plant, inspectionId, aReport()),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await database().getRepository(FitRecord).count()).toBe(1);
  });

  it('is told of a cancelling meanwhile', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    await app()
      .as(plant.lead)
      .post(plant.path(`/inspections/${inspectionId}/cancel`), { version: 2, reason: 'Not now.' });
    const res = await report(plant, inspectionId, aReport());
    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({ error: { code: 'conflict' } });
  });

  it('is the assigned owner’s alone', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    expect((await report(plant, inspectionId, aReport(), plant.lead)).status).toBe(403);
    expect((await report(plant, inspectionId, aReport(), plant.otherOwner)).status).toBe(404);
  });
});

describe('closing an inspection', () => {
  it('is the lead’s, after the report; the whole story stands in the finding’s history', async () => {
    const plant = await buildPlant(database());
    const { findingId, inspectionId } = await accepted(plant);
    const lead = app().as(plant.lead);
    const close = (version: number) =>
      lead.post(plant.path(`/inspections/${inspectionId}/close`), { version });
    expect((await close(2)).status).toBe(409);
    await report(plant, inspectionId, aReport());

    expect((await close(3)).body).toMatchObject({ state: 'closed', can: { close: false } });

    const verified = await lead.post(plant.path(`/findings/${findingId}/decision`), {
      action: 'verify',
      reason: 'The December survey shows no run.',
      version: 3,
    });
    expect(
      (verified.body as { history: { subject: string; toState: string }[] }).history.map(
        ({ subject, toState }) => `${subject} ${toState}`,
      ),
    ).toEqual([
      'finding open',
      'finding inspecting',
      'inspection assigned',
      'inspection accepted',
      'inspection reported',
      'finding repaired',
      'inspection closed',
      'finding verified',
    ]);
  });
});

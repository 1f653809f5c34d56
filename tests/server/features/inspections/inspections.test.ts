import { describe, expect, it } from 'vitest';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import type { AssignInspectionRequest } from '#shared/contracts/finding.ts';
import type { InspectionReport, InspectionResponse } from '#shared/contracts/inspection.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp, testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const database = useTestDatabase();
const app = () => buildTestApp(database());

async function openFinding(plant: Plant): Promise<number> {
  const flag = await plant.flag();
  const res = await app()
    .as(plant.analyst)
    .post(plant.path(`/screenings/${flag.id}/decision`), { decision: 'accepted' });
  return (res.body as { findingId: number }).findingId;
}

const aTask = (plant: Plant, overrides: Partial<AssignInspectionRequest> = {}) => ({
  assigneeUserId: plant.owner.id,
  dueOn: '2099-12-01',
  checkShaftSeat: true,
  checkHousingSeat: false,
  checkInPlace: false,
  workOrderReference: 'WO-4711',
  instructions: 'Take the coupling <off> first.',
  version: 1,
  ...overrides,
});

const assign = (
  plant: Plant,
  findingId: number,
  overrides: Partial<AssignInspectionRequest> = {},
) =>
  app()
    .as(plant.lead)
    .post(plant.path(`/findings/${findingId}/inspections`), aTask(plant, overrides));

async function assigned(plant: Plant) {
  const findingId = await openFinding(plant);
  const res = await assign(plant, findingId);
  return { findingId, inspectionId: (res.body as InspectionResponse).id };
}

async function accepted(plant: Plant) {
  const task = await assigned(plant);
  await app()
    .as(plant.owner)
    .post(plant.path(`/inspections/${task.inspectionId}/accept`), { version: 1 });
  return task;
}

const aReport = (overrides: Partial<InspectionReport> = {}): InspectionReport => ({
  cautionsRead: true,
  outcome: 'loose',
  seats: [
    {
      seat: 'shaft',
      stage: 'as found',
      condition: 'creep marks',
      readings: [
        { part: 'seat', plane: 1, directionDeg: 0, diameterMm: 59.97 },
        { part: 'seat', plane: 1, directionDeg: 90, diameterMm: 59.974 },
        { part: 'seat', plane: 2, directionDeg: 0, diameterMm: 59.975 },
      ],
    },
  ],
  inPlaceResult: null,
  workDone: 'Sleeve fitted, new bearing mounted.',
  repaired: true,
  ...overrides,
});

const report = (plant: Plant, inspectionId: number, body: object, user = plant.owner) =>
  app()
    .as(user)
    .post(plant.path(`/inspections/${inspectionId}/report`), { version: 2, report: body });

const stateOf = async (plant: Plant, findingId: number) =>
  (
    (
      await app()
        .as(plant.lead)
        .get(plant.path(`/findings/${findingId}`))
    ).body as {
      state: string;
    }
  ).state;

const mails = () =>
  database()
    .getRepository(OutboxMail)
    .find({ order: { id: 'ASC' } });

describe('assigning an inspection', () => {
  it('moves the finding and writes one e-mail with link, seats, due date and cautions', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);

    const res = await assign(plant, findingId);

    expect(res.status).toBe(201);
    const inspection = res.body as InspectionResponse;
    expect(inspection).toMatchObject({
      state: 'assigned',
      assigneeName: 'Oskar Owner',
      assignedByName: 'Lena Lead',
      dueOn: '2099-12-01',
      overdue: false,
      summary: expect.stringMatching(/6 multiples of the running speed/) as string,
    });
    expect(await stateOf(plant, findingId)).toBe('inspecting');
    const [mail, ...others] = await mails();
    expect(others).toEqual([]);
    expect(mail).toMatchObject({ toAddress: plant.owner.email, state: 'waiting' });
    const link = `${testPublicUrl}/sites/${plant.site.id}/inspections/${inspection.id}`;
    for (const text of [
      link,
      'P-101',
      'Pump, drive end',
      '2099-12-01',
      'WO-4711',
      'shaft seat: shaft and inner ring',
      'lock it out and prove it dead',
      'open flame',
    ]) {
      expect(mail?.textBody).toContain(text);
    }
    expect(mail?.htmlBody).toContain(`href="${link}"`);
    expect(mail?.htmlBody).toContain('Take the coupling &lt;off&gt; first.');
  });

  it('leaves no e-mail and no inspection behind where the finding has moved on', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const answers = await Promise.all([assign(plant, findingId), assign(plant, findingId)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    expect(await mails()).toHaveLength(1);
    const list = await app().as(plant.lead).get(plant.path('/inspections'));
    expect(list.body).toMatchObject({ total: 1 });
  });

  it.each([
    ['a due date in the past', { dueOn: '2020-01-01' }, 'dueOn'],
    ['nothing to check', { checkShaftSeat: false }, 'checkShaftSeat'],
  ])('refuses %s at its field', async (_what, overrides, path) => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await assign(plant, findingId, overrides);
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({ error: { fields: [{ path }] } });
    expect(await stateOf(plant, findingId)).toBe('open');
  });

  it('refuses somebody who is no asset owner of the site', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await assign(plant, findingId, { assigneeUserId: plant.analyst.id });
    expect(res.body).toMatchObject({ error: { fields: [{ path: 'assigneeUserId' }] } });
  });

  it('is the lead’s alone', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const path = plant.path(`/findings/${findingId}/inspections`);
    expect((await app().as(plant.analyst).post(path, aTask(plant))).status).toBe(403);
    expect((await app().as(plant.owner).post(path, aTask(plant))).status).toBe(403);
  });
});

describe('an assigned inspection', () => {
  it('is seen by its owner, the lead and the analyst, not by another owner', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const path = plant.path(`/inspections/${inspectionId}`);
    const status = async (user: { id: number }) => (await app().as(user).get(path)).status;
    expect(await status(plant.owner)).toBe(200);
    expect(await status(plant.lead)).toBe(200);
    expect(await status(plant.analyst)).toBe(200);
    expect(await status(plant.otherOwner)).toBe(404);
    const list = await app().as(plant.otherOwner).get(plant.path('/inspections'));
    expect(list.body).toMatchObject({ total: 0 });
  });

  it('shows its task, but not the finding, to an owner who stands in for another', async () => {
    const plant = await buildPlant(database());
    const findingId = await openFinding(plant);
    const res = await assign(plant, findingId, { assigneeUserId: plant.otherOwner.id });
    const { id } = res.body as InspectionResponse;
    const task = await app()
      .as(plant.otherOwner)
      .get(plant.path(`/inspections/${id}`));
    expect(task.body).toMatchObject({ can: { accept: true, seeFinding: false } });
    const machineOwner = await app()
      .as(plant.owner)
      .get(plant.path(`/inspections/${id}`));
    expect(machineOwner.body).toMatchObject({ can: { accept: false, seeFinding: true } });
    const accept = await app()
      .as(plant.owner)
      .post(plant.path(`/inspections/${id}/accept`), { version: 1 });
    expect(accept.status).toBe(403);
  });

  it('has to be accepted before it is reported', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const res = await app()
      .as(plant.owner)
      .post(plant.path(`/inspections/${inspectionId}/report`), { version: 1, report: aReport() });
    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({
      error: { message: 'Accept the inspection before reporting it.' },
    });
  });

  it('is cancelled by the lead with a reason; the finding opens again and the owner is told', async () => {
    const plant = await buildPlant(database());
    const { findingId, inspectionId } = await assigned(plant);
    const lead = app().as(plant.lead);
    const path = plant.path(`/inspections/${inspectionId}/cancel`);
    expect((await lead.post(path, { version: 1 })).status).toBe(422);
    const res = await lead.post(path, { version: 1, reason: 'The machine is scrapped.' });
    expect(res.body).toMatchObject({ state: 'cancelled' });
    expect(await stateOf(plant, findingId)).toBe('open');
    expect((await mails()).at(-1)).toMatchObject({
      toAddress: plant.owner.email,
      subject: expect.stringMatching(/cancelled/) as string,
    });
  });
});

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

import { describe, expect, it } from 'vitest';
import type { DeskResponse } from '#shared/contracts/desk.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { buildMachine } from '#tests/support/factories.ts';
import { openMailbox } from '#tests/support/mailbox.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const { app, assigned, accepted, report } = inspectionStory(database);

const deskOf = async (plant: Plant) =>
  (await app().as(plant.lead).get(plant.path('/desk'))).body as DeskResponse;

const change = (plant: Plant, inspectionId: number, what: string, body: object = {}) =>
  app()
    .as(plant.lead)
    .post(plant.path(`/inspections/${inspectionId}/${what}`), body);

const handOn = (plant: Plant, version: number) => ({
  version,
  assigneeUserId: plant.otherOwner.id,
  dueOn: '2099-12-15',
  reason: 'Oskar is away.',
});

const told = async () => {
  const mailbox = await openMailbox(database());
  return (await mailbox.received()).map(({ toAddress, subject }) => `${toAddress}: ${subject}`);
};

describe('the desk', () => {
  it('shows the board by state, the load of every owner and the machines without one', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    await database()
      .getRepository(Inspection)
      .update({ id: inspectionId }, { dueOn: '2020-01-01' });
    await buildMachine(database(), plant.site, { tag: 'Z-1', ownerUserId: null });
    const desk = await deskOf(plant);
    expect(desk.columns.map(({ state, total }) => `${state} ${total}`)).toEqual([
      'assigned 1',
      'accepted 0',
      'reported 0',
      'closed 0',
      'cancelled 0',
    ]);
    expect(desk.columns[0]?.items[0]).toMatchObject({
      id: inspectionId,
      overdue: true,
      workOrderReference: 'WO-4711',
      version: 1,
    });
    const load = desk.owners.map(
      ({ name, machineCount, openCount, overdueCount }) =>
        `${name}: ${machineCount} machines, ${openCount} open, ${overdueCount} overdue`,
    );
    expect(load).toEqual([
      'Olga Owner: 0 machines, 0 open, 0 overdue',
      'Oskar Owner: 1 machines, 1 open, 1 overdue',
    ]);
    expect(desk.machinesWithoutOwner).toMatchObject({ total: 1, machines: [{ tag: 'Z-1' }] });
  });

  it('shows nothing of another site', async () => {
    const plant = await buildPlant(database());
    await assigned(plant);
    const other = await buildPlant(database());
    const desk = await deskOf(other);
    expect(desk.columns.map(({ total }) => total)).toEqual([0, 0, 0, 0, 0]);
    expect(desk.owners.map(({ openCount }) => openCount)).toEqual([0, 0]);
  });
});

describe('reassigning', () => {
  it('gives the task to the other owner, who accepts it anew, and tells both', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    await told();
    expect((await change(plant, inspectionId, 'reassign', handOn(plant, 2))).status).toBe(204);
    const task = await app()
      .as(plant.otherOwner)
      .get(plant.path(`/inspections/${inspectionId}`));
    expect(task.body).toMatchObject({
      state: 'assigned',
      dueOn: '2099-12-15',
      can: { accept: true },
    });
    const mails = (await told()).slice(1);
    expect(mails).toEqual([
      `${plant.otherOwner.email}: Fit inspection of P-101 Circulation pump, Pump, drive end: due 2099-12-15`,
      `${plant.owner.email}: Inspection of P-101 Circulation pump, Pump, drive end now with Olga Owner`,
    ]);
  });

  it('refuses the report of the former owner, who was filling it in, and names the new one', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    await change(plant, inspectionId, 'reassign', handOn(plant, 2));
    const answer = await report(plant, inspectionId, aReport());
    expect(answer.status).toBe(403);
    expect(answer.body).toMatchObject({
      error: { message: 'This inspection is assigned to Olga Owner.' },
    });
  });

  it('lets one of two leads win, with one mail to the new owner', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const answers = await Promise.all([
      change(plant, inspectionId, 'reassign', handOn(plant, 1)),
      change(plant, inspectionId, 'reassign', handOn(plant, 1)),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 409]);
    expect((await told()).filter((mail) => mail.startsWith(plant.otherOwner.email))).toHaveLength(
      1,
    );
  });

  it.each([
    [
      'who has it already',
      (plant: Plant) => ({ assigneeUserId: plant.owner.id }),
      'assigneeUserId',
    ],
    ['an analyst', (plant: Plant) => ({ assigneeUserId: plant.analyst.id }), 'assigneeUserId'],
    ['a due date in the past', () => ({ dueOn: '2020-01-01' }), 'dueOn'],
  ])('refuses %s at its field', async (_what, overrides, path) => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const body = { ...handOn(plant, 1), ...overrides(plant) };
    const answer = await change(plant, inspectionId, 'reassign', body);
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ error: { fields: [{ path }] } });
  });

  it('refuses what is reported already', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    await report(plant, inspectionId, aReport());
    expect((await change(plant, inspectionId, 'reassign', handOn(plant, 3))).status).toBe(409);
  });
});

describe('changing the due date', () => {
  it('moves it and tells the owner, and keeps the state', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const body = { version: 2, dueOn: '2099-12-20', reason: 'The stop has moved.' };
    expect((await change(plant, inspectionId, 'due-date', body)).status).toBe(204);
    const task = await app()
      .as(plant.lead)
      .get(plant.path(`/inspections/${inspectionId}`));
    expect(task.body).toMatchObject({ state: 'accepted', dueOn: '2099-12-20', version: 3 });
    expect((await told()).at(-1)).toBe(
      `${plant.owner.email}: Now due 2099-12-20: fit inspection of P-101 Circulation pump, Pump, drive end`,
    );
  });

  it.each([
    ['a day in the past', '2020-01-01'],
    ['the day it is due already', '2099-12-01'],
    ['a day that does not exist', '2099-02-30'],
  ])('refuses %s at its field', async (_what, dueOn) => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const answer = await change(plant, inspectionId, 'due-date', { version: 1, dueOn });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ error: { fields: [{ path: 'dueOn' }] } });
  });

  it('refuses who decided on an older state', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await accepted(plant);
    const body = { version: 1, dueOn: '2099-12-20' };
    expect((await change(plant, inspectionId, 'due-date', body)).status).toBe(409);
  });
});

describe('reminding', () => {
  it('sends one mail a day', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    expect((await change(plant, inspectionId, 'remind')).status).toBe(204);
    const again = await change(plant, inspectionId, 'remind');
    expect(again.status).toBe(409);
    expect(again.body).toMatchObject({
      error: { message: 'Oskar Owner was reminded of this today already.' },
    });
    const reminders = (await told()).filter((mail) => mail.includes('Reminder'));
    expect(reminders).toHaveLength(1);
  });

  it('tells the lead that the owner has switched reminders off', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    await app().as(plant.owner).put('/api/account/mail', { kind: 'reminder', wanted: false });
    const answer = await change(plant, inspectionId, 'remind');
    expect(answer.body).toMatchObject({
      error: { message: 'Oskar Owner has switched reminders off. Call, or hand the task on.' },
    });
  });
});

import { describe, expect, it } from 'vitest';
import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { buildPlant } from '#tests/support/plant.ts';
import { testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, aTask, inspectionStory } from './inspection-story.ts';

const database = useTestDatabase();
const { app, openFinding, assign, assigned, stateOf, mails } = inspectionStory(database);

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

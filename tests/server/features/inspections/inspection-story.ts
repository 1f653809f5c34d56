import type { DataSource } from 'typeorm';
import { OutboxMail } from '#server/db/entities/outbox-mail.entity.ts';
import type { AssignInspectionRequest } from '#shared/contracts/finding.ts';
import type { InspectionReport, InspectionResponse } from '#shared/contracts/inspection.ts';
import type { Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';

export const aTask = (plant: Plant, overrides: Partial<AssignInspectionRequest> = {}) => ({
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

export const aReport = (overrides: Partial<InspectionReport> = {}): InspectionReport => ({
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
  inPlaceChecks: [],
  causeInPlace: false,
  workDone: 'Sleeve fitted, new bearing mounted.',
  repaired: true,
  ...overrides,
});

/** The steps that lead to an inspection and through it, each as the person who takes it. */
export function inspectionStory(database: () => DataSource) {
  const app = () => buildTestApp(database());
  async function openFinding(plant: Plant): Promise<number> {
    const flag = await plant.flag();
    const res = await app()
      .as(plant.analyst)
      .post(plant.path(`/screenings/${flag.id}/decision`), { decision: 'accepted' });
    return (res.body as { findingId: number }).findingId;
  }

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

  return { app, openFinding, assign, assigned, accepted, report, stateOf, mails };
}

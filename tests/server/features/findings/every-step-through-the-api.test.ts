import { describe, expect, it } from 'vitest';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { findingActions, findingStates, type FindingState } from '#shared/contracts/finding.ts';
import { inspectionStates, type InspectionState } from '#shared/contracts/inspection.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, aTask, inspectionStory } from '../inspections/inspection-story.ts';

const database = useTestDatabase();
const story = inspectionStory(database);

/** Who tries: each role, an owner whose machine it isn't, and a lead of another site. */
const people = ['analyst', 'lead', 'owner', 'otherOwner', 'stranger'] as const;
type Person = (typeof people)[number];

/** Every step of a finding that the API lets through; whatever is not here must be refused. */
const findingSteps: Readonly<Record<string, FindingState>> = {
  'open + assign by lead': 'inspecting',
  'open + monitor by lead': 'monitoring',
  'open + dismiss by lead': 'dismissed',
  'monitoring + assign by lead': 'inspecting',
  'monitoring + monitor by lead': 'monitoring',
  'monitoring + dismiss by lead': 'dismissed',
  'monitoring + reopen by lead': 'open',
  'repaired + reopen by lead': 'open',
  'repaired + verify by lead': 'verified',
  'verified + reopen by lead': 'open',
  'dismissed + reopen by lead': 'open',
};

const inspectionSteps: Readonly<Record<string, InspectionState>> = {
  'assigned + accept by owner': 'accepted',
  'assigned + cancel by lead': 'cancelled',
  'assigned + reassign by lead': 'assigned',
  'assigned + due-date by lead': 'assigned',
  'assigned + remind by lead': 'assigned',
  'accepted + report by owner': 'reported',
  'accepted + cancel by lead': 'cancelled',
  'accepted + reassign by lead': 'assigned',
  'accepted + due-date by lead': 'accepted',
  'accepted + remind by lead': 'accepted',
  'reported + close by lead': 'closed',
};

const statuses = {
  done: [200, 201, 204],
  'not of this role': [403],
  'not theirs to see': [404],
  'not in this state': [409],
};
type Fate = keyof typeof statuses;

const fateOf = (status: number): Fate | `status ${number}` =>
  (Object.keys(statuses) as Fate[]).find((fate) => statuses[fate].includes(status)) ??
  `status ${status}`;

async function everybody(plant: Plant) {
  const elsewhere = await buildSite(database());
  const stranger = await buildMember(database(), elsewhere, 'lead');
  return { ...plant, stranger };
}

const actionsOfInspection = [
  'accept',
  'report',
  'close',
  'cancel',
  'reassign',
  'due-date',
  'remind',
] as const;
const ownersActions: readonly string[] = ['accept', 'report'];

const bodyOf = (plant: Plant, action: (typeof actionsOfInspection)[number]) =>
  ({
    accept: { version: 1 },
    report: { version: 1, report: aReport() },
    close: { version: 1, reason: 'Clear.' },
    cancel: { version: 1, reason: 'The stop was moved.' },
    reassign: { version: 1, assigneeUserId: plant.otherOwner.id, dueOn: '2099-12-01' },
    'due-date': { version: 1, dueOn: '2099-12-24' },
    remind: undefined,
  })[action];

/** The state of the finding behind an inspection. */
const findingBehind: Readonly<Record<InspectionState, FindingState>> = {
  assigned: 'inspecting',
  accepted: 'inspecting',
  reported: 'repaired',
  closed: 'repaired',
  cancelled: 'open',
};

function expectedOf(
  steps: Readonly<Record<string, string>>,
  from: string,
  actions: readonly string[],
) {
  return Object.fromEntries(
    actions.flatMap((action) =>
      people.map((person) => {
        const step = `${from} + ${action} by ${person}`;
        const next = steps[step];
        return [
          step,
          next === undefined ? `${refusalOf(action, person)}, ${from}` : `done, ${next}`,
        ];
      }),
    ),
  );
}

/** Why somebody is refused whom no step lets through. */
function refusalOf(action: string, person: Person): Fate {
  if (person === 'stranger') return 'not theirs to see';
  if (!ownersActions.includes(action)) {
    return person === 'lead' ? 'not in this state' : 'not of this role';
  }
  if (person === 'owner') return 'not in this state';
  return person === 'otherOwner' ? 'not theirs to see' : 'not of this role';
}

describe('every step of a finding by everybody, through the API', () => {
  it.each(findingStates)('from %s', async (state) => {
    const plant = await everybody(await buildPlant(database()));
    const findingId = await story.openFinding(plant);
    const findings = database().getRepository(Finding);
    const outcomes: Record<string, string> = {};
    for (const action of findingActions) {
      for (const person of people) {
        await findings.update(findingId, { state, version: 1 });
        const caller = story.app().as(plant[person]);
        const res =
          action === 'assign'
            ? await caller.post(plant.path(`/findings/${findingId}/inspections`), aTask(plant))
            : await caller.post(plant.path(`/findings/${findingId}/decision`), {
                action,
                reason: 'Decided.',
                version: 1,
                ...(action === 'monitor' ? { monitorSurveys: 1 } : {}),
              });
        const after = await findings.findOneByOrFail({ id: findingId });
        outcomes[`${state} + ${action} by ${person}`] = `${fateOf(res.status)}, ${after.state}`;
      }
    }
    expect(outcomes).toEqual(expectedOf(findingSteps, state, findingActions));
  });
});

describe('every step of an inspection by everybody, through the API', () => {
  it.each(inspectionStates)('from %s', async (state) => {
    const plant = await everybody(await buildPlant(database()));
    const { findingId, inspectionId } = await story.assigned(plant);
    const inspections = database().getRepository(Inspection);
    const { id: _id, ...task } = await inspections.findOneByOrFail({ id: inspectionId });
    const outcomes: Record<string, string> = {};
    for (const action of actionsOfInspection) {
      for (const person of people) {
        await database().getRepository(Finding).update(findingId, { state: findingBehind[state] });
        // One of its own for each step: an e-mail tells of each only once.
        const { id } = await inspections.save({ ...task, state, version: 1 });
        const res = await story
          .app()
          .as(plant[person])
          .post(plant.path(`/inspections/${id}/${action}`), bodyOf(plant, action));
        const after = await inspections.findOneByOrFail({ id });
        outcomes[`${state} + ${action} by ${person}`] = `${fateOf(res.status)}, ${after.state}`;
      }
    }
    expect(outcomes).toEqual(expectedOf(inspectionSteps, state, actionsOfInspection));
  });
});

it('knows every step that is written out here', () => {
  const steps = [
    ...findingStates.flatMap((state) => findingActions.map((action) => `${state} + ${action}`)),
    ...inspectionStates.flatMap((state) =>
      actionsOfInspection.map((action) => `${state} + ${action}`),
    ),
  ].flatMap((step) => people.map((person) => `${step} by ${person}`));
  expect(steps).toEqual(
    expect.arrayContaining([...Object.keys(findingSteps), ...Object.keys(inspectionSteps)]),
  );
});

import type { Machine } from '#server/db/entities/machine.entity.ts';
import type { PlannedValues } from '#server/db/entities/register-import-row.entity.ts';
import { createMachineRequest } from '#shared/contracts/machine.ts';
import {
  changesOf,
  contractFaults,
  differingKeys,
  emptyFaults,
  fieldFaults,
  newRow,
  sameRow,
  textOf,
  valuesOf,
  wrongRow,
  type GivenRow,
  type JudgedRow,
} from './given-row.ts';
import { columnsOf } from './import-columns.ts';
import { alreadyNamed, type JudgeContext } from './judge-context.ts';

const columns = columnsOf.machines;
/** What a machine is written with; `ownerUserId` is told by an address in the file. */
export const machineFields = Object.keys(createMachineRequest.shape);

export async function judgeMachines(context: JudgeContext, rows: GivenRow[]): Promise<JudgedRow[]> {
  const found = await context.lookup.machines(
    context.siteId,
    rows.map((row) => textOf(row, 'tag')),
  );
  return rows.map((row, index) => {
    const { tagKey = '', machine = null } = found[index] ?? {};
    return judge(context, row, tagKey, machine);
  });
}

function judge(
  context: JudgeContext,
  row: GivenRow,
  tagKey: string,
  machine: Machine | null,
): JudgedRow {
  const label = textOf(row, 'tag');
  const faults = [
    ...row.faults,
    ...emptyFaults(columns, row, machine === null),
    ...alreadyNamed(context, row, tagKey, { column: 'tag', what: `The tag ${label}` }),
  ];
  if (faults.length > 0) return wrongRow(row, label, faults);
  const before = machine === null ? null : withOwnerEmail(context, machine);
  // The database's spelling of the tag stays.
  const given: PlannedValues = { ...row.given, ...(machine === null ? {} : { tag: machine.tag }) };
  const keys = differingKeys(before ?? {}, given);
  if (before !== null && keys.length === 0) return sameRow(row, label);
  const owner = readOwner(context, given, keys);
  if ('fault' in owner) {
    return wrongRow(row, label, fieldFaults(columns, row, [owner.fault]));
  }
  const { ownerEmail: _email, ...fields } = given;
  const current = machine === null ? {} : valuesOf(machine, machineFields);
  const parsed = createMachineRequest.safeParse({ ...current, ...fields, ...owner });
  if (!parsed.success) {
    return wrongRow(row, label, fieldFaults(columns, row, contractFaults(parsed.error)));
  }
  if (before === null || machine === null) {
    return newRow(row, label, { ...parsed.data, siteId: context.siteId });
  }
  const after: PlannedValues = { ...current };
  for (const key of keys) {
    const field = key === 'ownerEmail' ? 'ownerUserId' : key;
    after[field] = valuesOf(parsed.data, [field])[field] ?? null;
  }
  return {
    ...sameRow(row, label),
    fate: 'changed',
    changes: changesOf(columns, keys, before, given),
    plan: { before: current, after },
    objectId: machine.id,
  };
}

function withOwnerEmail({ people }: JudgeContext, machine: Machine): PlannedValues {
  const owner = people.find(({ id }) => id === machine.ownerUserId);
  return { ...valuesOf(machine, machineFields), ownerEmail: owner?.email ?? null };
}

/** The owner's id, where the file tells another owner than the machine has. */
function readOwner(
  { people }: JudgeContext,
  given: PlannedValues,
  keys: string[],
): { ownerUserId?: number | null } | { fault: { path: string; message: string } } {
  if (!keys.includes('ownerEmail')) return {};
  const email = given.ownerEmail;
  if (typeof email !== 'string') return { ownerUserId: null };
  const owner = people.find((one) => one.isOwner && one.email === email.toLowerCase());
  if (owner !== undefined) return { ownerUserId: owner.id };
  const message = `${email} is not the address of an asset owner of this site.`;
  return { fault: { path: 'ownerEmail', message } };
}

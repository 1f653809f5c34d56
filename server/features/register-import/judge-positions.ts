import type { PlannedValues } from '#server/db/entities/register-import-row.entity.ts';
import { createBearingPositionRequest } from '#shared/contracts/bearing-position.ts';
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
import { alreadyNamed, missingParent, type JudgeContext } from './judge-context.ts';
import type { FoundPosition } from './register-lookup.repository.ts';

const columns = columnsOf.positions;
/** What a bearing position is written with. */
export const positionFields = Object.keys(createBearingPositionRequest.shape);

export async function judgePositions(
  context: JudgeContext,
  rows: GivenRow[],
): Promise<JudgedRow[]> {
  const found = await context.lookup.positions(
    context.siteId,
    rows.map((row) => ({ tag: textOf(row, 'machineTag'), code: textOf(row, 'code') })),
  );
  return rows.map((row, index) => {
    const place = found[index];
    if (place === undefined) throw new Error('The database left a bearing position out.');
    return judge(context, row, place);
  });
}

function judge(context: JudgeContext, row: GivenRow, place: FoundPosition): JudgedRow {
  const { machine, position } = place;
  const tag = textOf(row, 'machineTag');
  const label = `${tag}/${textOf(row, 'code')}`;
  const what = `The position ${label}`;
  const faults = [...row.faults, ...emptyFaults(columns, row, position === null)];
  if (faults.length === 0 && machine === null) faults.push(missingParent(tag, null, false));
  faults.push(...alreadyNamed(context, row, place.key, { column: 'position code', what }));
  if (faults.length > 0 || machine === null) return wrongRow(row, label, faults);
  const { machineTag: _tag, ...fields } = row.given;
  const before = position === null ? null : valuesOf(position, positionFields);
  const given = { ...fields, ...(position === null ? {} : { code: position.code }) };
  const keys = differingKeys(before ?? {}, given);
  if (before !== null && keys.length === 0) return sameRow(row, label);
  const parsed = createBearingPositionRequest.safeParse({ ...before, ...given });
  if (!parsed.success) {
    return wrongRow(row, label, fieldFaults(columns, row, contractFaults(parsed.error)));
  }
  const contradictions = context.checks.positionFaults(parsed.data);
  if (contradictions.length > 0) {
    return wrongRow(row, label, fieldFaults(columns, row, contradictions));
  }
  if (before === null || position === null) {
    return newRow(row, label, { ...parsed.data, machineId: machine.id });
  }
  const after: PlannedValues = { ...before, ...valuesOf(parsed.data, keys) };
  return {
    ...sameRow(row, label),
    fate: 'changed',
    changes: changesOf(columns, keys, before, after),
    plan: { before, after },
    objectId: position.id,
  };
}

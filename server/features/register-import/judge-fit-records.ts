import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { createFitRecordRequest } from '#shared/contracts/fit-record.ts';
import type { RowFault } from '#shared/contracts/register-import.ts';
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
import { columnsOf, remedyOf } from './import-columns.ts';
import { alreadyNamed, missingParent, type JudgeContext } from './judge-context.ts';
import type { FoundPosition } from './register-lookup.repository.ts';

const columns = columnsOf['fit-records'];
/** What a fit record is compared by. */
export const fitRecordFields = Object.keys(createFitRecordRequest.shape);

export async function judgeFitRecords(
  context: JudgeContext,
  rows: GivenRow[],
): Promise<JudgedRow[]> {
  const { lookup, siteId } = context;
  const found = await lookup.positions(
    siteId,
    rows.map((row) => ({ tag: textOf(row, 'machineTag'), code: textOf(row, 'positionCode') })),
  );
  const ids = new Set(found.flatMap(({ position }) => position?.id ?? []));
  const records = new Map<string, FitRecord[]>();
  for (const record of await lookup.fitRecordsOf([...ids])) {
    const key = seatAndDate(record.bearingPositionId, record.seat, record.recordedOn);
    records.set(key, [...(records.get(key) ?? []), record]);
  }
  return rows.map((row, index) => {
    const place = found[index];
    if (place === undefined) throw new Error('The database left a bearing position out.');
    return judge(context, row, place, records);
  });
}

const seatAndDate = (positionId: number, seat: string, recordedOn: string) =>
  `${positionId} ${seat} ${recordedOn}`;

function judge(
  context: JudgeContext,
  row: GivenRow,
  place: FoundPosition,
  records: Map<string, FitRecord[]>,
): JudgedRow {
  const { machine, position } = place;
  const [tag, code] = [textOf(row, 'machineTag'), textOf(row, 'positionCode')];
  const [seat, recordedOn] = [textOf(row, 'seat'), textOf(row, 'recordedOn')];
  const label = `${tag}/${code} ${seat} ${recordedOn}`.trimEnd();
  const wrong = (faults: RowFault[]) => wrongRow(row, label, faults);
  const unread = [...row.faults, ...emptyFaults(columns, row, true)];
  if (unread.length > 0) return wrong(unread);
  if (position === null) return wrong([missingParent(tag, code, machine !== null)]);
  const { machineTag: _tag, positionCode: _code, ...given } = row.given;
  const there = records.get(seatAndDate(position.id, seat, recordedOn)) ?? [];
  const differences = there.map((record) => {
    const before = valuesOf(record, fitRecordFields);
    return changesOf(columns, differingKeys(before, given), before, given);
  });
  if (differences.some((changes) => changes.length === 0)) return sameRow(row, label);
  const [difference] = differences;
  if (difference !== undefined) {
    const parts = difference.map(
      ({ column, before, after }) => `${column} ${before || 'empty'}, here ${after || 'empty'}`,
    );
    return wrong([
      {
        column: difference[0]?.column ?? 'recorded on',
        reason: `A record of the ${seat} seat on ${recordedOn} says otherwise: ${parts.join('; ')}.`,
        remedy:
          'Fit records are added, never changed: give a new measurement its own date, or take the row out.',
      },
    ]);
  }
  if (position.kind === 'plain') {
    const reason = 'The position has a plain bearing, which has no seats.';
    return wrong([
      { column: 'position code', reason, remedy: 'Take the row out, or correct the code.' },
    ]);
  }
  const faults = alreadyNamed(context, row, `${place.key} ${seat} ${recordedOn}`, {
    column: 'recorded on',
    what: `A record of the ${seat} seat of ${tag}/${code} on ${recordedOn}`,
  });
  if (recordedOn > context.today) {
    const column = columns.find(({ key }) => key === 'recordedOn');
    faults.push({
      column: 'recorded on',
      reason: `The date ${recordedOn} lies in the future.`,
      remedy: column === undefined ? '' : remedyOf(column),
    });
  }
  const parsed = createFitRecordRequest.safeParse(given);
  faults.push(
    ...fieldFaults(
      columns,
      row,
      parsed.success
        ? context.checks.recordFaults(position, parsed.data)
        : contractFaults(parsed.error),
    ),
  );
  if (faults.length > 0 || !parsed.success) return wrong(faults);
  return newRow(row, label, { ...parsed.data, bearingPositionId: position.id });
}

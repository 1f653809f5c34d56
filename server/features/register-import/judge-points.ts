import { direction as directions, pointLabel } from '#shared/contracts/measuring-point.ts';
import {
  emptyFaults,
  newRow,
  sameRow,
  textOf,
  wrongRow,
  type GivenRow,
  type JudgedRow,
} from './given-row.ts';
import { columnsOf } from './import-columns.ts';
import { alreadyNamed, missingParent, type JudgeContext } from './judge-context.ts';
import type { FoundPosition } from './register-lookup.repository.ts';

const columns = columnsOf.points;

export async function judgePoints(context: JudgeContext, rows: GivenRow[]): Promise<JudgedRow[]> {
  const { lookup, siteId } = context;
  const found = await lookup.positions(
    siteId,
    rows.map((row) => ({ tag: textOf(row, 'machineTag'), code: textOf(row, 'positionCode') })),
  );
  const ids = new Set(found.flatMap(({ position }) => position?.id ?? []));
  const points = await lookup.pointsOf([...ids]);
  const there = new Set(points.map((point) => `${point.bearingPositionId} ${point.direction}`));
  return rows.map((row, index) => {
    const place = found[index];
    if (place === undefined) throw new Error('The database left a bearing position out.');
    return judge(context, row, place, there);
  });
}

function judge(
  context: JudgeContext,
  row: GivenRow,
  { key, machine, position }: FoundPosition,
  there: ReadonlySet<string>,
): JudgedRow {
  const [tag, code] = [textOf(row, 'machineTag'), textOf(row, 'positionCode')];
  const direction = directions.safeParse(row.given.direction);
  const label = direction.success ? pointLabel(tag, code, direction.data) : `${tag}/${code}`;
  const faults = [...row.faults, ...emptyFaults(columns, row, true)];
  if (faults.length > 0 || !direction.success) return wrongRow(row, label, faults);
  if (position === null) {
    return wrongRow(row, label, [missingParent(tag, code, machine !== null)]);
  }
  const doubled = alreadyNamed(context, row, `${key} ${direction.data}`, {
    column: 'direction',
    what: `The point ${label}`,
  });
  if (doubled.length > 0) return wrongRow(row, label, doubled);
  if (there.has(`${position.id} ${direction.data}`)) return sameRow(row, label);
  return newRow(row, label, { bearingPositionId: position.id, direction: direction.data });
}

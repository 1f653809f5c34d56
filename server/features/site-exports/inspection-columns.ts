import type { CsvColumn } from '#server/csv/csv-table.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { SeatName, SeatStage } from '#shared/contracts/fit-record.ts';
import type { InspectionListItem, SeatReading } from '#shared/contracts/inspection.ts';

export interface InspectionRow {
  item: InspectionListItem;
  inspection: Inspection | null;
}

const seatOf = ({ inspection }: InspectionRow, seat: SeatName, stage: SeatStage) =>
  inspection?.report?.seats.find(
    // Reports of old have no stage: they told of the seat as found.
    (one) => one.seat === seat && (one.stage ?? 'as found') === stage,
  );

/** Mean of the readings, to a tenth of a micrometre. */
function meanMm(readings: readonly SeatReading[] | undefined, part: SeatReading['part']) {
  const of = readings?.filter((reading) => reading.part === part) ?? [];
  if (of.length === 0) return null;
  const sum = of.reduce((total, { diameterMm }) => total + diameterMm, 0);
  return Math.round((sum / of.length) * 1e4) / 1e4;
}

const seatColumns = (seat: SeatName, stage: SeatStage): CsvColumn<InspectionRow>[] => [
  {
    header: `${seat} seat condition ${stage}`,
    value: (row) => seatOf(row, seat, stage)?.condition ?? null,
  },
  {
    header: `${seat} seat mean ${stage} (mm)`,
    value: (row) => meanMm(seatOf(row, seat, stage)?.readings, 'seat'),
  },
  {
    header: `${seat} seat ring mean ${stage} (mm)`,
    value: (row) => meanMm(seatOf(row, seat, stage)?.readings, 'ring'),
  },
];

export const inspectionColumns: readonly CsvColumn<InspectionRow>[] = [
  { header: 'inspection', value: ({ item }) => item.id },
  { header: 'finding', value: ({ item }) => item.findingId },
  { header: 'work order', value: ({ item }) => item.workOrderReference },
  { header: 'state', value: ({ item }) => item.state },
  { header: 'machine tag', value: ({ item }) => item.machineTag },
  { header: 'machine name', value: ({ item }) => item.machineName },
  { header: 'position code', value: ({ item }) => item.positionCode },
  { header: 'position name', value: ({ item }) => item.positionName },
  { header: 'assigned to', value: ({ item }) => item.assigneeName },
  { header: 'assigned by', value: ({ item }) => item.assignedByName },
  { header: 'assigned at (UTC)', value: ({ item }) => item.assignedAt },
  { header: 'due on', value: ({ item }) => item.dueOn },
  { header: 'overdue', value: ({ item }) => item.overdue },
  { header: 'check shaft seat', value: ({ item }) => item.checkShaftSeat },
  { header: 'check housing seat', value: ({ item }) => item.checkHousingSeat },
  { header: 'check in place', value: ({ item }) => item.checkInPlace },
  { header: 'instructions', value: ({ inspection }) => inspection?.instructions ?? null },
  {
    header: 'reported at (UTC)',
    value: ({ inspection }) => inspection?.reportedAt?.toISOString() ?? null,
  },
  { header: 'outcome', value: ({ inspection }) => inspection?.report?.outcome ?? null },
  { header: 'fit put right', value: ({ inspection }) => inspection?.report?.repaired ?? null },
  {
    header: 'found in place',
    value: ({ inspection }) => inspection?.report?.inPlaceResult ?? null,
  },
  {
    header: 'checks in place',
    value: ({ inspection }) =>
      inspection?.report?.inPlaceChecks
        ?.map(({ check, finding }) => `${check}: ${finding}`)
        .join('; ') ?? null,
  },
  {
    header: 'cause found in place',
    value: ({ inspection }) => inspection?.report?.causeInPlace ?? null,
  },
  { header: 'work done', value: ({ inspection }) => inspection?.report?.workDone ?? null },
  ...(['shaft', 'housing'] as const).flatMap((seat) => [
    ...seatColumns(seat, 'as found'),
    ...seatColumns(seat, 'as left'),
  ]),
];

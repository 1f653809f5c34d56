import type { DiameterUnit, FitRecordResponse } from '#shared/contracts/fit-record.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { diameterText } from '#src/lib/diameters.ts';
import { formatEntered } from '#src/lib/numbers.ts';
import { capital } from './machine-words.ts';

/** In the unit in which it was read, with the millimetres that it is kept in. */
function diameter(value: number | null, unit: DiameterUnit) {
  if (value === null || unit === 'mm') {
    return <Figure value={value === null ? null : diameterText(value, 'mm')} unit="mm" />;
  }
  return (
    <span className="flex flex-col items-end">
      <Figure value={diameterText(value, unit)} unit={unit} />
      <Figure className="text-xs text-ink-faint" value={diameterText(value, 'mm')} unit="mm" />
    </span>
  );
}

/** Loss of clearance tells more than the drive-up, so it stands first. */
const driveUp = ({ clearanceReductionUm, driveUpMm }: FitRecordResponse) => (
  <span className="flex flex-col items-end">
    {clearanceReductionUm !== null && (
      <Figure value={formatEntered(clearanceReductionUm)} unit="µm" />
    )}
    {driveUpMm !== null && <Figure value={formatEntered(driveUpMm)} unit="mm" />}
    {clearanceReductionUm === null && driveUpMm === null && <Figure value={null} />}
  </span>
);

const driveUpColumn: DataTableColumn<FitRecordResponse> = {
  id: 'driveUp',
  header: 'Clearance lost, drive-up',
  align: 'end',
  cell: driveUp,
};

const columns: DataTableColumn<FitRecordResponse>[] = [
  {
    id: 'date',
    header: 'Date',
    rowHeader: true,
    cell: (row) => <span className="figures">{formatDay(row.recordedOn)}</span>,
  },
  { id: 'seat', header: 'Seat', cell: (row) => capital(row.seat) },
  { id: 'source', header: 'Source', cell: (row) => capital(row.source) },
  { id: 'class', header: 'Class', cell: (row) => <Figure value={row.toleranceClass} /> },
  {
    id: 'seatMm',
    header: 'Shaft or bore',
    align: 'end',
    cell: (row) => diameter(row.seatMeasuredMm, row.diameterUnit),
  },
  {
    id: 'ringMm',
    header: 'Ring',
    align: 'end',
    cell: (row) => diameter(row.ringMeasuredMm, row.diameterUnit),
  },
  {
    id: 'condition',
    header: 'Condition',
    cell: (row) => (row.condition === null ? <Figure value={null} /> : capital(row.condition)),
  },
  { id: 'by', header: 'Recorded by', cell: (row) => row.recordedByName },
  {
    id: 'note',
    header: 'Note',
    cell: (row) => [row.bonding && capital(row.bonding), row.note].filter(Boolean).join('. '),
  },
];

const isDrivenUp = (row: FitRecordResponse) =>
  row.driveUpMm !== null || row.clearanceReductionUm !== null;
/** A column more where a seat is tapered; it would stand empty everywhere else. */
const withDriveUp = columns.toSpliced(6, 0, driveUpColumn);

/** The fit records of a position's two seats, newest first. */
export function FitRecordTable({
  positionCode,
  records,
}: {
  positionCode: string;
  records: readonly FitRecordResponse[];
}) {
  return (
    <DataTable
      label={`Fit records of ${positionCode}`}
      columns={records.some(isDrivenUp) ? withDriveUp : columns}
      rows={records}
      rowId={(row) => row.id}
      empty={
        <p className="text-sm text-ink-soft">
          No fit is recorded. Without a record nobody can say whether a seat explains a finding:
          enter the tolerance classes from the drawing first.
        </p>
      }
    />
  );
}

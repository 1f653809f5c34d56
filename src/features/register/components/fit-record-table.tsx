import type { FitRecordResponse } from '#shared/contracts/fit-record.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { capital } from './machine-words.ts';

const diameter = (value: number | null) => (
  <Figure value={value === null ? null : formatFixed(value, 3)} unit="mm" />
);

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
    cell: (row) => diameter(row.seatMeasuredMm),
  },
  { id: 'ringMm', header: 'Ring', align: 'end', cell: (row) => diameter(row.ringMeasuredMm) },
  {
    id: 'condition',
    header: 'Condition',
    cell: (row) => (row.condition === null ? <Figure value={null} /> : capital(row.condition)),
  },
  { id: 'by', header: 'Recorded by', cell: (row) => row.recordedByName },
  { id: 'note', header: 'Note', cell: (row) => row.note ?? '' },
];

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
      columns={columns}
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

import type { SeatWearStep } from '#shared/contracts/seat-history.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed, formatSigned } from '#src/lib/numbers.ts';

const withUncertainty = (value: number | null, uncertainty: number | null, unit: string) => (
  <Figure
    value={
      value === null || uncertainty === null
        ? null
        : `${formatSigned(value, 1)} ± ${formatFixed(uncertainty, 1)}`
    }
    unit={unit}
  />
);

/** What a step means, in words: figures within their uncertainty are no wear. */
export function wearWords(step: SeatWearStep): string {
  if (step.isWork) return 'Work on the seat, not wear';
  if (!step.isSignificant) return 'Within the uncertainty: no wear to be told';
  return step.lossUm > 0
    ? 'Interference lost to wear'
    : 'Tighter than before: restored, a new part, or a reading to doubt';
}

const columns: DataTableColumn<SeatWearStep>[] = [
  {
    id: 'between',
    header: 'Between',
    rowHeader: true,
    cell: (step) => (
      <span className="figures whitespace-nowrap">
        {formatDay(step.fromOn)} and {formatDay(step.toOn)}
      </span>
    ),
  },
  {
    id: 'loss',
    header: 'Interference lost',
    align: 'end',
    cell: (step) => withUncertainty(step.lossUm, step.expandedUncertaintyUm, 'µm'),
  },
  {
    id: 'perYear',
    header: 'A year',
    align: 'end',
    cell: (step) =>
      step.isWork ? (
        <Figure value={null} />
      ) : (
        withUncertainty(step.perYearUm, step.perYearUncertaintyUm, 'µm/a')
      ),
  },
  { id: 'meaning', header: 'What it means', cell: wearWords },
];

/** Wear between each measurement of a seat and the next. */
export function SeatWearTable({ steps }: { steps: readonly SeatWearStep[] }) {
  return (
    <div className="flex flex-col gap-2">
      <DataTable
        label="Wear between measurements"
        columns={columns}
        rows={steps}
        rowId={(step) => step.toRecordId}
        empty={
          <p className="text-sm text-ink-soft">
            Wear needs two measurements of the seat. Measure it at every opening.
          </p>
        }
      />
      {steps.length > 0 && (
        <p className="max-w-prose text-xs text-ink-faint">
          Uncertainties are expanded (k = 2, about 95 %): instrument and scatter of the readings, 2
          µm for a diameter without readings on record.
        </p>
      )}
    </div>
  );
}

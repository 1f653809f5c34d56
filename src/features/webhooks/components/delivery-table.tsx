import { Link } from 'react-router-dom';
import { inspectionStates } from '#shared/contracts/inspection.ts';
import type { WebhookDeliveryItem } from '#shared/contracts/webhook.ts';
import { Button } from '#src/components/button.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { formatInstant } from '#src/lib/dates.ts';

const standingOf = ({ state, attempts }: WebhookDeliveryItem): string => {
  if (state === 'sent') return 'Told';
  if (state === 'failed') return `Given up after ${attempts} attempts`;
  if (attempts === 0) return 'Waiting';
  return attempts === 1 ? 'Tried once in vain' : `Tried ${attempts} times in vain`;
};

const columns = (
  siteId: number,
  onTellAgain: (id: number) => void,
): DataTableColumn<WebhookDeliveryItem>[] => [
  {
    id: 'inspection',
    header: 'Inspection',
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={`/sites/${siteId}/inspections/${row.inspectionId}`}>
        Inspection <span className="figures">{row.inspectionId}</span>
      </Link>
    ),
  },
  {
    id: 'toState',
    header: 'Became',
    cell: ({ toState }) => {
      const state = inspectionStates.find((known) => known === toState);
      return state === undefined ? toState : <InspectionStateMark state={state} />;
    },
  },
  { id: 'at', header: 'At', cell: (row) => <Figure value={formatInstant(row.createdAt)} /> },
  {
    id: 'state',
    header: 'State',
    cell: (row) => (
      <>
        {row.lastError === null ? standingOf(row) : <strong>{standingOf(row)}</strong>}
        {row.lastError !== null && <span className="block text-xs">{row.lastError}</span>}
        {row.attempts > 0 && row.nextAttemptAt !== null && (
          <span className="block text-xs text-ink-faint">
            Next attempt {formatInstant(row.nextAttemptAt)}
          </span>
        )}
      </>
    ),
  },
  {
    id: 'again',
    header: 'Again',
    cell: (row) =>
      row.lastError !== null &&
      row.state !== 'sent' && (
        <Button
          size="small"
          aria-label={`Tell now: inspection ${row.inspectionId}, ${row.toState}`}
          onClick={() => onTellAgain(row.id)}
        >
          Tell now
        </Button>
      ),
  },
];

/** What was told, newest first, with the faults. */
export function DeliveryTable({
  siteId,
  deliveries,
  onTellAgain,
}: {
  siteId: number;
  deliveries: readonly WebhookDeliveryItem[];
  onTellAgain: (id: number) => void;
}) {
  return (
    <DataTable
      label="What was told"
      columns={columns(siteId, onTellAgain)}
      rows={deliveries}
      rowId={(row) => row.id}
      empty={
        <EmptyState title="Nothing told yet">
          The next change of state of an inspection is the first.
        </EmptyState>
      }
    />
  );
}

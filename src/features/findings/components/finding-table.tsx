import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { FindingListItem } from '#shared/contracts/finding.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { DataTable, type DataTableColumn, type TableSort } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { FindingStateMark } from '#src/components/work-state-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { MonitoringEnd } from './monitoring-end.tsx';

const columns = (siteId: number): DataTableColumn<FindingListItem>[] => [
  {
    id: 'machineTag',
    header: 'Machine',
    sortable: true,
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={`/sites/${siteId}/findings/${row.id}`}>
        <span className="figures">{row.machineTag}</span> {row.positionName}
      </Link>
    ),
  },
  {
    id: 'state',
    header: 'State',
    sortable: true,
    cell: (row) => (
      <>
        <FindingStateMark state={row.state} />
        {row.monitoring !== null && (
          <div className="text-xs text-ink-soft">
            <MonitoringEnd monitoring={row.monitoring} />
          </div>
        )}
      </>
    ),
  },
  { id: 'verdict', header: 'Clearest sign', cell: (row) => <VerdictMark verdict={row.verdict} /> },
  {
    id: 'score',
    header: 'Score',
    align: 'end',
    sortable: true,
    cell: (row) => <Figure value={row.score === null ? null : formatFixed(row.score, 2)} />,
  },
  { id: 'orders', header: 'Orders', cell: (row) => <OrderStrip marks={row.orders} /> },
  {
    id: 'screeningCount',
    header: 'Seen',
    align: 'end',
    cell: (row) => <Figure value={`${row.screeningCount}×`} />,
  },
  { id: 'owner', header: 'Owner', cell: (row) => row.ownerName ?? <Figure value={null} /> },
  {
    id: 'openedAt',
    header: 'Opened',
    sortable: true,
    cell: (row) => <Figure value={formatDay(row.openedAt)} />,
  },
];

/** Findings, one page of them. */
export function FindingTable({
  siteId,
  ...rest
}: {
  siteId: number;
  rows: readonly FindingListItem[];
  sort: TableSort;
  onSort: (sort: TableSort) => void;
  fetching: boolean;
  empty: ReactNode;
}) {
  return <DataTable {...rest} label="Findings" columns={columns(siteId)} rowId={(row) => row.id} />;
}

import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { InspectionListItem } from '#shared/contracts/inspection.ts';
import { DataTable, type DataTableColumn, type TableSort } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { checksText } from './inspection-words.ts';

const columns = (siteId: number): DataTableColumn<InspectionListItem>[] => [
  {
    id: 'machineTag',
    header: 'Machine',
    sortable: true,
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={`/sites/${siteId}/inspections/${row.id}`}>
        <span className="figures">{row.machineTag}</span> {row.positionName}
      </Link>
    ),
  },
  {
    id: 'state',
    header: 'State',
    sortable: true,
    cell: (row) => <InspectionStateMark state={row.state} />,
  },
  {
    id: 'dueOn',
    header: 'Due',
    sortable: true,
    cell: (row) => (
      <>
        <Figure value={formatDay(row.dueOn)} />
        {row.overdue && <strong> overdue</strong>}
      </>
    ),
  },
  { id: 'checks', header: 'To check', cell: checksText },
  { id: 'assignee', header: 'Asset owner', cell: (row) => row.assigneeName },
  { id: 'assignedBy', header: 'Assigned by', cell: (row) => row.assignedByName },
  {
    id: 'workOrder',
    header: 'Work order',
    cell: (row) => <Figure value={row.workOrderReference} />,
  },
];

/** Inspections, one page of them. */
export function InspectionTable({
  siteId,
  ...rest
}: {
  siteId: number;
  rows: readonly InspectionListItem[];
  sort: TableSort;
  onSort: (sort: TableSort) => void;
  fetching: boolean;
  empty: ReactNode;
}) {
  return (
    <DataTable {...rest} label="Inspections" columns={columns(siteId)} rowId={(row) => row.id} />
  );
}

import { Link } from 'react-router-dom';
import type { MachineListResponse } from '#shared/contracts/machine.ts';
import { DataTable, type DataTableColumn, type TableSort } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { formatEntered } from '#src/lib/numbers.ts';
import { capital } from './machine-words.ts';

type Row = MachineListResponse['items'][number];

const columns = (siteId: number): DataTableColumn<Row>[] => [
  {
    id: 'tag',
    header: 'Tag',
    sortable: true,
    rowHeader: true,
    width: '8rem',
    cell: (row) => (
      <Link className="ink-link figures" to={`/sites/${siteId}/machines/${row.id}`}>
        {row.tag}
      </Link>
    ),
  },
  { id: 'name', header: 'Name', sortable: true, cell: (row) => row.name },
  { id: 'kind', header: 'Kind', sortable: true, cell: (row) => capital(row.kind) },
  {
    id: 'nominalSpeedRpm',
    header: 'Speed',
    align: 'end',
    cell: (row) => (
      <Figure
        value={row.nominalSpeedRpm === null ? null : formatEntered(row.nominalSpeedRpm)}
        unit="r/min"
      />
    ),
  },
  {
    id: 'criticality',
    header: 'Criticality',
    sortable: true,
    cell: (row) => capital(row.criticality),
  },
  {
    id: 'nextPlannedStopOn',
    header: 'Next stop',
    sortable: true,
    cell: (row) => (
      <Figure value={row.nextPlannedStopOn === null ? null : formatDay(row.nextPlannedStopOn)} />
    ),
  },
  { id: 'owner', header: 'Owner', cell: (row) => row.ownerName ?? <Figure value={null} /> },
  {
    id: 'points',
    header: 'Points',
    align: 'end',
    cell: (row) => <Figure value={String(row.pointCount)} />,
  },
  {
    id: 'findings',
    header: 'Active findings',
    align: 'end',
    cell: (row) =>
      row.openFindingCount === 0 ? (
        <Figure value="0" className="text-ink-faint" />
      ) : (
        <Figure value={String(row.openFindingCount)} className="font-semibold text-evidence" />
      ),
  },
];

/** The machine register, one page of it. */
export function MachineTable({
  siteId,
  rows,
  sort,
  onSort,
  fetching,
  empty,
}: {
  siteId: number;
  rows: readonly Row[];
  sort: TableSort;
  onSort: (sort: TableSort) => void;
  fetching: boolean;
  empty: React.ReactNode;
}) {
  return (
    <DataTable
      label="Machines"
      columns={columns(siteId)}
      rows={rows}
      rowId={(row) => row.id}
      sort={sort}
      onSort={onSort}
      fetching={fetching}
      empty={empty}
    />
  );
}

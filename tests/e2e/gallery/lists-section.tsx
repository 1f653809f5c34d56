import { useState } from 'react';
import { Link } from 'react-router-dom';
import { OrderStrip } from '#src/charts/order-strip.tsx';
import { DataTable, type DataTableColumn, type TableSort } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Button } from '#src/components/button.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { Select } from '#src/components/select.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { verdicts, type Verdict } from '#shared/signal/screening-types.ts';
import { healthyMarks, looseMarks } from './sample-signals.ts';

interface Row {
  id: number;
  tag: string;
  name: string;
  point: string;
  verdict: Verdict;
  speedRpm: number;
  overall: number;
}

const names = ['Cooling-water pump', 'Vacuum pump', 'Stock chest agitator', 'Exhaust fan'];
const many: Row[] = Array.from({ length: 20_000 }, (_, i) => ({
  id: i + 1,
  tag: `P-${2100 + i}`,
  name: names[i % names.length] ?? '',
  point: ['drive end, horizontal', 'free end, vertical', 'drive end, axial'][i % 3] ?? '',
  verdict: verdicts[(i * 7) % 4] ?? 'none',
  speedRpm: 990 + ((i * 37) % 2000),
  overall: 0.4 + ((i * 13) % 90) / 10,
}));
const few = many.slice(0, 9);

const columns: DataTableColumn<Row>[] = [
  {
    id: 'machineTag',
    header: 'Machine',
    sortable: true,
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={`/machines/${row.id}`}>
        {row.tag}
      </Link>
    ),
  },
  { id: 'name', header: 'Name', cell: (row) => row.name },
  { id: 'point', header: 'Point', cell: (row) => row.point },
  {
    id: 'verdict',
    header: 'Verdict',
    sortable: true,
    cell: (row) => <VerdictMark verdict={row.verdict} />,
  },
  {
    id: 'orders',
    header: 'Orders 1/3 to 20',
    cell: (row) => <OrderStrip marks={row.verdict === 'likely' ? looseMarks : healthyMarks} />,
  },
  {
    id: 'speed',
    header: 'Speed',
    align: 'end',
    cell: (row) => <Figure value={String(row.speedRpm)} unit="r/min" />,
  },
  {
    id: 'overall',
    header: 'Overall',
    align: 'end',
    sortable: true,
    cell: (row) => (
      <Figure value={row.verdict === 'retake' ? null : row.overall.toFixed(1)} unit="mm/s" />
    ),
  },
];

export function ListsSection() {
  const [sort, setSort] = useState<TableSort>({ column: 'overall', direction: 'desc' });
  const [page, setPage] = useState(1);
  return (
    <div className="flex flex-col gap-4">
      <div className="flex flex-wrap items-end gap-3">
        <SearchInput
          className="w-64"
          label="Search machines"
          placeholder="Tag or name"
          value=""
          onSearch={() => undefined}
        />
        <label className="flex items-center gap-2 text-sm">
          Verdict
          <Select placeholder="All" options={[{ value: 'likely', label: 'Looseness likely' }]} />
        </label>
      </div>
      <DataTable
        label="Review queue"
        columns={columns}
        rows={few}
        rowId={(row) => row.id}
        sort={sort}
        onSort={setSort}
        selectedId={3}
        empty={null}
      />
      <Pager
        page={page}
        pageSize={25}
        total={212}
        noun="screenings"
        onPage={setPage}
        onPageSize={() => undefined}
      />
      <DataTable
        label="Twenty thousand"
        columns={columns}
        rows={many}
        rowId={(row) => row.id}
        empty={null}
        virtual={{ heightPx: 260 }}
      />
      <DataTable
        label="Nothing"
        columns={columns}
        rows={[]}
        rowId={(row) => row.id}
        empty={
          <EmptyState
            title="No survey yet"
            action={<Button variant="primary">Upload a survey</Button>}
          >
            A survey is one walk of a route. Choose the route and drop the files of its waveforms.
          </EmptyState>
        }
      />
    </div>
  );
}

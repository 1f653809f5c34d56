import { useTable, type ColumnDef, type SortingState } from '@tanstack/react-table';
import { useMemo, useRef, type ReactNode } from 'react';
import {
  dataTableFeatures,
  type DataTableColumn,
  type DataTableFeatures,
} from './data-table-column.ts';
import { DataTableBody } from './data-table-body.tsx';
import { DataTableHead } from './data-table-head.tsx';

// Pages import the table and its column type together.
export type { DataTableColumn };

export interface TableSort {
  column: string;
  direction: 'asc' | 'desc';
}

export interface DataTableProps<Row> {
  /** Names the table for screen readers. */
  label: string;
  columns: readonly DataTableColumn<Row>[];
  /** One page (or all) of the rows, sorted and filtered by the server. */
  rows: readonly Row[];
  rowId: (row: Row) => string | number;
  sort?: TableSort;
  onSort?: (sort: TableSort) => void;
  /** The next page is on its way: the old one stays in sight. */
  fetching?: boolean;
  /** Shown instead of rows where there are none. */
  empty: ReactNode;
  /** Emphasised row, e.g. the one whose details are open. */
  selectedId?: string | number;
  /** Renders only the rows in sight; for lists of thousands. */
  virtual?: { heightPx: number; rowHeightPx?: number };
}

/** A dense list whose sorting, filters and pages are the server's. */
export function DataTable<Row extends object>({
  label,
  columns,
  rows,
  rowId,
  sort,
  onSort,
  fetching = false,
  empty,
  selectedId,
  virtual,
}: DataTableProps<Row>) {
  const columnDefs = useMemo(
    () =>
      columns.map((column): ColumnDef<DataTableFeatures, Row> => ({
        id: column.id,
        header: column.header,
        // Only columns with an accessor can be sorted; the server sorts, so it is never read.
        accessorFn: () => null,
        enableSorting: column.sortable ?? false,
        sortDescFirst: false,
        cell: ({ row }) => column.cell(row.original),
      })),
    [columns],
  );
  const sorting = useMemo<SortingState>(
    () => (sort ? [{ id: sort.column, desc: sort.direction === 'desc' }] : []),
    [sort],
  );
  const table = useTable({
    features: dataTableFeatures,
    columns: columnDefs,
    data: rows,
    getRowId: (row) => String(rowId(row)),
    state: { sorting },
    enableSortingRemoval: false,
    onSortingChange: (change) => {
      const [next] = typeof change === 'function' ? change(sorting) : change;
      if (next) onSort?.({ column: next.id, direction: next.desc ? 'desc' : 'asc' });
    },
  });
  const scroller = useRef<HTMLDivElement>(null);

  if (rows.length === 0 && !fetching) return <>{empty}</>;
  return (
    // Scrolls sideways on its own where it is too wide, so it must be reachable by keyboard.
    <div
      ref={scroller}
      role="region"
      aria-label={label}
      tabIndex={0}
      aria-busy={fetching || undefined}
      className="relative overflow-auto border border-hairline bg-sheet"
      style={virtual ? { maxHeight: `${virtual.heightPx}px` } : undefined}
    >
      <table
        aria-label={label}
        aria-rowcount={virtual ? rows.length + 1 : undefined}
        className={`w-full border-separate border-spacing-0 text-sm ${fetching ? 'opacity-60' : ''}`}
      >
        <DataTableHead table={table} columns={columns} />
        <DataTableBody
          table={table}
          columns={columns}
          scroller={scroller}
          selectedId={selectedId === undefined ? undefined : String(selectedId)}
          virtual={virtual}
        />
      </table>
    </div>
  );
}

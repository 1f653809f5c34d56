import type { ReactTable, Row as TableRow } from '@tanstack/react-table';
import { useVirtualizer } from '@tanstack/react-virtual';
import type { RefObject } from 'react';
import { classNames } from './class-names.ts';
import type { DataTableColumn, DataTableFeatures } from './data-table-column.ts';

interface DataTableBodyProps<Row extends object> {
  table: ReactTable<DataTableFeatures, Row>;
  columns: readonly DataTableColumn<Row>[];
  scroller: RefObject<HTMLDivElement | null>;
  selectedId: string | undefined;
  virtual: { heightPx: number; rowHeightPx?: number } | undefined;
}

const defaultRowHeightPx = 34;

export function DataTableBody<Row extends object>(props: DataTableBodyProps<Row>) {
  return props.virtual ? <VirtualBody {...props} /> : <PlainBody {...props} />;
}

function PlainBody<Row extends object>({ table, columns, selectedId }: DataTableBodyProps<Row>) {
  return (
    <tbody>
      {table.getRowModel().rows.map((row) => (
        <BodyRow
          key={row.id}
          table={table}
          row={row}
          columns={columns}
          selected={row.id === selectedId}
        />
      ))}
    </tbody>
  );
}

function VirtualBody<Row extends object>({
  table,
  columns,
  scroller,
  selectedId,
  virtual,
}: DataTableBodyProps<Row>) {
  const { rows } = table.getRowModel();
  const rowHeightPx = virtual?.rowHeightPx ?? defaultRowHeightPx;
  const virtualizer = useVirtualizer({
    count: rows.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => rowHeightPx,
    overscan: 12,
    initialRect: { width: 0, height: virtual?.heightPx ?? 0 },
  });
  const items = virtualizer.getVirtualItems();
  const before = items[0]?.start ?? 0;
  const after = virtualizer.getTotalSize() - (items[items.length - 1]?.end ?? 0);
  // Empty rows above and below keep the scroll bar honest and the table a table.
  return (
    <tbody>
      {before > 0 && (
        <tr aria-hidden="true">
          <td colSpan={columns.length} style={{ height: `${before}px`, padding: 0 }} />
        </tr>
      )}
      {items.map((item) => {
        const row = rows[item.index];
        return (
          row && (
            <BodyRow
              key={row.id}
              table={table}
              row={row}
              columns={columns}
              selected={row.id === selectedId}
              rowIndex={item.index + 2}
              heightPx={rowHeightPx}
            />
          )
        );
      })}
      {after > 0 && (
        <tr aria-hidden="true">
          <td colSpan={columns.length} style={{ height: `${after}px`, padding: 0 }} />
        </tr>
      )}
    </tbody>
  );
}

function BodyRow<Row extends object>({
  table,
  row,
  columns,
  selected,
  rowIndex,
  heightPx,
}: {
  table: ReactTable<DataTableFeatures, Row>;
  row: TableRow<DataTableFeatures, Row>;
  columns: readonly DataTableColumn<Row>[];
  selected: boolean;
  rowIndex?: number;
  heightPx?: number;
}) {
  return (
    <tr
      aria-rowindex={rowIndex}
      aria-current={selected || undefined}
      style={heightPx === undefined ? undefined : { height: `${heightPx}px` }}
      className={classNames('hover:bg-well', selected && 'bg-well')}
    >
      {row.getAllCells().map((cell, index) => {
        const column = columns[index];
        const Cell = column?.rowHeader ? 'th' : 'td';
        return (
          <Cell
            key={cell.id}
            scope={column?.rowHeader ? 'row' : undefined}
            className={classNames(
              'border-b border-hairline px-3 py-1.5',
              column?.rowHeader && 'text-left font-medium',
              column?.align === 'end' && 'text-right',
              heightPx !== undefined && 'whitespace-nowrap',
              selected && index === 0 && 'shadow-[inset_4px_0_0_0_var(--tone-ink)]',
            )}
          >
            <table.FlexRender cell={cell} />
          </Cell>
        );
      })}
    </tr>
  );
}

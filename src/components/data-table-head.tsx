import type { ReactTable } from '@tanstack/react-table';
import type { DataTableColumn, DataTableFeatures } from './data-table-column.ts';
import { Icon } from './icon.tsx';

interface DataTableHeadProps<Row extends object> {
  table: ReactTable<DataTableFeatures, Row>;
  columns: readonly DataTableColumn<Row>[];
}

export function DataTableHead<Row extends object>({ table, columns }: DataTableHeadProps<Row>) {
  return (
    <thead>
      {table.getHeaderGroups().map((group) => (
        <tr key={group.id}>
          {group.headers.map((header, index) => {
            const column = columns[index];
            const sorted = header.column.getIsSorted();
            return (
              <th
                key={header.id}
                scope="col"
                aria-sort={
                  sorted === false ? undefined : sorted === 'asc' ? 'ascending' : 'descending'
                }
                style={{ width: column?.width }}
                className={`lettering sticky top-0 z-10 border-b border-ink bg-sheet px-3 py-1 whitespace-nowrap ${column?.align === 'end' ? 'text-right' : 'text-left'}`}
              >
                {header.column.getCanSort() ? (
                  <button
                    type="button"
                    onClick={header.column.getToggleSortingHandler()}
                    className={`-mx-1 inline-flex min-h-6 cursor-pointer items-center gap-1 px-1 font-[inherit] hover:bg-well ${sorted === false ? '' : 'underline underline-offset-4'}`}
                  >
                    {column?.header}
                    <span className={sorted === false ? 'opacity-35' : ''}>
                      <Icon name={sorted === 'desc' ? 'descending' : 'ascending'} size={12} />
                    </span>
                  </button>
                ) : (
                  <span className="inline-flex min-h-6 items-center">{column?.header}</span>
                )}
              </th>
            );
          })}
        </tr>
      ))}
    </thead>
  );
}

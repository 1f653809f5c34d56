import type { ReactNode } from 'react';
import type { ImportRow } from '#shared/contracts/register-import.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { StateMark } from '#src/components/state-mark.tsx';
import { fateShapes, fateWords } from './import-words.ts';

const shown = (value: string) => (value === '' ? 'empty' : value);

function What({ row }: { row: ImportRow }) {
  if (row.faults.length > 0) {
    return (
      <ul className="flex flex-col gap-1.5">
        {row.faults.map((fault, index) => (
          <li key={index} className="break-words">
            <strong>{fault.column}</strong>: {fault.reason}{' '}
            <span className="text-ink-soft">{fault.remedy}</span>
          </li>
        ))}
      </ul>
    );
  }
  return (
    <ul className="flex flex-col gap-0.5">
      {row.changes.map(({ column, before, after }) => (
        <li key={column} className="break-words">
          <strong>{column}</strong>: <span className="text-ink-soft">{shown(before)}</span> becomes{' '}
          {shown(after)}
        </li>
      ))}
    </ul>
  );
}

const columns: DataTableColumn<ImportRow>[] = [
  {
    id: 'rowNumber',
    header: 'Row',
    align: 'end',
    width: '4rem',
    cell: (row) => <Figure value={String(row.rowNumber)} />,
  },
  {
    id: 'fate',
    header: 'Fate',
    width: '8rem',
    cell: (row) => (
      <StateMark shape={fateShapes[row.fate]} strong={row.fate === 'wrong'}>
        {fateWords[row.fate]}
      </StateMark>
    ),
  },
  {
    id: 'label',
    header: 'What',
    rowHeader: true,
    width: '16rem',
    cell: (row) => <span className="figures break-all">{row.label || 'no tag'}</span>,
  },
  { id: 'detail', header: 'What changes or is wrong', cell: (row) => <What row={row} /> },
];

/** What becomes of each row of a file, a page at a time. */
export function FateTable(props: {
  rows: readonly ImportRow[];
  fetching: boolean;
  empty: ReactNode;
}) {
  return <DataTable {...props} label="Rows of the file" columns={columns} rowId={({ id }) => id} />;
}

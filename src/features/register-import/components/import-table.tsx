import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { RegisterImportResponse } from '#shared/contracts/register-import.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { StateMark } from '#src/components/state-mark.tsx';
import { formatInstant } from '#src/lib/dates.ts';
import { kindWords, stateShapes, stateWords } from './import-words.ts';

const count = (
  id: 'new' | 'changed' | 'wrong',
  header: string,
): DataTableColumn<RegisterImportResponse> => ({
  id,
  header,
  align: 'end',
  cell: (row) => <Figure value={String(row.counts[id])} />,
});

const columns = (siteId: number): DataTableColumn<RegisterImportResponse>[] => [
  {
    id: 'fileName',
    header: 'File',
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link break-all" to={`/sites/${siteId}/machines/import/${row.id}`}>
        {row.fileName}
      </Link>
    ),
  },
  { id: 'kind', header: 'Kind', cell: (row) => kindWords[row.kind] },
  {
    id: 'state',
    header: 'State',
    cell: (row) => <StateMark shape={stateShapes[row.state]}>{stateWords[row.state]}</StateMark>,
  },
  count('new', 'New'),
  count('changed', 'Changed'),
  count('wrong', 'Wrong'),
  {
    id: 'uploadedAt',
    header: 'Sent',
    cell: (row) => (
      <>
        <Figure value={formatInstant(row.uploadedAt)} /> {row.uploadedByName}
      </>
    ),
  },
];

/** Imports of the site, newest first. */
export function ImportTable({
  siteId,
  ...rest
}: {
  siteId: number;
  rows: readonly RegisterImportResponse[];
  fetching: boolean;
  empty: ReactNode;
}) {
  return <DataTable {...rest} label="Imports" columns={columns(siteId)} rowId={(row) => row.id} />;
}

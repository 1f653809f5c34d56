import type { OwnerLoad } from '#shared/contracts/desk.ts';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';

const columns: DataTableColumn<OwnerLoad>[] = [
  { id: 'name', header: 'Asset owner', rowHeader: true, cell: (owner) => owner.name },
  {
    id: 'machines',
    header: 'Machines',
    align: 'end',
    cell: (owner) => <Figure value={String(owner.machineCount)} />,
  },
  {
    id: 'open',
    header: 'Open',
    align: 'end',
    cell: (owner) => <Figure value={String(owner.openCount)} />,
  },
  {
    id: 'overdue',
    header: 'Overdue',
    align: 'end',
    cell: (owner) =>
      owner.overdueCount > 0 ? (
        <strong className="figures">{owner.overdueCount}</strong>
      ) : (
        <Figure value="0" />
      ),
  },
];

/** How much each asset owner has on hand. */
export function LoadTable({ owners }: { owners: readonly OwnerLoad[] }) {
  return (
    <DataTable
      label="Asset owners and what they have on hand"
      columns={columns}
      rows={owners}
      rowId={(owner) => owner.userId}
      empty={
        <EmptyState title="This site has no asset owner">
          An administrator gives people the role; without one nothing can be assigned.
        </EmptyState>
      }
    />
  );
}

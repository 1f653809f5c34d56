import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { machineListQuery as machineListContract } from '#shared/contracts/machine.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { Select } from '#src/components/select.tsx';
import { machineListQuery } from '#src/features/register/api/machines.ts';
import { MachineTable } from '#src/features/register/components/machine-table.tsx';
import {
  criticalityOptions,
  kindOptions,
} from '#src/features/register/components/machine-words.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

export const machinesLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(machineListContract, new URL(request.url).searchParams);
    await queryClient.ensureQueryData(machineListQuery(Number(params.siteId), query));
    return null;
  };

export function MachinesPage() {
  const { siteId, role } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(machineListContract, search);
  const { data, isFetching } = useQuery({
    ...machineListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const filtered = Boolean(query.search ?? query.kind ?? query.criticality);
  const mayEdit = role === 'lead';
  const create = mayEdit && (
    <ButtonLink to="new" icon="plus" variant="primary">
      New machine
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title="Machines"
        facts={[{ label: 'On record', value: data?.total ?? '–' }]}
        actions={
          role !== 'owner' && (
            <>
              {create}
              <ButtonLink to="import" icon={mayEdit ? 'upload' : 'download'}>
                {mayEdit ? 'Import and export' : 'Export'}
              </ButtonLink>
            </>
          )
        }
      />
      <div className="mb-3 flex flex-wrap gap-3">
        <SearchInput
          label="Search by tag or name"
          placeholder="Tag or name"
          className="w-64"
          value={query.search ?? ''}
          onSearch={(text) => set({ search: text })}
        />
        <Select
          aria-label="Kind"
          className="w-44"
          placeholder="Every kind"
          value={query.kind ?? ''}
          options={kindOptions}
          onChange={(event) => set({ kind: event.target.value })}
        />
        <Select
          aria-label="Criticality"
          className="w-48"
          placeholder="Every criticality"
          value={query.criticality ?? ''}
          options={criticalityOptions}
          onChange={(event) => set({ criticality: event.target.value })}
        />
      </div>
      <MachineTable
        siteId={siteId}
        rows={data?.items ?? []}
        sort={{ column: query.sort, direction: query.direction }}
        onSort={({ column, direction }) => set({ sort: column, direction })}
        fetching={isFetching}
        empty={
          filtered ? (
            <EmptyState title="No machine fits these filters">
              Take a filter away or search for another tag.
            </EmptyState>
          ) : (
            <EmptyState title="No machines on record" action={create}>
              {mayEdit
                ? 'Enter the first machine, then its bearing positions and measuring points.'
                : 'The reliability lead enters machines, and decides who owns them.'}
            </EmptyState>
          )
        }
      />
      {data && data.total > 0 && (
        <Pager
          noun="machines"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
          onPageSize={(pageSize) => set({ pageSize })}
        />
      )}
    </>
  );
}

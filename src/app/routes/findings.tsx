import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import {
  findingListQuery as findingListContract,
  findingStates,
} from '#shared/contracts/finding.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { Select } from '#src/components/select.tsx';
import { findingStateWords } from '#src/components/work-state-mark.tsx';
import { findingListQuery } from '#src/features/findings/api/findings.ts';
import { FindingTable } from '#src/features/findings/components/finding-table.tsx';
import { SaveFileButton } from '#src/features/papers/components/save-file-button.tsx';
import { withQuery } from '#src/lib/api-client.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

const stateOptions = [
  { value: 'active', label: 'Not done with' },
  { value: 'overdue', label: 'Monitored, decide again' },
  ...findingStates.map((state) => ({ value: state, label: findingStateWords[state] })),
];

const isFindingState = (value: string) => findingStates.some((state) => state === value);

export const findingsLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(findingListContract, new URL(request.url).searchParams);
    await queryClient.ensureQueryData(findingListQuery(Number(params.siteId), query));
    return null;
  };

export function FindingsPage() {
  const { siteId, role } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(findingListContract, search);
  const { data, isFetching } = useQuery({
    ...findingListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const isFiltered = Boolean(query.search ?? query.state ?? query.active ?? query.overdue);
  return (
    <>
      <PageHeader
        title="Findings"
        facts={[{ label: isFiltered ? 'Shown' : 'In all', value: data?.total ?? '–' }]}
        actions={
          (data?.total ?? 0) > 0 && (
            <SaveFileButton
              path={withQuery(`/api/sites/${siteId}/exports/findings`, {
                search: query.search,
                state: query.state,
                active: query.active,
                overdue: query.overdue,
              })}
              fileName="findings.csv"
            >
              Save as CSV
            </SaveFileButton>
          )
        }
      />
      <div className="mb-3 flex flex-wrap gap-3">
        <SearchInput
          label="Search by machine or bearing position"
          placeholder="Tag, machine or position"
          className="w-64"
          value={query.search ?? ''}
          onSearch={(text) => set({ search: text })}
        />
        <Select
          aria-label="State"
          className="w-48"
          placeholder="Every state"
          value={query.active ? 'active' : query.overdue ? 'overdue' : (query.state ?? '')}
          options={stateOptions}
          onChange={({ target }) =>
            set({
              active: target.value === 'active' ? 'true' : undefined,
              overdue: target.value === 'overdue' ? 'true' : undefined,
              state: isFindingState(target.value) ? target.value : undefined,
            })
          }
        />
      </div>
      <FindingTable
        siteId={siteId}
        rows={data?.items ?? []}
        sort={{ column: query.sort, direction: query.direction }}
        onSort={({ column, direction }) => set({ sort: column, direction })}
        fetching={isFetching}
        empty={
          isFiltered ? (
            <EmptyState title="No finding fits these filters">
              Choose another state or search for another machine.
            </EmptyState>
          ) : (
            <EmptyState
              title="No findings yet"
              action={
                role !== 'owner' && (
                  <ButtonLink to={`/sites/${siteId}/review`}>Review flags</ButtonLink>
                )
              }
            >
              {role === 'owner'
                ? 'Nothing has been found on the machines you own.'
                : 'A finding begins when an analyst accepts a flag at the review desk.'}
            </EmptyState>
          )
        }
      />
      {data && data.total > 0 && (
        <Pager
          noun="findings"
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

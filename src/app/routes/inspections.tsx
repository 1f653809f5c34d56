import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import {
  inspectionListQuery as inspectionListContract,
  inspectionStates,
} from '#shared/contracts/inspection.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { Select } from '#src/components/select.tsx';
import { inspectionStateWords } from '#src/components/work-state-mark.tsx';
import { calendarFeedQuery } from '#src/features/calendar/api/calendar.ts';
import { CalendarPanel } from '#src/features/calendar/components/calendar-panel.tsx';
import { inspectionListQuery } from '#src/features/inspections/api/inspections.ts';
import { InspectionTable } from '#src/features/inspections/components/inspection-table.tsx';
import { SaveFileButton } from '#src/features/papers/components/save-file-button.tsx';
import { withQuery } from '#src/lib/api-client.ts';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

const stateOptions = [
  { value: 'active', label: 'Not done with' },
  ...inspectionStates.map((state) => ({ value: state, label: inspectionStateWords[state] })),
];

export const inspectionsLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(inspectionListContract, new URL(request.url).searchParams);
    const siteId = Number(params.siteId);
    const session = await queryClient.ensureQueryData(sessionQuery());
    const isOwner = session?.memberships.some(
      (one) => one.siteId === siteId && one.role === 'owner',
    );
    await Promise.all([
      queryClient.ensureQueryData(inspectionListQuery(siteId, query)),
      ...(isOwner ? [queryClient.ensureQueryData(calendarFeedQuery(siteId))] : []),
    ]);
    return null;
  };

export function InspectionsPage() {
  const { siteId, role } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(inspectionListContract, search);
  const { data, isFetching } = useQuery({
    ...inspectionListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const isFiltered = Boolean(query.search ?? query.state ?? query.active);
  return (
    <>
      <PageHeader
        title="Inspections"
        facts={[{ label: isFiltered ? 'Shown' : 'In all', value: data?.total ?? '–' }]}
        actions={
          (data?.total ?? 0) > 0 && (
            <SaveFileButton
              path={withQuery(`/api/sites/${siteId}/exports/inspections`, {
                search: query.search,
                state: query.state,
                active: query.active,
              })}
              fileName="inspections.csv"
            >
              Save as CSV
            </SaveFileButton>
          )
        }
      />
      <div className="mb-3 flex flex-wrap gap-3">
        <SearchInput
          label="Search by machine, position or work order"
          placeholder="Machine or work order"
          className="w-64"
          value={query.search ?? ''}
          onSearch={(text) => set({ search: text })}
        />
        <Select
          aria-label="State"
          className="w-48"
          placeholder="Every state"
          value={query.active ? 'active' : (query.state ?? '')}
          options={stateOptions}
          onChange={({ target }) =>
            set(
              target.value === 'active'
                ? { active: 'true', state: undefined }
                : { active: undefined, state: target.value },
            )
          }
        />
      </div>
      <InspectionTable
        siteId={siteId}
        rows={data?.items ?? []}
        sort={{ column: query.sort, direction: query.direction }}
        onSort={({ column, direction }) => set({ sort: column, direction })}
        fetching={isFetching}
        empty={
          isFiltered ? (
            <EmptyState title="No inspection fits these filters">
              Choose another state or search for another machine.
            </EmptyState>
          ) : (
            <EmptyState
              title="No inspections yet"
              action={
                role !== 'owner' && (
                  <ButtonLink to={`/sites/${siteId}/findings`}>Findings</ButtonLink>
                )
              }
            >
              {role === 'owner'
                ? 'You will get an e-mail when the reliability lead asks you to inspect a fit.'
                : 'The reliability lead assigns an inspection from the page of a finding.'}
            </EmptyState>
          )
        }
      />
      {data && data.total > 0 && (
        <Pager
          noun="inspections"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
          onPageSize={(pageSize) => set({ pageSize })}
        />
      )}
      {role === 'owner' && (
        <div className="mt-6 max-w-2xl">
          <CalendarPanel siteId={siteId} whose="the inspections that are yours to do" />
        </div>
      )}
    </>
  );
}

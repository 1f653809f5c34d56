import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import { Link, type LoaderFunctionArgs } from 'react-router-dom';
import {
  routeListQuery as routeListContract,
  type RouteListResponse,
} from '#shared/contracts/route.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { routeListQuery } from '#src/features/register/api/routes.ts';
import { formatDay } from '#src/lib/dates.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

export const routesLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(routeListContract, new URL(request.url).searchParams);
    await queryClient.ensureQueryData(routeListQuery(Number(params.siteId), query));
    return null;
  };

type Row = RouteListResponse['items'][number];
const columns = (siteId: number): DataTableColumn<Row>[] => [
  {
    id: 'name',
    header: 'Route',
    sortable: true,
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link" to={`/sites/${siteId}/routes/${row.id}`}>
        {row.name}
      </Link>
    ),
  },
  {
    id: 'pointCount',
    header: 'Points',
    sortable: true,
    align: 'end',
    cell: (row) => <Figure value={String(row.pointCount)} />,
  },
  {
    id: 'surveyCount',
    header: 'Surveys',
    align: 'end',
    cell: (row) => <Figure value={String(row.surveyCount)} />,
  },
  {
    id: 'lastSurveyedOn',
    header: 'Last survey',
    sortable: true,
    cell: (row) => (
      <Figure value={row.lastSurveyedOn === null ? null : formatDay(row.lastSurveyedOn)} />
    ),
  },
];

export function RoutesPage() {
  const { siteId, role } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(routeListContract, search);
  const { data, isFetching } = useQuery({
    ...routeListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const create = role === 'lead' && (
    <ButtonLink to="new" icon="plus" variant="primary">
      New route
    </ButtonLink>
  );
  return (
    <>
      <PageHeader title="Routes" actions={create} />
      <SearchInput
        label="Search by name"
        placeholder="Name"
        className="mb-3 w-64"
        value={query.search ?? ''}
        onSearch={(text) => set({ search: text })}
      />
      <DataTable
        label="Routes"
        columns={columns(siteId)}
        rows={data?.items ?? []}
        rowId={(row) => row.id}
        sort={{ column: query.sort, direction: query.direction }}
        onSort={({ column, direction }) => set({ sort: column, direction })}
        fetching={isFetching}
        empty={
          query.search ? (
            <EmptyState title="No route of that name" />
          ) : (
            <EmptyState title="No routes yet" action={create}>
              A route lists the measuring points in the order they are walked. Surveys are made of
              it.
            </EmptyState>
          )
        }
      />
      {data && data.total > data.pageSize && (
        <Pager
          noun="routes"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
        />
      )}
    </>
  );
}

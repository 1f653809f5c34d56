import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import { Link, type LoaderFunctionArgs } from 'react-router-dom';
import {
  surveyListQuery as surveyListContract,
  type SurveyListResponse,
} from '#shared/contracts/survey.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';
import { surveyListQuery } from '#src/features/surveys/api/surveys.ts';
import { SurveyStanding } from '#src/features/surveys/components/survey-standing.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

export const surveysLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(surveyListContract, new URL(request.url).searchParams);
    await queryClient.ensureQueryData(surveyListQuery(Number(params.siteId), query));
    return null;
  };

type Row = SurveyListResponse['items'][number];
const columns = (siteId: number): DataTableColumn<Row>[] => [
  {
    id: 'surveyedOn',
    header: 'Date',
    sortable: true,
    width: '8rem',
    rowHeader: true,
    cell: (row) => (
      <Link className="ink-link figures" to={`/sites/${siteId}/surveys/${row.id}`}>
        {formatDay(row.surveyedOn)}
      </Link>
    ),
  },
  { id: 'routeName', header: 'Route', sortable: true, cell: (row) => row.routeName },
  {
    id: 'measured',
    header: 'Points measured',
    align: 'end',
    cell: ({ counts }) => <Figure value={`${counts.measuredPointCount} of ${counts.pointCount}`} />,
  },
  { id: 'standing', header: 'Verdicts', cell: ({ counts }) => <SurveyStanding counts={counts} /> },
  {
    id: 'undecided',
    header: 'To be reviewed',
    align: 'end',
    cell: ({ id, counts }) =>
      counts.undecidedFlagCount === 0 ? (
        <Figure value="0" />
      ) : (
        <Link className="ink-link figures" to={`/sites/${siteId}/review?surveyId=${id}`}>
          {counts.undecidedFlagCount}
        </Link>
      ),
  },
  { id: 'createdBy', header: 'Made by', cell: (row) => row.createdByName },
];

export function SurveysPage() {
  const { siteId } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(surveyListContract, search);
  const { data, isFetching } = useQuery({
    ...surveyListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const create = (
    <ButtonLink to="new" icon="plus" variant="primary">
      New survey
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title="Surveys"
        facts={[{ label: 'On record', value: data?.total ?? '–' }]}
        actions={create}
      />
      <SearchInput
        label="Search by route"
        placeholder="Route"
        className="mb-3 w-64"
        value={query.search ?? ''}
        onSearch={(text) => set({ search: text })}
      />
      <DataTable
        label="Surveys"
        columns={columns(siteId)}
        rows={data?.items ?? []}
        rowId={(row) => row.id}
        sort={{ column: query.sort, direction: query.direction }}
        onSort={({ column, direction }) => set({ sort: column, direction })}
        fetching={isFetching}
        empty={
          query.search ? (
            <EmptyState title="No survey of such a route" />
          ) : (
            <EmptyState title="No surveys yet" action={create}>
              A survey is one walk of a route on one date. Make one, then add the waveforms that
              were recorded on it.
            </EmptyState>
          )
        }
      />
      {data && data.total > data.pageSize && (
        <Pager
          noun="surveys"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
        />
      )}
    </>
  );
}

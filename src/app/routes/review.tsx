import { keepPreviousData, useQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { reviewQueueQuery as reviewQueueContract } from '#shared/contracts/review.ts';
import { verdicts } from '#shared/signal/screening-types.ts';
import { Button } from '#src/components/button.tsx';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { Select } from '#src/components/select.tsx';
import { verdictWords } from '#src/components/verdict-mark.tsx';
import { reviewQueueQuery } from '#src/features/review/api/review.ts';
import {
  keepPlotSettings,
  preferredPlotSettings,
} from '#src/features/review/components/plot-preferences.ts';
import {
  readPlotSettings,
  settingTexts,
} from '#src/features/review/components/plot-settings-value.ts';
import { ReviewDesk } from '#src/features/review/components/review-desk.tsx';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

const verdictOptions = verdicts
  .filter((verdict) => verdict !== 'none')
  .map((verdict) => ({ value: verdict, label: verdictWords[verdict] }));

export const reviewLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const query = readListQuery(reviewQueueContract, new URL(request.url).searchParams);
    await queryClient.ensureQueryData(reviewQueueQuery(Number(params.siteId), query));
    return null;
  };

function readScreeningId(search: URLSearchParams): number | undefined {
  const id = Number(search.get('screening'));
  return Number.isSafeInteger(id) && id > 0 ? id : undefined;
}

const flagProblems = (search: URLSearchParams): string[] =>
  search.has('screening') && readScreeningId(search) === undefined
    ? [`“${search.get('screening')}” is no flag.`]
    : [];

export function ReviewPage() {
  const { siteId, session } = useSite();
  const { search, set } = useListAddress();
  const query = readListQuery(reviewQueueContract, search);
  const screeningId = readScreeningId(search);
  // Read anew with each render: a choice made here is the preference at once.
  const plots = readPlotSettings(search, preferredPlotSettings(session.userId));
  const { data } = useQuery({
    ...reviewQueueQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const items = data?.items ?? [];
  const isFiltered = query.surveyId !== undefined || query.verdict !== undefined;
  const page = query.page === 1 ? undefined : query.page;
  return (
    <>
      <PageHeader
        title="Review"
        facts={[
          {
            label: query.show === 'open' ? 'Waiting' : 'Decided',
            value: data?.total ?? '–',
          },
          ...(query.surveyId === undefined
            ? []
            : [
                {
                  label: 'Of one survey',
                  value: (
                    <Button
                      size="small"
                      variant="quiet"
                      icon="close"
                      onClick={() => set({ surveyId: undefined, screening: undefined })}
                    >
                      Show all
                    </Button>
                  ),
                },
              ]),
        ]}
        actions={
          <>
            <Select
              aria-label="Verdict"
              className="w-56"
              placeholder="Every verdict"
              value={query.verdict ?? ''}
              options={verdictOptions}
              onChange={({ target }) => set({ verdict: target.value, screening: undefined })}
            />
            <Select
              aria-label="Which flags"
              className="w-36"
              value={query.show}
              options={[
                { value: 'open', label: 'Waiting' },
                { value: 'decided', label: 'Decided' },
              ]}
              onChange={({ target }) =>
                set({
                  show: target.value === 'open' ? undefined : target.value,
                  screening: undefined,
                })
              }
            />
          </>
        }
      />
      {data !== undefined && (
        <ReviewDesk
          siteId={siteId}
          items={items}
          screeningId={screeningId}
          search={search}
          plotSettings={plots.settings}
          problems={[...flagProblems(search), ...plots.problems]}
          empty={
            <EmptyState
              title={
                query.show === 'decided'
                  ? 'Nothing has been decided'
                  : 'No flag waits for a decision'
              }
              action={
                <>
                  <ButtonLink to={`/sites/${siteId}/surveys`}>Surveys</ButtonLink>
                  <ButtonLink to={`/sites/${siteId}/findings`}>Findings</ButtonLink>
                </>
              }
            >
              {isFiltered
                ? 'Nothing here fits the filters; take one away to see the rest of the queue.'
                : 'Flags come from surveys: upload the next one, or look at the findings that were made.'}
            </EmptyState>
          }
          onSelect={(id) => set({ screening: id, page })}
          onPlotSettings={(changes) => {
            keepPlotSettings(session.userId, { ...plots.settings, ...changes });
            set({ ...settingTexts(changes), page });
          }}
          onAddress={(changes) => set({ ...changes, page })}
        />
      )}
      {data !== undefined && data.total > query.pageSize && (
        <Pager
          noun="flags"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(next) => set({ page: next, screening: undefined })}
        />
      )}
    </>
  );
}

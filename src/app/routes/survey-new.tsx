import { useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Notice } from '#src/components/notice.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { routeListQuery } from '#src/features/register/api/routes.ts';
import { surveyListQuery, useCreateSurvey } from '#src/features/surveys/api/surveys.ts';
import { SurveyForm } from '#src/features/surveys/components/survey-form.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatDay } from '#src/lib/dates.ts';
import { useSite } from '../site-context.ts';

const allRoutes = { pageSize: 200, sort: 'name' } as const;

export const surveyNewLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(routeListQuery(Number(params.siteId), allRoutes));
    return null;
  };

/** The calendar day where the person is, not in UTC. */
function localToday(): string {
  const now = new Date();
  const two = (value: number) => String(value).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

export function SurveyNewPage() {
  const { siteId, role } = useSite();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const { data: routes } = useSuspenseQuery(routeListQuery(siteId, allRoutes));
  // Newest first: a survey of the chosen day is among them unless it is years old.
  const { data: surveys } = useQuery(surveyListQuery(siteId, { pageSize: 200 }));
  const create = useCreateSurvey(siteId);
  const wanted = Number(search.get('routeId'));
  const known = routes.items.some(({ id }) => id === wanted);
  return (
    <>
      <PageHeader
        title="New survey"
        crumbs={[{ label: 'Surveys', to: `/sites/${siteId}/surveys` }, { label: 'New survey' }]}
      />
      {routes.items.length === 0 ? (
        <EmptyState
          title="No routes yet"
          action={
            role === 'lead' && (
              <ButtonLink to={`/sites/${siteId}/routes/new`} icon="plus" variant="primary">
                New route
              </ButtonLink>
            )
          }
        >
          A survey is one walk of a route, so the route comes first.
          {role !== 'lead' && ' Ask the reliability lead to make one.'}
        </EmptyState>
      ) : (
        <SurveyForm
          routes={routes.items}
          routeId={
            known ? wanted : routes.items.length === 1 ? (routes.items[0]?.id ?? null) : null
          }
          today={localToday()}
          saving={create.isPending}
          failure={create.isError ? toApiError(create.error) : null}
          existing={({ routeId, surveyedOn }) => {
            const there = surveys?.items.find(
              (survey) => survey.routeId === routeId && survey.surveyedOn === surveyedOn,
            );
            return (
              there && (
                <Notice
                  loud
                  title={`There is a survey of ${there.routeName} of ${formatDay(surveyedOn)}.`}
                >
                  <p className="mb-2">Waveforms of that day belong to it.</p>
                  <ButtonLink to={`/sites/${siteId}/surveys/${there.id}`} variant="primary">
                    Go to that survey
                  </ButtonLink>
                </Notice>
              )
            );
          }}
          onSave={(body) =>
            create.mutate(body, {
              onSuccess: (survey) => void navigate(`/sites/${siteId}/surveys/${survey.id}`),
            })
          }
        />
      )}
    </>
  );
}

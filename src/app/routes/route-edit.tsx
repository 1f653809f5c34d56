import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { PageHeader } from '#src/components/page-header.tsx';
import { useToast } from '#src/components/toast.tsx';
import { pointChoicesQuery, routeQuery, useSaveRoute } from '#src/features/register/api/routes.ts';
import { RouteForm } from '#src/features/register/components/route-form.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSite } from '../site-context.ts';

export const routeEditLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    const siteId = Number(params.siteId);
    await Promise.all([
      queryClient.ensureQueryData(pointChoicesQuery(siteId)),
      params.routeId === undefined
        ? null
        : queryClient.ensureQueryData(routeQuery(siteId, Number(params.routeId))),
    ]);
    return null;
  };

export function RouteNewPage() {
  const { siteId } = useSite();
  const navigate = useNavigate();
  const { data: choices } = useSuspenseQuery(pointChoicesQuery(siteId));
  const save = useSaveRoute(siteId);
  return (
    <>
      <PageHeader
        title="New route"
        crumbs={[{ label: 'Routes', to: `/sites/${siteId}/routes` }, { label: 'New route' }]}
      />
      <RouteForm
        choices={choices.points}
        saving={save.isPending}
        failure={save.isError ? toApiError(save.error) : null}
        onSave={(body) =>
          save.mutate(body, {
            onSuccess: (route) => void navigate(`/sites/${siteId}/routes/${route.id}`),
          })
        }
      />
    </>
  );
}

export function RouteEditPage() {
  const { siteId } = useSite();
  const routeId = Number(useParams().routeId);
  const navigate = useNavigate();
  const notify = useToast();
  const { data: choices } = useSuspenseQuery(pointChoicesQuery(siteId));
  const { data: route } = useSuspenseQuery(routeQuery(siteId, routeId));
  const save = useSaveRoute(siteId, routeId);
  return (
    <>
      <PageHeader
        title={`Edit ${route.name}`}
        crumbs={[
          { label: 'Routes', to: `/sites/${siteId}/routes` },
          { label: route.name, to: `/sites/${siteId}/routes/${routeId}` },
          { label: 'Edit' },
        ]}
      />
      <RouteForm
        route={{
          name: route.name,
          topFrequencyHz: route.topFrequencyHz,
          lineCount: route.lineCount,
          pointIds: route.points.map((point) => point.id),
        }}
        choices={choices.points}
        saving={save.isPending}
        failure={save.isError ? toApiError(save.error) : null}
        onSave={(body) =>
          save.mutate(
            { ...body, version: route.version },
            {
              onSuccess: () => {
                notify({ text: `${body.name} is saved.` });
                void navigate(`/sites/${siteId}/routes/${routeId}`);
              },
            },
          )
        }
      />
    </>
  );
}

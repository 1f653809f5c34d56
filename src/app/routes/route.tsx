import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { routeQuery } from '#src/features/register/api/routes.ts';
import { capital } from '#src/features/register/components/machine-words.ts';
import { formatEntered, formatSignificant } from '#src/lib/numbers.ts';
import { useSite } from '../site-context.ts';

export const routeLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(routeQuery(Number(params.siteId), Number(params.routeId)));
    return null;
  };

const columns = (siteId: number, order: Map<number, number>): DataTableColumn<PointChoice>[] => [
  {
    id: 'place',
    header: 'Place',
    align: 'end',
    width: '4rem',
    cell: (point) => <Figure value={String(order.get(point.id) ?? '')} />,
  },
  {
    id: 'point',
    header: 'Measuring point',
    rowHeader: true,
    cell: (point) => <span className="figures">{point.label}</span>,
  },
  {
    id: 'machine',
    header: 'Machine',
    cell: (point) => (
      <Link className="ink-link" to={`/sites/${siteId}/machines/${point.machineId}`}>
        {point.machineName}
      </Link>
    ),
  },
  { id: 'position', header: 'Bearing position', cell: (point) => point.positionName },
  { id: 'direction', header: 'Direction', cell: (point) => capital(point.direction) },
  {
    id: 'speed',
    header: 'Nominal speed',
    align: 'end',
    cell: (point) => (
      <Figure
        value={point.nominalSpeedRpm === null ? null : formatEntered(point.nominalSpeedRpm)}
        unit="r/min"
      />
    ),
  },
];

export function RoutePage() {
  const { siteId } = useSite();
  const routeId = Number(useParams().routeId);
  const { data: route } = useSuspenseQuery(routeQuery(siteId, routeId));
  const order = new Map(route.points.map((point, index) => [point.id, index + 1]));
  const durationS =
    route.topFrequencyHz === null || route.lineCount === null
      ? null
      : route.lineCount / route.topFrequencyHz;
  return (
    <>
      <PageHeader
        title={route.name}
        crumbs={[{ label: 'Routes', to: `/sites/${siteId}/routes` }, { label: route.name }]}
        facts={[
          { label: 'Points', value: <Figure value={String(route.points.length)} /> },
          {
            label: 'Top frequency',
            value: (
              <Figure
                value={route.topFrequencyHz === null ? null : formatEntered(route.topFrequencyHz)}
                unit="Hz"
              />
            ),
          },
          {
            label: 'Lines',
            value: <Figure value={route.lineCount === null ? null : String(route.lineCount)} />,
          },
          {
            label: 'Duration',
            value: (
              <Figure
                value={durationS === null ? null : formatSignificant(durationS, 3)}
                unit="s"
              />
            ),
          },
        ]}
        actions={
          <>
            {route.can.edit && <ButtonLink to="edit">Edit route</ButtonLink>}
            {route.can.startSurvey && (
              <ButtonLink
                variant="primary"
                icon="upload"
                to={`/sites/${siteId}/surveys/new?routeId=${route.id}`}
              >
                New survey
              </ButtonLink>
            )}
          </>
        }
      />
      <DataTable
        label="Points of the route"
        columns={columns(siteId, order)}
        rows={route.points}
        rowId={(point) => point.id}
        empty={<p className="text-sm text-ink-soft">This route has no points.</p>}
      />
    </>
  );
}

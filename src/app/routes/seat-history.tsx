import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { seatHistoryQuery } from '#src/features/seats/api/seats.ts';
import { MeasuringPlanView } from '#src/features/seats/components/measuring-plan-view.tsx';
import { SeatHistoryLine } from '#src/features/seats/components/seat-history-line.tsx';
import { SeatWearTable } from '#src/features/seats/components/seat-wear-table.tsx';
import { seatWords } from '#src/features/seats/components/seat-words.ts';
import { formatEntered } from '#src/lib/numbers.ts';
import { useSite } from '../site-context.ts';

export const seatHistoryLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(
      seatHistoryQuery(Number(params.siteId), Number(params.positionId), params.seat ?? ''),
    );
    return null;
  };

export function SeatHistoryPage() {
  const { siteId } = useSite();
  const params = useParams();
  const { data: history } = useSuspenseQuery(
    seatHistoryQuery(siteId, Number(params.positionId), params.seat ?? ''),
  );
  const title = seatWords[history.seat];
  const machines = `/sites/${siteId}/machines`;
  return (
    <>
      <PageHeader
        title={`${title} of ${history.machineTag}/${history.positionCode}`}
        crumbs={[
          { label: 'Machines', to: machines },
          { label: history.machineTag, to: `${machines}/${history.machineId}` },
          { label: `${history.positionCode} ${history.seat} seat` },
        ]}
        facts={[
          { label: 'Position', value: history.positionName },
          {
            label: 'Nominal size',
            value: (
              <Figure
                value={history.nominalMm === null ? null : formatEntered(history.nominalMm)}
                unit="mm"
              />
            ),
          },
          ...(history.taper === null
            ? []
            : [{ label: 'Taper', value: <Figure value={history.taper} /> }]),
        ]}
      />
      <div className="grid grid-cols-1 items-start gap-5 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <Panel title="What was recorded, found and done">
          {history.entries.length === 0 ? (
            <EmptyState title="Nothing is on record">
              Get the class from the drawing, or measure the seat at the next opening: without a
              record nobody can say whether it explains a finding.
            </EmptyState>
          ) : (
            <SeatHistoryLine siteId={siteId} history={history} />
          )}
        </Panel>
        <div className="flex flex-col gap-5">
          <Panel title="Wear">
            {history.taper === null ? (
              <SeatWearTable steps={history.wear} />
            ) : (
              <p className="text-sm text-ink-soft">
                A tapered seat has no diameter to wear off: compare the drive-up and the loss of
                internal clearance of one mounting with the next.
              </p>
            )}
          </Panel>
          {history.plan !== null && (
            <Panel title="How to measure it">
              <MeasuringPlanView plan={history.plan} />
            </Panel>
          )}
        </div>
      </div>
    </>
  );
}

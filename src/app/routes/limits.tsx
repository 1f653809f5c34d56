import { useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { LoaderFunctionArgs } from 'react-router-dom';
import type { LimitsResponse, TryLimitsQuery } from '#shared/contracts/limits.ts';
import { Notice } from '#src/components/notice.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { Timeline } from '#src/components/timeline.tsx';
import { useToast } from '#src/components/toast.tsx';
import { limitsQuery, limitsTrialQuery, useSetLimits } from '#src/features/limits/api/limits.ts';
import { LimitsTable } from '#src/features/limits/components/limits-table.tsx';
import { SaveLimits } from '#src/features/limits/components/save-limits.tsx';
import { TrialResult } from '#src/features/limits/components/trial-result.tsx';
import { TryLimits } from '#src/features/limits/components/try-limits.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatInstant } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { useSite } from '../site-context.ts';

export const limitsLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(limitsQuery(Number(params.siteId)));
    return null;
  };

/** Limits of the verdict: in force, on trial, and what was changed when and why. */
export function LimitsPage() {
  const { siteId } = useSite();
  const { data: limits } = useSuspenseQuery(limitsQuery(siteId));
  const [tried, setTried] = useState<TryLimitsQuery | null>(null);
  const save = useSetLimits(siteId);
  const notify = useToast();
  return (
    <>
      <PageHeader
        title="Limits of the verdict"
        crumbs={[{ label: 'Outcomes', to: `/sites/${siteId}/outcomes` }, { label: 'Limits' }]}
      />
      <div className="flex flex-col gap-5">
        <div className="grid items-start gap-5 xl:grid-cols-2">
          <Panel title="In force">
            <LimitsTable limits={limits} />
          </Panel>
          <Panel title="Try other limits">
            <TryLimits
              limits={limits}
              onTry={(query) => {
                save.reset();
                setTried(query);
              }}
            />
          </Panel>
        </div>
        {tried !== null && (
          <>
            <Trial siteId={siteId} tried={tried} />
            <Panel title="Save what was tried">
              <SaveLimits
                tried={tried}
                version={limits.version}
                saving={save.isPending}
                failure={save.isError ? toApiError(save.error) : null}
                onSave={(request) =>
                  save.mutate(request, {
                    onSuccess: () => {
                      setTried(null);
                      notify({ text: 'The limits are in force for new screenings.' });
                    },
                  })
                }
              />
            </Panel>
          </>
        )}
        <Panel title="Changes">
          <Changes history={limits.history} />
        </Panel>
      </div>
    </>
  );
}

function Trial({ siteId, tried }: { siteId: number; tried: TryLimitsQuery }) {
  const trial = useQuery(limitsTrialQuery(siteId, tried));
  return (
    <Panel title="What the past surveys say">
      <div aria-live="polite" aria-busy={trial.isFetching || undefined}>
        {trial.isError && (
          <Notice loud title={toApiError(trial.error).message}>
            Nothing was changed. Try it again.
          </Notice>
        )}
        {trial.isPending && <p className="text-sm text-ink-soft">Judging the past surveys…</p>}
        {trial.data && <TrialResult siteId={siteId} trial={trial.data} />}
      </div>
    </Panel>
  );
}

function Changes({ history }: Pick<LimitsResponse, 'history'>) {
  if (history.length === 0) {
    return <p className="text-sm text-ink-soft">The limits were never changed at this site.</p>;
  }
  return (
    <Timeline
      label="Changes of the limits"
      entries={history.map((change) => ({
        id: change.id,
        at: { iso: change.changedAt, text: formatInstant(change.changedAt) },
        title: `${change.machineKind ?? 'The whole site'}: ${limitsWords(change)}`,
        children: (
          <>
            <p>{change.changedByName}</p>
            <p className="whitespace-pre-line">{change.reason}</p>
          </>
        ),
      }))}
    />
  );
}

function limitsWords({
  machineKind,
  suspectedScore,
  likelyScore,
}: LimitsResponse['history'][number]): string {
  if (suspectedScore === null || likelyScore === null) {
    return machineKind === null ? 'as the method proposes' : 'as the whole site';
  }
  return `suspected from ${formatFixed(suspectedScore, 2)}, likely from ${formatFixed(likelyScore, 2)}`;
}

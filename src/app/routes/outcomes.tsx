import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { ButtonLink } from '#src/components/button-link.tsx';
import { DescriptionList } from '#src/components/description-list.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { outcomesQuery } from '#src/features/outcomes/api/outcomes.ts';
import { FlagTraits } from '#src/features/outcomes/components/flag-traits.tsx';
import { OutcomeTable } from '#src/features/outcomes/components/outcome-table.tsx';
import { OutcomeTimes } from '#src/features/outcomes/components/outcome-times.tsx';
import { useSite } from '../site-context.ts';

export const outcomesLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(outcomesQuery(Number(params.siteId)));
    return null;
  };

/** How often the flags proved right, how long it took, and what the wrong ones had in common. */
export function OutcomesPage() {
  const { siteId, role } = useSite();
  const { data } = useSuspenseQuery(outcomesQuery(siteId));
  const { flags, site } = data;
  const count = (value: number) => <Figure value={String(value)} />;
  return (
    <>
      <PageHeader
        title="Outcomes"
        facts={[{ label: 'Flags so far', value: flags.flaggedCount }]}
        actions={
          role === 'lead' && (
            <ButtonLink to={`/sites/${siteId}/limits`}>Limits of the verdict</ButtonLink>
          )
        }
      />
      {flags.flaggedCount === 0 ? (
        <EmptyState title="No flags yet">
          Outcomes begin with the first screening that suspects looseness.
        </EmptyState>
      ) : (
        <div className="flex flex-col gap-5">
          <Panel title="How often the flags proved right">
            <OutcomeTable
              rows={[
                { ...site, id: 'site', name: <strong>The whole site</strong> },
                ...data.byVerdict.map((group) => ({
                  ...group,
                  id: group.verdict,
                  name: <VerdictMark verdict={group.verdict} />,
                })),
                ...data.byMachineKind.map((group) => ({
                  ...group,
                  id: group.machineKind,
                  name: `Machine kind: ${group.machineKind}`,
                })),
              ]}
            />
            <p className="mt-3 max-w-prose text-sm text-ink-soft">
              Findings are counted, not single flags: the flags of one bearing position stand and
              fall together. “Proved right” is the share of confirmed ones among those that an
              inspection settled; the interval says how far so few cases can be trusted. Flags
              rejected at the desk were never opened, so nobody knows how many of them were right.
            </p>
          </Panel>
          <div className="grid items-start gap-5 lg:grid-cols-2">
            <Panel title="What was decided at the desk">
              <DescriptionList
                items={[
                  { label: 'Flagged screenings', value: count(flags.flaggedCount) },
                  { label: 'Accepted', value: count(flags.acceptedCount) },
                  { label: 'Rejected', value: count(flags.rejectedCount) },
                  { label: 'Retake asked for', value: count(flags.retakeCount) },
                  { label: 'Not reviewed yet', value: count(flags.waitingCount) },
                ]}
              />
            </Panel>
            <Panel title="How long it took">
              <OutcomeTimes times={data.times} />
            </Panel>
          </div>
          <Panel title="What the wrong flags had in common">
            <FlagTraits traits={data.traits} />
          </Panel>
        </div>
      )}
    </>
  );
}

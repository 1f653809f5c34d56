import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { FindingStateMark } from '#src/components/work-state-mark.tsx';
import { findingQuery } from '#src/features/findings/api/findings.ts';
import { FindingDecisions } from '#src/features/findings/components/finding-decisions.tsx';
import { FindingHistory } from '#src/features/findings/components/finding-history.tsx';
import { FindingInspections } from '#src/features/findings/components/finding-inspections.tsx';
import { FindingScreenings } from '#src/features/findings/components/finding-screenings.tsx';
import { FindingVerification } from '#src/features/findings/components/finding-verification.tsx';
import { MonitoringEnd } from '#src/features/findings/components/monitoring-end.tsx';
import { SaveFileButton } from '#src/features/papers/components/save-file-button.tsx';
import { SeatsView } from '#src/features/seats/components/seats-view.tsx';
import { formatDay } from '#src/lib/dates.ts';
import { useSite } from '../site-context.ts';

export const findingLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(
      findingQuery(Number(params.siteId), Number(params.findingId)),
    );
    return null;
  };

const hasDecisions = ({ can }: FindingResponse) => Object.values(can).some(Boolean);

export function FindingPage() {
  const { siteId, role } = useSite();
  const findingId = Number(useParams().findingId);
  const { data: finding } = useSuspenseQuery(findingQuery(siteId, findingId));
  return (
    <>
      <PageHeader
        title={`${finding.machineTag} ${finding.positionName}`}
        crumbs={[
          { label: 'Findings', to: `/sites/${siteId}/findings` },
          { label: `Finding ${finding.id}` },
        ]}
        state={<FindingStateMark state={finding.state} />}
        facts={[
          {
            label: 'Machine',
            value: (
              <Link className="ink-link" to={`/sites/${siteId}/machines/${finding.machineId}`}>
                {finding.machineName}
              </Link>
            ),
          },
          { label: 'Clearest sign', value: <VerdictMark verdict={finding.verdict} /> },
          ...(finding.monitoring === null
            ? []
            : [
                {
                  label: 'Monitored',
                  value: <MonitoringEnd monitoring={finding.monitoring} />,
                },
              ]),
          { label: 'Opened', value: formatDay(finding.openedAt) },
          { label: 'Owner', value: finding.ownerName ?? 'nobody' },
        ]}
        actions={
          <>
            {hasDecisions(finding) && <FindingDecisions siteId={siteId} finding={finding} />}
            <SaveFileButton
              path={`/api/sites/${siteId}/findings/${findingId}/paper.pdf`}
              fileName={`finding-${findingId}.pdf`}
            >
              Save as PDF
            </SaveFileButton>
          </>
        }
      />
      <div className="grid items-start gap-5 2xl:grid-cols-[3fr_1fr]">
        <div className="flex min-w-0 flex-col gap-5">
          {finding.verification !== null && (
            <Panel title="After the repair">
              <FindingVerification
                verification={finding.verification}
                decided={finding.state === 'verified'}
              />
            </Panel>
          )}
          <Panel title="What was seen">
            <FindingScreenings
              siteId={siteId}
              screenings={finding.screenings}
              mayReview={role !== 'owner'}
            />
          </Panel>
          <Panel title="Which seat can explain it">
            <SeatsView assessment={finding.seats} />
          </Panel>
        </div>
        <div className="grid items-start gap-5 lg:grid-cols-2 2xl:grid-cols-1">
          <Panel title="Inspections">
            <FindingInspections siteId={siteId} inspections={finding.inspections} />
          </Panel>
          <Panel title="History">
            <FindingHistory history={finding.history} />
          </Panel>
        </div>
      </div>
      <p className="mt-5 max-w-prose text-sm text-ink-faint">
        A screening is a hint for a qualified analyst, not a diagnosis and not a release to run.
      </p>
    </>
  );
}

import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import { CautionPanel } from '#src/components/caution-panel.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { inspectionQuery } from '#src/features/inspections/api/inspections.ts';
import { InspectionDecisions } from '#src/features/inspections/components/inspection-decisions.tsx';
import { InspectionWork } from '#src/features/inspections/components/inspection-work.tsx';
import { ReportView } from '#src/features/inspections/components/report-view.tsx';
import { SeatLimits } from '#src/features/inspections/components/seat-limits.tsx';
import { SaveFileButton } from '#src/features/papers/components/save-file-button.tsx';
import { SeatsView } from '#src/features/seats/components/seats-view.tsx';
import { formatDay, formatInstant } from '#src/lib/dates.ts';
import { useSite } from '../site-context.ts';

export const inspectionLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(
      inspectionQuery(Number(params.siteId), Number(params.inspectionId)),
    );
    return null;
  };

/** Usable on a phone in the plant: one column, what to do first, large buttons. */
export function InspectionPage() {
  const { siteId } = useSite();
  const inspectionId = Number(useParams().inspectionId);
  const { data: inspection } = useSuspenseQuery(inspectionQuery(siteId, inspectionId));
  const { can, report } = inspection;
  return (
    <>
      <PageHeader
        title={`${inspection.machineTag} ${inspection.positionName}`}
        crumbs={[
          { label: 'Inspections', to: `/sites/${siteId}/inspections` },
          { label: `Inspection ${inspection.id}` },
        ]}
        state={<InspectionStateMark state={inspection.state} />}
        facts={[
          {
            label: 'Due',
            value: (
              <>
                {formatDay(inspection.dueOn)}
                {inspection.overdue && <strong> overdue</strong>}
              </>
            ),
          },
          { label: 'Work order', value: inspection.workOrderReference ?? 'none' },
          { label: 'Asset owner', value: inspection.assigneeName },
          { label: 'Assigned by', value: inspection.assignedByName },
        ]}
        actions={
          <>
            {(can.close || can.cancel) && (
              <InspectionDecisions siteId={siteId} inspection={inspection} />
            )}
            <SaveFileButton
              path={`/api/sites/${siteId}/inspections/${inspectionId}/paper.pdf`}
              fileName={`inspection-${inspectionId}.pdf`}
            >
              Sheet to take along
            </SaveFileButton>
          </>
        }
      />
      <div className="grid items-start gap-5 xl:grid-cols-2">
        <div className="flex min-w-0 flex-col gap-5">
          <Panel
            title="What was seen"
            aside={
              can.seeFinding && (
                <Link
                  className="ink-link text-sm"
                  to={`/sites/${siteId}/findings/${inspection.findingId}`}
                >
                  Finding {inspection.findingId}
                </Link>
              )
            }
          >
            <p className="max-w-prose">{inspection.summary}</p>
          </Panel>
          <Panel title="What to check">
            <SeatLimits inspection={inspection} />
            {inspection.instructions !== null && (
              <div className="mt-3 border-t border-hairline pt-3">
                <p className="font-semibold">Instructions</p>
                <p className="whitespace-pre-line">{inspection.instructions}</p>
              </div>
            )}
          </Panel>
        </div>
        <div className="flex min-w-0 flex-col gap-5">
          {can.accept || can.report ? (
            <InspectionWork siteId={siteId} inspection={inspection} />
          ) : (
            report === null && <CautionPanel cautions={safetyCautions} />
          )}
          {report !== null && (
            <Panel
              title="Report"
              aside={
                inspection.reportedAt !== null && (
                  <span className="figures text-xs text-ink-faint">
                    {formatInstant(inspection.reportedAt)}
                  </span>
                )
              }
            >
              <ReportView report={report} />
            </Panel>
          )}
        </div>
        <details className="xl:col-span-2">
          <summary className="cursor-pointer font-semibold">The seats and their fits</summary>
          <div className="mt-3">
            <SeatsView assessment={inspection.seats} />
          </div>
        </details>
      </div>
    </>
  );
}

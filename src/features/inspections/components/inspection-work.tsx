import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import { Button } from '#src/components/button.tsx';
import { CautionPanel } from '#src/components/caution-panel.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useInspectionStep } from '../api/inspections.ts';
import { ReportForm } from './report-form.tsx';
import { useReportDraft } from './use-report-draft.ts';

/** The owner's part: accept the task, read the cautions, report. */
export function InspectionWork({
  siteId,
  inspection,
}: {
  siteId: number;
  inspection: InspectionResponse;
}) {
  const step = useInspectionStep(siteId, inspection.id);
  const { draft, change, forget } = useReportDraft(inspection.id);
  const notify = useToast();
  const { version } = inspection;
  const failure = step.isError ? toApiError(step.error) : null;
  return (
    <div className="flex flex-col gap-5">
      <CautionPanel cautions={safetyCautions} />
      {inspection.can.accept && (
        <div className="flex flex-col gap-2">
          {failure !== null && <Notice loud title={failure.message} />}
          <Button
            variant="primary"
            size="large"
            busy={step.isPending}
            busyLabel="Accepting…"
            onClick={() =>
              step.mutate(
                { step: 'accept', version },
                { onSuccess: () => notify({ text: 'Accepted. The lead sees it.' }) },
              )
            }
          >
            Accept this inspection
          </Button>
          <p className="text-sm text-ink-soft">
            Accepting tells the lead that you will do it by the due date. The report opens then.
          </p>
        </div>
      )}
      {inspection.can.report && (
        <>
          <Checkbox
            label="I have read the cautions and will work by them."
            checked={draft.cautionsRead}
            onChange={(event) => change({ cautionsRead: event.target.checked })}
          />
          {draft.cautionsRead ? (
            <ReportForm
              inspection={inspection}
              draft={draft}
              saving={step.isPending}
              failure={failure}
              onChange={change}
              onReport={(report) =>
                step.mutate(
                  { step: 'report', version, report },
                  {
                    onSuccess: () => {
                      forget();
                      notify({ text: 'Reported. The lead gets an e-mail.' });
                    },
                  },
                )
              }
            />
          ) : (
            <p className="text-sm text-ink-soft">
              The report opens once the cautions are read and ticked.
            </p>
          )}
        </>
      )}
    </div>
  );
}

import { useState } from 'react';
import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { Button } from '#src/components/button.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useInspectionStep } from '../api/inspections.ts';
import { EndInspection } from './end-inspection.tsx';

/** What the lead may do with the inspection now. */
export function InspectionDecisions({
  siteId,
  inspection,
}: {
  siteId: number;
  inspection: InspectionResponse;
}) {
  const [open, setOpen] = useState<'close' | 'cancel' | null>(null);
  const step = useInspectionStep(siteId, inspection.id);
  const notify = useToast();
  const close = () => {
    setOpen(null);
    step.reset();
  };
  return (
    <>
      {inspection.can.close && (
        <Button variant="primary" onClick={() => setOpen('close')}>
          Close inspection
        </Button>
      )}
      {inspection.can.cancel && (
        <Button onClick={() => setOpen('cancel')}>Cancel inspection</Button>
      )}
      {open !== null && (
        <EndInspection
          step={open}
          saving={step.isPending}
          failure={step.isError ? toApiError(step.error) : null}
          onClose={close}
          onEnd={(reason) =>
            step.mutate(
              { step: open, version: inspection.version, reason },
              {
                onSuccess: () => {
                  close();
                  notify({
                    text:
                      open === 'close'
                        ? 'The inspection is closed.'
                        : 'The inspection is cancelled.',
                  });
                },
              },
            )
          }
        />
      )}
    </>
  );
}

import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import { Button } from '#src/components/button.tsx';
import { useToast } from '#src/components/toast.tsx';
import { findingStateWords } from '#src/components/work-state-mark.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { assigneesQuery, useAssignInspection, useDecideFinding } from '../api/findings.ts';
import { AssignInspection } from './assign-inspection.tsx';
import { decisionWords, DecideFinding, type FindingDecision } from './decide-finding.tsx';

const decisions = ['verify', 'monitor', 'reopen', 'dismiss'] as const;

/** What the lead may do with the finding now, each with its dialog. */
export function FindingDecisions({
  siteId,
  finding,
}: {
  siteId: number;
  finding: FindingResponse;
}) {
  const [open, setOpen] = useState<FindingDecision | 'assign' | null>(null);
  const decide = useDecideFinding(siteId, finding.id);
  const assign = useAssignInspection(siteId, finding.id);
  const members = useQuery({ ...assigneesQuery(siteId), enabled: finding.can.assign });
  const notify = useToast();
  const close = () => {
    setOpen(null);
    decide.reset();
    assign.reset();
  };
  const { version } = finding;
  return (
    <>
      {finding.can.assign && (
        <Button variant="primary" onClick={() => setOpen('assign')}>
          Assign inspection
        </Button>
      )}
      {decisions
        .filter((action) => finding.can[action])
        .map((action) => (
          <Button
            key={action}
            variant={action === 'verify' ? 'primary' : 'plain'}
            onClick={() => setOpen(action)}
          >
            {decisionWords[action].button}
          </Button>
        ))}
      {open === 'assign' && members.data !== undefined && (
        <AssignInspection
          finding={finding}
          members={members.data.members}
          saving={assign.isPending}
          failure={assign.isError ? toApiError(assign.error) : null}
          onClose={close}
          onAssign={(body) =>
            // The version of the page as it stands: after a refusal it has been read anew.
            assign.mutate(
              { ...body, version },
              {
                onSuccess: (inspection) => {
                  close();
                  notify({
                    text: `Assigned to ${inspection.assigneeName}; the e-mail is on its way.`,
                  });
                },
              },
            )
          }
        />
      )}
      {open !== null && open !== 'assign' && (
        <DecideFinding
          action={open}
          version={version}
          saving={decide.isPending}
          failure={decide.isError ? toApiError(decide.error) : null}
          onClose={close}
          onDecide={(body) =>
            decide.mutate(
              { ...body, version },
              {
                onSuccess: ({ state }) => {
                  close();
                  notify({ text: `The finding is now: ${findingStateWords[state]}.` });
                },
              },
            )
          }
        />
      )}
    </>
  );
}

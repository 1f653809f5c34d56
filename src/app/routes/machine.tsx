import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useLocation, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { findingState } from '#shared/contracts/finding.ts';
import { Button } from '#src/components/button.tsx';
import { ButtonLink } from '#src/components/button-link.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { FindingStateMark } from '#src/components/work-state-mark.tsx';
import type { PreparedFitRecord } from '#src/features/register/components/copy-fit-dialog.tsx';
import { machineQuery, useCreatePosition } from '#src/features/register/api/machines.ts';
import { MachineFacts } from '#src/features/register/components/machine-facts.tsx';
import { PositionForm } from '#src/features/register/components/position-form.tsx';
import { PositionPanel } from '#src/features/register/components/position-panel.tsx';
import { shaftsOf } from '#src/features/register/components/machine-shafts.ts';
import { capital } from '#src/features/register/components/machine-words.ts';
import { PositionSeats } from '#src/features/seats/components/position-seats.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSite } from '../site-context.ts';

export const machineLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(
      machineQuery(Number(params.siteId), Number(params.machineId)),
    );
    return null;
  };

export function MachinePage() {
  const { siteId } = useSite();
  const machineId = Number(useParams().machineId);
  const { data: machine } = useSuspenseQuery(machineQuery(siteId, machineId));
  const create = useCreatePosition(siteId, machineId);
  const [adding, setAdding] = useState(false);
  const shafts = shaftsOf(machine);
  const { state } = useLocation() as { state: { fitRecord?: PreparedFitRecord } | null };
  const prepared = state?.fitRecord;
  const addButton = machine.can.edit && (
    <Button icon="plus" onClick={() => setAdding(true)}>
      Bearing position
    </Button>
  );
  return (
    <>
      <PageHeader
        title={`${machine.tag} ${machine.name}`}
        crumbs={[{ label: 'Machines', to: `/sites/${siteId}/machines` }, { label: machine.tag }]}
        facts={[
          { label: 'Criticality', value: capital(machine.criticality) },
          { label: 'Owner', value: machine.ownerName ?? 'nobody' },
        ]}
        actions={
          machine.can.edit && (
            <>
              <ButtonLink to="edit">Edit machine</ButtonLink>
              {addButton}
            </>
          )
        }
      />
      <div className="flex flex-col gap-5">
        <div className="grid items-start gap-5 lg:grid-cols-[2fr_1fr]">
          <Panel title="Machine">
            <MachineFacts machine={machine} />
          </Panel>
          <Panel title="Findings">
            {machine.findings.length === 0 ? (
              <p className="text-sm text-ink-soft">
                No finding on this machine. That is no proof of a tight fit: only what was measured
                was screened.
              </p>
            ) : (
              <ul className="flex flex-col">
                {machine.findings.map((finding) => (
                  <li
                    key={finding.id}
                    className="flex items-center justify-between gap-3 border-b border-hairline py-1.5"
                  >
                    <Link className="ink-link" to={`/sites/${siteId}/findings/${finding.id}`}>
                      Finding <span className="figures">{finding.id}</span> at{' '}
                      <span className="figures">{finding.positionCode}</span>
                    </Link>
                    <FindingStateMark state={findingState.parse(finding.state)} />
                  </li>
                ))}
              </ul>
            )}
          </Panel>
        </div>
        {machine.positions.length === 0 && (
          <EmptyState title="No bearing position yet" action={addButton}>
            A bearing position carries the measuring points and the fits of its two seats.
          </EmptyState>
        )}
        {machine.positions.map((position) => (
          <PositionPanel
            key={position.id}
            siteId={siteId}
            position={position}
            shafts={shafts}
            mayEdit={machine.can.edit}
            prepared={prepared?.positionId === position.id ? prepared.values : undefined}
            seats={<PositionSeats siteId={siteId} positionId={position.id} />}
          />
        ))}
      </div>
      <Dialog wide title="New bearing position" open={adding} onOpenChange={setAdding}>
        <PositionForm
          shafts={shafts}
          saving={create.isPending}
          failure={create.isError ? toApiError(create.error) : null}
          onSave={(body) => create.mutate(body, { onSuccess: () => setAdding(false) })}
        />
      </Dialog>
    </>
  );
}

import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, type LoaderFunctionArgs } from 'react-router-dom';
import type { DeskItem } from '#shared/contracts/desk.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { useToast } from '#src/components/toast.tsx';
import { calendarFeedQuery } from '#src/features/calendar/api/calendar.ts';
import { CalendarPanel } from '#src/features/calendar/components/calendar-panel.tsx';
import { deskQuery, useDeskChange, type DeskChange } from '#src/features/desk/api/desk.ts';
import { Board, type DeskAction } from '#src/features/desk/components/board.tsx';
import { ChangeDialog } from '#src/features/desk/components/change-dialog.tsx';
import { LoadTable } from '#src/features/desk/components/load-table.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSite } from '../site-context.ts';

export const deskLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    const siteId = Number(params.siteId);
    await Promise.all([
      queryClient.ensureQueryData(deskQuery(siteId)),
      queryClient.ensureQueryData(calendarFeedQuery(siteId)),
    ]);
    return null;
  };

/** The lead follows the inspections up: who has what, by when, and what to do about it. */
export function DeskPage() {
  const { siteId } = useSite();
  const { data: desk } = useSuspenseQuery(deskQuery(siteId));
  const [open, setOpen] = useState<{ what: 'reassign' | 'due-date'; item: DeskItem } | null>(null);
  const change = useDeskChange(siteId);
  const notify = useToast();
  const close = () => {
    setOpen(null);
    change.reset();
  };
  const act = (action: DeskAction, item: DeskItem) => {
    if (action !== 'remind') {
      setOpen({ what: action, item });
      return;
    }
    change.mutate(
      { inspectionId: item.id, what: 'remind' },
      {
        onSuccess: () => notify({ text: `${item.assigneeName} is reminded by e-mail.` }),
        onError: (error) => notify({ text: toApiError(error).message, failed: true }),
      },
    );
  };
  const send = (item: DeskItem, changed: DeskChange) =>
    change.mutate(
      { ...changed, inspectionId: item.id },
      {
        onSuccess: () => {
          close();
          notify({
            text:
              changed.what === 'reassign'
                ? 'The inspection is handed over.'
                : 'The due date is moved.',
          });
        },
      },
    );
  const overdue = desk.owners.reduce((sum, { overdueCount }) => sum + overdueCount, 0);
  const { total, machines } = desk.machinesWithoutOwner;
  return (
    <>
      <PageHeader
        title="Desk"
        facts={[{ label: 'Overdue', value: String(overdue) }]}
        actions={
          <>
            <ButtonLink to={`/sites/${siteId}/mails`}>E-mails sent</ButtonLink>
            <ButtonLink to={`/sites/${siteId}/webhook`}>Maintenance system</ButtonLink>
          </>
        }
      />
      <div className="flex flex-col gap-5">
        <Board siteId={siteId} columns={desk.columns} onAct={act} />
        <div className="grid items-start gap-5 lg:grid-cols-2">
          <Panel title="Load of the asset owners">
            <LoadTable owners={desk.owners} />
          </Panel>
          <div className="flex flex-col gap-5">
            <Panel title="Machines without an owner">
              {total === 0 ? (
                <p className="text-sm text-ink-soft">Every machine has an asset owner.</p>
              ) : (
                <>
                  <p className="mb-2 max-w-prose text-sm text-ink-soft">
                    {total === 1 ? '1 machine has' : `${total} machines have`} no asset owner. When
                    an inspection is assigned, nobody is proposed for it.
                  </p>
                  <ul className="text-sm">
                    {machines.map((machine) => (
                      <li key={machine.id}>
                        <Link className="ink-link" to={`/sites/${siteId}/machines/${machine.id}`}>
                          <span className="figures">{machine.tag}</span> {machine.name}
                        </Link>
                      </li>
                    ))}
                    {total > machines.length && <li>and {total - machines.length} more</li>}
                  </ul>
                </>
              )}
            </Panel>
            <CalendarPanel siteId={siteId} whose="all inspections due at this site" />
          </div>
        </div>
      </div>
      {open !== null && (
        <ChangeDialog
          what={open.what}
          item={open.item}
          owners={desk.owners}
          today={desk.today}
          saving={change.isPending}
          failure={change.isError ? toApiError(change.error) : null}
          onClose={close}
          onChange={(changed) => send(open.item, changed)}
        />
      )}
    </>
  );
}

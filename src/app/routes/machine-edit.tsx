import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { PageHeader } from '#src/components/page-header.tsx';
import { useToast } from '#src/components/toast.tsx';
import { machineQuery, membersQuery, useSaveMachine } from '#src/features/register/api/machines.ts';
import { MachineForm } from '#src/features/register/components/machine-form.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSite } from '../site-context.ts';

export const machineEditLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    const siteId = Number(params.siteId);
    await Promise.all([
      queryClient.ensureQueryData(membersQuery(siteId)),
      params.machineId === undefined
        ? null
        : queryClient.ensureQueryData(machineQuery(siteId, Number(params.machineId))),
    ]);
    return null;
  };

function useOwnerOptions(siteId: number) {
  const { data } = useSuspenseQuery(membersQuery(siteId));
  return data.members
    .filter((member) => member.role === 'owner')
    .map((member) => ({ value: String(member.userId), label: member.name }));
}

export function MachineNewPage() {
  const { siteId } = useSite();
  const navigate = useNavigate();
  const owners = useOwnerOptions(siteId);
  const save = useSaveMachine(siteId);
  return (
    <>
      <PageHeader
        title="New machine"
        crumbs={[{ label: 'Machines', to: `/sites/${siteId}/machines` }, { label: 'New machine' }]}
      />
      <MachineForm
        owners={owners}
        saving={save.isPending}
        failure={save.isError ? toApiError(save.error) : null}
        onSave={(body) =>
          save.mutate(body, {
            onSuccess: (machine) => void navigate(`/sites/${siteId}/machines/${machine.id}`),
          })
        }
      />
    </>
  );
}

export function MachineEditPage() {
  const { siteId } = useSite();
  const machineId = Number(useParams().machineId);
  const navigate = useNavigate();
  const notify = useToast();
  const owners = useOwnerOptions(siteId);
  const { data } = useSuspenseQuery(machineQuery(siteId, machineId));
  const save = useSaveMachine(siteId, machineId);
  const {
    id: _id,
    ownerName: _owner,
    positions: _positions,
    findings: _findings,
    can: _can,
    version,
    ...machine
  } = data;
  return (
    <>
      <PageHeader
        title={`Edit ${data.tag}`}
        crumbs={[
          { label: 'Machines', to: `/sites/${siteId}/machines` },
          { label: data.tag, to: `/sites/${siteId}/machines/${machineId}` },
          { label: 'Edit' },
        ]}
      />
      <MachineForm
        machine={machine}
        owners={owners}
        saving={save.isPending}
        failure={save.isError ? toApiError(save.error) : null}
        onSave={(body) =>
          save.mutate(
            { ...body, version },
            {
              onSuccess: () => {
                notify({ text: `${body.tag} is saved.` });
                void navigate(`/sites/${siteId}/machines/${machineId}`);
              },
            },
          )
        }
      />
    </>
  );
}

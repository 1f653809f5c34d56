import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { AddFitRecordRequest } from '#shared/contracts/fit-record.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { machineListQuery, machineQuery } from '../api/machines.ts';

/** What opens a position's fit record form with values in it. */
export interface PreparedFitRecord {
  positionId: number;
  values: Partial<AddFitRecordRequest>;
}

type CopiedSeat = Partial<AddFitRecordRequest>;

/** Chooses the seat that tried values are recorded for; the form there is checked and sent as ever. */
export function CopyFitDialog({
  siteId,
  seats,
  open,
  onOpenChange,
}: {
  siteId: number;
  /** Values by seat. */
  seats: { shaft: CopiedSeat; housing: CopiedSeat };
  open: boolean;
  onOpenChange: (open: boolean) => void;
}) {
  const navigate = useNavigate();
  const [search, setSearch] = useState('');
  const [machineId, setMachineId] = useState('');
  const [positionId, setPositionId] = useState('');
  const [seat, setSeat] = useState<'shaft' | 'housing'>('shaft');
  const machines = useQuery({ ...machineListQuery(siteId, { search }), enabled: open });
  const machine = useQuery({
    ...machineQuery(siteId, Number(machineId)),
    enabled: open && machineId !== '',
  });
  const copy = () => {
    const state: { fitRecord: PreparedFitRecord } = {
      fitRecord: { positionId: Number(positionId), values: { ...seats[seat], seat } },
    };
    void navigate(`/sites/${siteId}/machines/${machineId}`, { state });
  };
  return (
    <Dialog
      title="Copy into a fit record"
      description="Choose the seat. Its form opens with these values; nothing is on record before you save it there."
      open={open}
      onOpenChange={onOpenChange}
      actions={
        <Button variant="primary" disabled={positionId === ''} onClick={copy}>
          Open the form
        </Button>
      }
    >
      <Field optional label="Find a machine" hint="Part of its tag or name">
        <TextInput value={search} onChange={(event) => setSearch(event.target.value)} />
      </Field>
      <Field label="Machine">
        <Select
          placeholder="Choose a machine"
          value={machineId}
          options={(machines.data?.items ?? []).map(({ id, tag, name }) => ({
            value: String(id),
            label: `${tag} ${name}`,
          }))}
          onChange={(event) => {
            setMachineId(event.target.value);
            setPositionId('');
          }}
        />
      </Field>
      <Field
        label="Bearing position"
        error={machine.isError ? toApiError(machine.error).message : undefined}
      >
        <Select
          placeholder="Choose a position"
          value={positionId}
          disabled={machineId === ''}
          options={(machine.data?.positions ?? []).map(({ id, code }) => ({
            value: String(id),
            label: code,
          }))}
          onChange={(event) => setPositionId(event.target.value)}
        />
      </Field>
      <Field label="Seat">
        <Select
          value={seat}
          options={[
            { value: 'shaft', label: 'Shaft seat' },
            { value: 'housing', label: 'Housing seat' },
          ]}
          onChange={(event) => setSeat(event.target.value === 'housing' ? 'housing' : 'shaft')}
        />
      </Field>
    </Dialog>
  );
}

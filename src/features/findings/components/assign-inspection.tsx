import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import {
  assignInspectionRequest,
  type AssignInspectionRequest,
  type FindingResponse,
} from '#shared/contracts/finding.ts';
import type { MembersResponse } from '#shared/contracts/person.ts';
import { Button } from '#src/components/button.tsx';
import { Checkbox } from '#src/components/checkbox.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field, FieldError } from '#src/components/field.tsx';
import { FormErrorSummary, type FormFault } from '#src/components/form-error-summary.tsx';
import { Select } from '#src/components/select.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asIdOrNull, asTextOrNull } from '#src/lib/form-values.ts';

const dueInDays = 14;
const msPerDay = 24 * 3600 * 1000;

/** What a pedestal finding asks for is checked in place; a seat is opened and measured. */
function checksFor(finding: FindingResponse) {
  const hasSeats = finding.seats.seats.length > 0;
  const isPedestal = finding.kind === 'pedestal';
  const isSuspect = (name: 'shaft' | 'housing') =>
    hasSeats && !isPedestal && finding.seats.seats.some((seat) => seat.seat === name);
  return {
    checkShaftSeat: isSuspect('shaft'),
    checkHousingSeat: isSuspect('housing'),
    checkInPlace: isPedestal || !hasSeats || finding.kind === 'undetermined',
  };
}

/** Hands the finding to an asset owner: who, by when, what to check. */
export function AssignInspection({
  finding,
  members,
  saving,
  failure,
  onAssign,
  onClose,
}: {
  finding: FindingResponse;
  members: MembersResponse['members'];
  saving: boolean;
  failure: ApiError | null;
  onAssign: (assignment: AssignInspectionRequest) => void;
  onClose: () => void;
}) {
  const owners = members.filter((member) => member.role === 'owner');
  const isOwner = owners.some((owner) => owner.userId === finding.ownerUserId);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(assignInspectionRequest),
    defaultValues: {
      ...checksFor(finding),
      assigneeUserId: isOwner ? finding.ownerUserId : null,
      dueOn: new Date(Date.now() + dueInDays * msPerDay).toISOString().slice(0, 10),
      workOrderReference: null,
      instructions: null,
      version: finding.version,
    },
  });
  const { errors } = formState;
  const ownFaults: FormFault[] = Object.entries(errors).flatMap(([name, error]) =>
    error.message === undefined ? [] : [{ inputId: `assign-${name}`, message: error.message }],
  );
  const serverFaults: FormFault[] =
    failure === null
      ? []
      : failure.fields.length === 0
        ? [{ message: failure.message }]
        : failure.fields.map(({ path, message }) => ({ inputId: `assign-${path}`, message }));
  return (
    <Dialog
      wide
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title="Assign a fit inspection"
      description={
        <p className="text-sm text-ink-soft">
          {finding.machineTag} {finding.positionName}. The owner gets an e-mail with the link, the
          seats, the limits and the cautions.
        </p>
      }
    >
      <form
        noValidate
        onSubmit={(event) => void handleSubmit(onAssign)(event)}
        className="flex flex-col gap-4"
      >
        <FormErrorSummary faults={ownFaults.length > 0 ? ownFaults : serverFaults} />
        <div className="grid gap-4 phone:grid-cols-2">
          <Field
            id="assign-assigneeUserId"
            label="Asset owner"
            hint={
              isOwner ? undefined : 'The machine has no owner on record who belongs to this site.'
            }
            error={errors.assigneeUserId && 'Choose an asset owner.'}
          >
            <Select
              placeholder={owners.length === 0 ? 'This site has no asset owner' : 'Choose a person'}
              options={owners.map(({ userId, name }) => ({ value: String(userId), label: name }))}
              {...register('assigneeUserId', asIdOrNull)}
            />
          </Field>
          <Field id="assign-dueOn" label="Due" error={errors.dueOn?.message}>
            <DateInput {...register('dueOn')} />
          </Field>
        </div>
        <fieldset className="flex flex-col gap-2">
          <legend className="mb-1 text-sm font-medium">What to check</legend>
          <Checkbox
            label="In place, before anything is opened"
            hint="Bolts, feet, shims, grout, cracks, movement across the joint"
            {...register('checkInPlace')}
          />
          {finding.seats.seats.map((seat) => (
            <Checkbox
              key={seat.seat}
              id={`assign-${checkNames[seat.seat]}`}
              label={seat.seat === 'shaft' ? 'Shaft seat' : 'Housing seat'}
              hint={seat.sentence}
              {...register(checkNames[seat.seat])}
            />
          ))}
          {errors.checkShaftSeat?.message !== undefined && (
            <FieldError id="assign-checks-error">{errors.checkShaftSeat.message}</FieldError>
          )}
        </fieldset>
        <Field
          id="assign-workOrderReference"
          label="Work order"
          hint="Its number in the plant’s own maintenance system"
          optional
          error={errors.workOrderReference?.message}
        >
          <TextInput {...register('workOrderReference', asTextOrNull)} />
        </Field>
        <Field
          id="assign-instructions"
          label="Instructions"
          optional
          error={errors.instructions?.message}
        >
          <Textarea rows={4} {...register('instructions', asTextOrNull)} />
        </Field>
        <div className="flex gap-2">
          <Button type="submit" variant="primary" busy={saving} busyLabel="Assigning…">
            Assign and send the e-mail
          </Button>
          <Button onClick={onClose}>Not now</Button>
        </div>
      </form>
    </Dialog>
  );
}

const checkNames = { shaft: 'checkShaftSeat', housing: 'checkHousingSeat' } as const;

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import {
  changeDueDateRequest,
  reassignInspectionRequest,
  type DeskItem,
  type OwnerLoad,
} from '#shared/contracts/desk.ts';
import { Button } from '#src/components/button.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import type { ApiError } from '#src/lib/api-error.ts';
import { asIdOrNull } from '#src/lib/form-values.ts';
import type { DeskChange } from '../api/desk.ts';

interface ChangeDialogProps {
  what: 'reassign' | 'due-date';
  item: DeskItem;
  owners: readonly OwnerLoad[];
  /** A day before this one lies in the past everywhere. */
  today: string;
  saving: boolean;
  failure: ApiError | null;
  onChange: (change: DeskChange) => void;
  onClose: () => void;
}

const loadText = ({ name, openCount, overdueCount }: OwnerLoad) =>
  `${name} (${openCount} open, ${overdueCount} overdue)`;

/** Hands a task to another owner, or sets another day; both tell the people concerned. */
export function ChangeDialog(props: ChangeDialogProps) {
  const { what, item, owners, today, saving, failure, onChange, onClose } = props;
  const isReassign = what === 'reassign';
  const { register, handleSubmit, formState } = useForm({
    // One form for both: the day's own contract has no assignee.
    resolver: zodResolver(
      isReassign
        ? reassignInspectionRequest
        : changeDueDateRequest.extend({
            assigneeUserId: reassignInspectionRequest.shape.assigneeUserId,
          }),
    ),
    defaultValues: {
      version: item.version,
      assigneeUserId: (isReassign ? null : item.assigneeUserId) as unknown,
      dueOn: item.dueOn,
      reason: '',
    },
  });
  const { errors } = formState;
  const faultOf = (path: string) => failure?.fields.find((fault) => fault.path === path)?.message;
  const send = handleSubmit(({ assigneeUserId, ...body }) =>
    onChange(
      isReassign
        ? { what: 'reassign', body: { ...body, assigneeUserId } }
        : { what: 'due-date', body },
    ),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={isReassign ? 'Hand the inspection to somebody else' : 'Move the due date'}
      description={
        <p className="text-sm text-ink-soft">
          {item.machineTag} {item.positionName}, with {item.assigneeName}.{' '}
          {isReassign
            ? 'The new owner accepts it anew; both get an e-mail.'
            : 'The owner gets an e-mail.'}
        </p>
      }
    >
      <form noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
        {failure !== null && failure.fields.length === 0 && (
          <Notice loud title={failure.message}>
            Nothing was changed.
          </Notice>
        )}
        {isReassign && (
          <Field
            label="Asset owner"
            error={errors.assigneeUserId ? 'Choose an asset owner.' : faultOf('assigneeUserId')}
          >
            <Select
              placeholder="Choose a person"
              options={owners
                .filter(({ userId }) => userId !== item.assigneeUserId)
                .map((owner) => ({ value: String(owner.userId), label: loadText(owner) }))}
              {...register('assigneeUserId', asIdOrNull)}
            />
          </Field>
        )}
        <Field label="Due" error={errors.dueOn?.message ?? faultOf('dueOn')}>
          <DateInput min={today} {...register('dueOn')} />
        </Field>
        <Field
          label="Reason"
          hint="Goes into the e-mail and the record"
          optional
          error={errors.reason?.message}
        >
          <Textarea {...register('reason')} />
        </Field>
        <div className="flex gap-2">
          <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
            {isReassign ? 'Hand it over' : 'Move the date'}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </div>
      </form>
    </Dialog>
  );
}

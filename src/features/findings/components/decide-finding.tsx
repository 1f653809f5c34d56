import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { decideFindingRequest, type DecideFindingRequest } from '#shared/contracts/finding.ts';
import { Button } from '#src/components/button.tsx';
import { DateInput } from '#src/components/date-input.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import { asNumber, asTextOrNull } from '#src/lib/form-values.ts';
import type { ApiError } from '#src/lib/api-error.ts';

export type FindingDecision = DecideFindingRequest['action'];

export const decisionWords: Readonly<
  Record<FindingDecision, { button: string; title: string; hint: string }>
> = {
  monitor: {
    button: 'Monitor',
    title: 'Keep this finding under monitoring',
    hint: 'Why can it wait, and what should the next surveys show?',
  },
  dismiss: {
    button: 'Dismiss',
    title: 'Dismiss this finding',
    hint: 'Why is it no looseness, or not worth an inspection?',
  },
  reopen: {
    button: 'Reopen',
    title: 'Open this finding again',
    hint: 'What has come up since?',
  },
  verify: {
    button: 'Verify',
    title: 'Close this finding as verified',
    hint: 'Which survey shows that the looseness is gone?',
  },
};

/** The lead's decision, with the reason that is kept with it. */
export function DecideFinding({
  action,
  version,
  saving,
  failure,
  onDecide,
  onClose,
}: {
  action: FindingDecision;
  version: number;
  saving: boolean;
  failure: ApiError | null;
  onDecide: (decision: DecideFindingRequest) => void;
  onClose: () => void;
}) {
  const words = decisionWords[action];
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(decideFindingRequest),
    defaultValues: {
      action,
      version,
      reason: '',
      ...(action === 'monitor' ? { monitorUntilOn: null, monitorSurveys: null } : {}),
    },
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={words.title}
    >
      <form
        id="decide-finding"
        noValidate
        onSubmit={(event) => void handleSubmit(onDecide)(event)}
        className="flex flex-col gap-4"
      >
        {failure !== null && (
          <Notice loud title={failure.message}>
            Your reason is still here. Nothing was saved.
          </Notice>
        )}
        <Field label="Reason" hint={words.hint} error={formState.errors.reason?.message}>
          <Textarea rows={4} {...register('reason')} />
        </Field>
        {action === 'monitor' && (
          <div className="grid gap-4 phone:grid-cols-2">
            <Field
              label="Until"
              optional
              hint="The day by which you decide again."
              error={formState.errors.monitorUntilOn?.message}
            >
              <DateInput {...register('monitorUntilOn', asTextOrNull)} />
            </Field>
            <Field
              label="Or for so many surveys"
              optional
              hint="Whichever comes first ends it."
              error={formState.errors.monitorSurveys?.message}
            >
              <NumberInput whole {...register('monitorSurveys', asNumber)} />
            </Field>
          </div>
        )}
        <div className="flex gap-2">
          <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
            {words.button}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </div>
      </form>
    </Dialog>
  );
}

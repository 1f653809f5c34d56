import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Textarea } from '#src/components/textarea.tsx';

const words = {
  rejected: {
    title: 'Reject this flag',
    button: 'Reject',
    hint: 'What explains the signs better? The reason is kept with the screening.',
  },
  retake: {
    title: 'Ask for a retake',
    button: 'Ask for a retake',
    hint: 'What should be set differently at the next walk?',
  },
} as const;

/** The reason without which a flag is neither rejected nor measured again. */
export function ReasonDialog({
  decision,
  pointLabel,
  onDecide,
  onClose,
}: {
  decision: 'rejected' | 'retake';
  pointLabel: string;
  onDecide: (reason: string) => void;
  onClose: () => void;
}) {
  const [reason, setReason] = useState('');
  const [isTried, setTried] = useState(false);
  const text = words[decision];
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={text.title}
      description={<p className="figures text-sm text-ink-soft">{pointLabel}</p>}
    >
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          setTried(true);
          if (reason.trim() !== '') onDecide(reason.trim());
        }}
      >
        <Field
          label="Reason"
          hint={text.hint}
          error={isTried && reason.trim() === '' ? 'Give a reason.' : undefined}
        >
          <Textarea
            maxLength={2000}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        </Field>
        <div className="flex gap-2">
          <Button type="submit" variant="primary">
            {text.button}
          </Button>
          <Button onClick={onClose}>Back to the flag</Button>
        </div>
      </form>
    </Dialog>
  );
}

import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import type { ApiError } from '#src/lib/api-error.ts';

const words = {
  close: {
    title: 'Close this inspection',
    button: 'Close inspection',
    label: 'Remark',
    hint: 'The finding stays in its state until the next survey has been looked at.',
  },
  cancel: {
    title: 'Cancel this inspection',
    button: 'Cancel inspection',
    label: 'Reason',
    hint: 'The owner is told by e-mail; the finding goes back to open.',
  },
} as const;

/** The lead's last word on an inspection. */
export function EndInspection({
  step,
  saving,
  failure,
  onEnd,
  onClose,
}: {
  step: 'close' | 'cancel';
  saving: boolean;
  failure: ApiError | null;
  onEnd: (reason: string) => void;
  onClose: () => void;
}) {
  const [reason, setReason] = useState('');
  const [isMissing, setMissing] = useState(false);
  const text = words[step];
  const isOptional = step === 'close';
  const end = () => {
    if (!isOptional && reason.trim() === '') setMissing(true);
    else onEnd(reason.trim());
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={text.title}
    >
      {failure !== null && (
        <Notice loud title={failure.message}>
          Nothing was saved.
        </Notice>
      )}
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          end();
        }}
        className="flex flex-col gap-4"
      >
        <Field
          label={text.label}
          hint={text.hint}
          optional={isOptional}
          error={isMissing && reason.trim() === '' ? 'Give a reason.' : undefined}
        >
          <Textarea value={reason} onChange={(event) => setReason(event.target.value)} />
        </Field>
        <div className="flex gap-2">
          <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
            {text.button}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </div>
      </form>
    </Dialog>
  );
}

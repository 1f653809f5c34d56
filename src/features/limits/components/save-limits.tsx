import { useState } from 'react';
import type { SetLimitsRequest, TryLimitsQuery } from '#shared/contracts/limits.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Textarea } from '#src/components/textarea.tsx';
import type { ApiError } from '#src/lib/api-error.ts';

/** Saves what was tried, with the reason that is kept with it. */
export function SaveLimits({
  tried,
  version,
  saving,
  failure,
  onSave,
}: {
  tried: TryLimitsQuery;
  version: number;
  saving: boolean;
  failure: ApiError | null;
  onSave: (request: SetLimitsRequest) => void;
}) {
  const [reason, setReason] = useState('');
  const [isMissing, setMissing] = useState(false);
  return (
    <form
      noValidate
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        setMissing(reason.trim() === '');
        if (reason.trim() === '') return;
        onSave({
          machineKind: tried.machineKind ?? null,
          suspectedScore: tried.suspectedScore ?? null,
          likelyScore: tried.likelyScore ?? null,
          reason: reason.trim(),
          version,
        });
      }}
    >
      {failure !== null && (
        <Notice loud title={failure.message}>
          Your reason is still here. Nothing was saved.
        </Notice>
      )}
      <p className="max-w-prose text-sm text-ink-soft">
        New screenings will use these limits. Those made already keep the limits they were made
        with, and no decision is touched.
      </p>
      <Field
        label="Reason"
        hint="What do the past surveys and inspections say for it?"
        error={isMissing ? 'Give a reason.' : undefined}
      >
        <Textarea
          rows={3}
          className="max-w-2xl"
          value={reason}
          onChange={({ target }) => setReason(target.value)}
        />
      </Field>
      <div>
        <Button type="submit" variant="primary" busy={saving} busyLabel="Saving…">
          Save these limits
        </Button>
      </div>
    </form>
  );
}

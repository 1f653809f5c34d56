import { useState } from 'react';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { parseDecimal } from '#src/lib/numbers.ts';
import { useScreenAgain } from '../api/review.ts';

/** A wrong speed spoils every order: corrected here, the waveform is screened again at once. */
export function CorrectSpeed({ siteId, waveform }: { siteId: number; waveform: WaveformResponse }) {
  const [open, setOpen] = useState(false);
  const [typed, setTyped] = useState('');
  const [fault, setFault] = useState<string>();
  const again = useScreenAgain(siteId);
  const notify = useToast();
  if (!waveform.can.screenAgain) return null;
  const show = (next: boolean) => {
    setOpen(next);
    setTyped(waveform.toldSpeedRpm === null ? '' : String(waveform.toldSpeedRpm));
    setFault(undefined);
    again.reset();
  };
  const send = () => {
    const toldSpeedRpm = parseDecimal(typed) ?? null;
    if (toldSpeedRpm !== null && !(toldSpeedRpm >= 1 && toldSpeedRpm <= 200_000)) {
      setFault('Enter a speed between 1 and 200 000 r/min, or nothing to have it estimated.');
      return;
    }
    again.mutate(
      { waveformId: waveform.id, toldSpeedRpm },
      {
        onSuccess: () => {
          setOpen(false);
          notify({ text: `${waveform.pointLabel} is screened again; it comes back to the queue.` });
        },
      },
    );
  };
  return (
    <>
      <Button size="small" icon="retry" onClick={() => show(true)}>
        Correct the speed
      </Button>
      <Dialog
        open={open}
        onOpenChange={show}
        title="Correct the speed and screen again"
        description={
          <p className="text-sm text-ink-soft">
            The earlier screening and its settings are kept. The told speed is that of the machine,
            not of a geared shaft.
          </p>
        }
      >
        <form
          noValidate
          className="flex flex-col gap-4"
          onSubmit={(event) => {
            event.preventDefault();
            send();
          }}
        >
          {again.isError && (
            <Notice loud title={toApiError(again.error).message}>
              Nothing was changed.
            </Notice>
          )}
          <Field
            label="Told speed"
            hint="Empty: the method estimates it from the record."
            optional
            error={fault}
          >
            <NumberInput
              unit="r/min"
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
            />
          </Field>
          <div className="flex gap-2">
            <Button type="submit" variant="primary" busy={again.isPending} busyLabel="Sending…">
              Screen again
            </Button>
            <Button onClick={() => show(false)}>Leave it as it is</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}

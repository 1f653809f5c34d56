import { useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { CopyFitDialog } from '#src/features/register/components/copy-fit-dialog.tsx';
import { WorkbenchForm } from '#src/features/seats/components/workbench-form.tsx';
import { WorkbenchResults } from '#src/features/seats/components/workbench-results.tsx';
import { copiedSeats, readTrial } from '#src/features/seats/workbench-trial.ts';
import { useSite } from '../site-context.ts';

/**
 * What is typed, in the address too. The address follows: going to it takes a moment, in which a
 * quick hand has typed on.
 */
function useTypedAddress() {
  const [address, setAddress] = useSearchParams();
  const [typed, setTyped] = useState(address);
  // Replaced one by the next: none of them can be gone back to.
  const sent = useRef(new Set([address.toString()]));
  useEffect(() => {
    if (sent.current.has(address.toString())) return;
    // Gone to by a link.
    sent.current = new Set([address.toString()]);
    setTyped(new URLSearchParams(address));
  }, [address]);
  const go = (after: URLSearchParams) => {
    sent.current.add(after.toString());
    setTyped(after);
    setAddress(after, { replace: true, preventScrollReset: true });
  };
  return {
    typed,
    change: (name: string, value: string) => {
      const after = new URLSearchParams(typed);
      if (value === '') after.delete(name);
      else after.set(name, value);
      go(after);
    },
    clear: () => go(new URLSearchParams()),
  };
}

/** A fit tried without a machine: typed, worked out at once, and kept in the address alone. */
export function FitWorkbenchPage() {
  const { siteId, role } = useSite();
  const { typed: parameters, change, clear } = useTypedAddress();
  const [copying, setCopying] = useState(false);
  const trial = readTrial(parameters);
  return (
    <>
      <PageHeader
        title="Fit workbench"
        actions={
          <>
            {role === 'lead' && trial.assessment !== null && (
              <Button onClick={() => setCopying(true)}>Copy into a fit record</Button>
            )}
            {!trial.isEmpty && (
              <Button variant="quiet" onClick={clear}>
                Clear
              </Button>
            )}
          </>
        }
      />
      <p className="mb-4 max-w-prose text-sm text-ink-soft">
        Try what a fit comes to before it stands in a drawing or a record. Interference is positive,
        clearance negative, in micrometres. A proposal: the machine maker’s drawing and the bearing
        supplier’s guidance win.
      </p>
      {trial.faults[''] !== undefined && (
        <div className="mb-4">
          <Notice title="Part of the address was left out">{trial.faults['']}</Notice>
        </div>
      )}
      <div className="grid items-start gap-5 xl:grid-cols-[minmax(22rem,30rem)_1fr]">
        <WorkbenchForm parameters={parameters} faults={trial.faults} onChange={change} />
        <section aria-labelledby="workbench-results" aria-live="polite">
          <h2 id="workbench-results" className="sr-only">
            What it comes to
          </h2>
          <WorkbenchResults trial={trial} parameters={parameters} />
        </section>
      </div>
      <CopyFitDialog
        siteId={siteId}
        seats={copiedSeats(parameters)}
        open={copying}
        onOpenChange={setCopying}
      />
    </>
  );
}

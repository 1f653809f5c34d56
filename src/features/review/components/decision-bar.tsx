import type { ReviewDecision } from '#shared/contracts/review.ts';
import { Button } from '#src/components/button.tsx';
import { KeyHint } from '#src/components/key-hint.tsx';

/** The three ways out of the queue, each with its key. */
export function DecisionBar({
  busy,
  keysOn,
  onDecide,
}: {
  busy: boolean;
  keysOn: boolean;
  onDecide: (decision: ReviewDecision) => void;
}) {
  const hint = (key: string) => keysOn && <KeyHint keys={[key]} />;
  return (
    <div role="group" aria-label="Decision" className="flex flex-wrap gap-2">
      <Button
        variant="primary"
        busy={busy}
        busyLabel="Saving…"
        aria-keyshortcuts="a"
        onClick={() => onDecide('accepted')}
      >
        Accept {hint('a')}
      </Button>
      <Button busy={busy} aria-keyshortcuts="r" onClick={() => onDecide('rejected')}>
        Reject {hint('r')}
      </Button>
      <Button busy={busy} aria-keyshortcuts="t" onClick={() => onDecide('retake')}>
        Retake {hint('t')}
      </Button>
    </div>
  );
}

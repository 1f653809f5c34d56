import { useState } from 'react';
import { Checkbox } from '#src/components/checkbox.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { KeyHint } from '#src/components/key-hint.tsx';

const storageKey = 'fretline-review-keys';

/** Whether single keys act; remembered on the device. */
export function useShortcutsOn() {
  const [isOn, setOn] = useState(() => {
    try {
      return localStorage.getItem(storageKey) !== 'off';
    } catch {
      return true;
    }
  });
  const choose = (next: boolean) => {
    setOn(next);
    try {
      localStorage.setItem(storageKey, next ? 'on' : 'off');
    } catch {
      // Storage can be switched off: the choice then lasts as long as the page.
    }
  };
  return [isOn, choose] as const;
}

const shortcuts: readonly { keys: readonly string[]; what: string }[] = [
  { keys: ['j'], what: 'Next flag' },
  { keys: ['k'], what: 'Previous flag' },
  { keys: ['↑', '↓'], what: 'Through the queue, while the focus is in it' },
  { keys: ['a'], what: 'Accept: make or extend a finding' },
  { keys: ['r'], what: 'Reject, with a reason' },
  { keys: ['t'], what: 'Ask for a retake, with a reason' },
  { keys: ['u'], what: 'Undo your last decision' },
  { keys: ['?'], what: 'Show these keys' },
];

/** These act only while a plot has the focus, so the switch does not concern them (WCAG 2.1.4). */
const plotKeys: readonly { keys: readonly string[]; what: string }[] = [
  { keys: ['f', 'h', 's'], what: 'Free, harmonic or sideband cursor' },
  { keys: ['←', '→'], what: 'Move the cursor; with Shift faster' },
  { keys: ['↑', '↓'], what: 'Spacing of the sidebands; with Shift faster' },
  { keys: ['+', '−', '0'], what: 'Zoom in, zoom out, the whole' },
  { keys: ['PgUp', 'PgDn'], what: 'Move along' },
  { keys: ['Esc'], what: 'Take the cursor away' },
];

/** The keys of the review desk, and the switch for them. */
export function Shortcuts({
  isOn,
  onChoose,
  onClose,
}: {
  isOn: boolean;
  onChoose: (isOn: boolean) => void;
  onClose: () => void;
}) {
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title="Keys of the review desk"
    >
      <KeyList keys={shortcuts} />
      <Checkbox
        label="Single keys act on this page"
        hint="They never act while you type or while a dialog is open."
        checked={isOn}
        onChange={(event) => onChoose(event.target.checked)}
      />
      <h3 className="mt-2 text-sm font-semibold">In a plot that has the focus</h3>
      <KeyList keys={plotKeys} />
      <p className="text-sm text-ink-soft">
        With the pointer: drag over a stretch to zoom in, double click for the whole, click to set
        the cursor, drag a line of it, turn the wheel to zoom once the plot has the focus or while
        Ctrl is held.
      </p>
    </Dialog>
  );
}

function KeyList({ keys }: { keys: readonly { keys: readonly string[]; what: string }[] }) {
  return (
    <dl className="grid grid-cols-[7rem_1fr] gap-y-2 text-sm">
      {keys.map(({ keys: names, what }) => (
        <div key={what} className="contents">
          <dt>
            <KeyHint keys={names} />
          </dt>
          <dd>{what}</dd>
        </div>
      ))}
    </dl>
  );
}

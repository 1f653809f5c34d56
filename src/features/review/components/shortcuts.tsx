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
      <dl className="grid grid-cols-[5rem_1fr] gap-y-2 text-sm">
        {shortcuts.map(({ keys, what }) => (
          <div key={what} className="contents">
            <dt>
              <KeyHint keys={keys} />
            </dt>
            <dd>{what}</dd>
          </div>
        ))}
      </dl>
      <Checkbox
        label="Single keys act on this page"
        hint="They never act while you type or while a dialog is open."
        checked={isOn}
        onChange={(event) => onChoose(event.target.checked)}
      />
    </Dialog>
  );
}

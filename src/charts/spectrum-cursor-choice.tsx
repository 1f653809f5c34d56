import { cursorOfKind, type SpectrumCursor } from './spectrum-cursor.ts';
import type { Window } from './plot-window.ts';
import { useStore, type Store } from './store.ts';

const kinds: readonly { kind: SpectrumCursor['kind']; word: string; key: string }[] = [
  { kind: 'free', word: 'Free', key: 'f' },
  { kind: 'harmonics', word: 'Harmonics', key: 'h' },
  { kind: 'sidebands', word: 'Sidebands', key: 's' },
];

/** The kind of cursor a key of the focused plot asks for. */
export const cursorKindOfKey = (key: string): SpectrumCursor['kind'] | null =>
  kinds.find((known) => known.key === key)?.kind ?? null;

/** Which cursor the pointer and the arrow keys move. */
export function SpectrumCursorChoice({
  cursor,
  turn,
  view,
}: {
  cursor: Store<SpectrumCursor>;
  /** One order on the x axis; null without a speed. */
  turn: number | null;
  view: () => Window;
}) {
  const chosen = useStore(cursor);
  return (
    <div role="group" aria-label="Cursor" className="flex items-center gap-1 text-xs">
      <span className="text-ink-faint" aria-hidden="true">
        Cursor
      </span>
      {kinds.map(({ kind, word }) => (
        <button
          key={kind}
          type="button"
          aria-pressed={chosen.kind === kind}
          onClick={() => cursor.set(cursorOfKind(kind, cursor.get(), turn, view()))}
          className="min-h-6 cursor-pointer border-b-2 border-transparent px-1.5 text-ink-soft hover:text-ink aria-pressed:border-ink aria-pressed:text-ink"
        >
          {word}
        </button>
      ))}
      {(chosen.kind !== 'free' || chosen.at !== null) && (
        <button
          type="button"
          aria-label="Take the cursor away"
          onClick={() => cursor.set({ kind: 'free', at: null })}
          className="min-h-6 min-w-6 cursor-pointer text-ink-soft hover:text-ink"
        >
          ×
        </button>
      )}
    </div>
  );
}

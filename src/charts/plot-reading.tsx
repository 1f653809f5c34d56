import { useStore, type Store } from './store.ts';

/** What the pointer is at; where it is nowhere, what the cursor says that was set. */
export function PlotReading<Cursor>({
  hover,
  cursor,
  readHover,
  readCursor,
}: {
  hover: Store<number | null>;
  cursor: Store<Cursor>;
  readHover: (x: number) => string;
  readCursor: (cursor: Cursor) => string;
}) {
  const x = useStore(hover);
  const set = useStore(cursor);
  return (
    // Keys say where they have gone to; a pointer's every move would be noise.
    <output
      aria-live={x === null ? 'polite' : 'off'}
      className="figures text-sm whitespace-pre-wrap"
    >
      {x === null ? readCursor(set) : readHover(x)}
    </output>
  );
}

/** The reading of a plot whose cursor is the pointer's alone. */
export function PointerReading({
  at,
  read,
}: {
  at: Store<number | null>;
  read: (x: number) => string;
}) {
  const x = useStore(at);
  return (
    <output aria-live="polite" className="figures text-sm whitespace-pre-wrap">
      {x === null ? '' : read(x)}
    </output>
  );
}

/** The keys of a shortcut, e.g. `['Shift', 'A']`. */
export function KeyHint({ keys }: { keys: readonly string[] }) {
  return (
    <span className="inline-flex gap-1">
      {keys.map((key) => (
        <kbd
          key={key}
          className="figures min-w-5 border border-b-2 border-rule bg-sheet px-1 text-center text-xs text-ink"
        >
          {key}
        </kbd>
      ))}
    </span>
  );
}

import type { ReactNode } from 'react';

export interface TimelineEntry {
  id: string | number;
  /** As shown, with a machine-readable form for `dateTime`. */
  at: { iso: string; text: string };
  title: ReactNode;
  children?: ReactNode;
}

/** What happened, newest or oldest first as given, on a dimension line. */
export function Timeline({ label, entries }: { label: string; entries: readonly TimelineEntry[] }) {
  return (
    <ol aria-label={label} className="flex flex-col">
      {entries.map((entry) => (
        <li
          key={entry.id}
          className="relative border-l border-rule pb-4 pl-5 before:absolute before:top-2 before:-left-1.5 before:h-px before:w-3 before:bg-ink last:border-l-transparent last:pb-0"
        >
          <div className="flex flex-wrap items-baseline gap-x-3">
            <div className="font-medium">{entry.title}</div>
            <time dateTime={entry.at.iso} className="figures text-xs text-ink-faint">
              {entry.at.text}
            </time>
          </div>
          {entry.children && <div className="text-sm text-ink-soft">{entry.children}</div>}
        </li>
      ))}
    </ol>
  );
}

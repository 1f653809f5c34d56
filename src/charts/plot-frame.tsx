import type { ReactNode } from 'react';

/** A plot with its reading above and its remarks and table beneath. */
export function PlotFrame({
  title,
  reading,
  keysHintId,
  children,
  caption,
  table,
}: {
  title: string;
  /** What the cursor points at; empty where it points at nothing. */
  reading: ReactNode;
  keysHintId: string;
  children: ReactNode;
  caption?: ReactNode;
  table?: ReactNode;
}) {
  return (
    <figure aria-label={title} className="flex flex-col gap-1">
      <figcaption className="flex min-h-6 flex-wrap items-baseline justify-between gap-x-4">
        <span className="font-semibold">{title}</span>
        <output aria-live="polite" className="figures text-sm">
          {reading}
        </output>
      </figcaption>
      {children}
      <p id={keysHintId} className="sr-only">
        Left and right arrow move the cursor, with Shift by ten; plus and minus zoom; 0 shows the
        whole.
      </p>
      {caption && <div className="text-xs text-ink-faint">{caption}</div>}
      {table}
    </figure>
  );
}

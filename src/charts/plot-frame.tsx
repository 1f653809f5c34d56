import type { ReactNode } from 'react';

const usualKeysHint =
  'Left and right arrow move the cursor, with Shift by ten; plus and minus zoom, Page Up and Page Down move along, 0 shows the whole.';

/** A plot with its reading above and its remarks and table beneath. */
export function PlotFrame({
  title,
  reading,
  tools,
  keysHintId,
  keysHint = usualKeysHint,
  children,
  caption,
  table,
}: {
  title: string;
  /** What the cursor points at. */
  reading: ReactNode;
  /** What the plot is handled with, beside its title. */
  tools?: ReactNode;
  keysHintId: string;
  keysHint?: string;
  children: ReactNode;
  caption?: ReactNode;
  table?: ReactNode;
}) {
  return (
    <figure aria-label={title} className="flex flex-col gap-1">
      <figcaption className="flex min-h-6 flex-wrap items-baseline justify-between gap-x-4">
        <span className={`flex flex-wrap items-baseline gap-x-4 ${tools ? 'w-full' : ''}`}>
          <span className="font-semibold">{title}</span>
          {tools}
        </span>
        {/* Room for a line from the first: what is read must not push the plot about. */}
        <span className="min-h-5">{reading}</span>
      </figcaption>
      {children}
      <p id={keysHintId} className="sr-only">
        {keysHint}
      </p>
      {caption && <div className="text-xs text-ink-faint">{caption}</div>}
      {table}
    </figure>
  );
}

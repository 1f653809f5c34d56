import { Popover } from 'radix-ui';
import type { ReactNode } from 'react';

/** A trade word with its meaning one press away, where the word stands. */
export function Term({
  children,
  definition,
  source,
}: {
  children: string;
  definition: ReactNode;
  /** Standard and clause, where the meaning has one. */
  source?: string;
}) {
  return (
    <Popover.Root>
      <Popover.Trigger
        className="cursor-help border-b border-dotted border-ink-soft text-left hover:border-solid"
        aria-label={`${children}: what it means`}
      >
        {children}
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          sideOffset={6}
          collisionPadding={12}
          className="z-50 max-w-80 border border-ink bg-sheet p-3 text-sm shadow-sheet"
        >
          <p className="lettering mb-1">{children}</p>
          <div>{definition}</div>
          {source && <p className="mt-2 text-xs text-ink-faint">{source}</p>}
          <Popover.Arrow className="fill-ink" width={10} height={5} />
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

import { Tooltip as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

/** A short name for what is pointed at or focused. Nothing stands here that isn't reachable otherwise. */
export function Tooltip({ text, children }: { text: string; children: ReactNode }) {
  return (
    <Primitive.Provider delayDuration={400}>
      <Primitive.Root>
        <Primitive.Trigger asChild>{children}</Primitive.Trigger>
        <Primitive.Portal>
          <Primitive.Content
            sideOffset={4}
            className="z-50 max-w-64 border border-ink bg-ink px-2 py-1 text-xs text-paper"
          >
            {text}
          </Primitive.Content>
        </Primitive.Portal>
      </Primitive.Root>
    </Primitive.Provider>
  );
}

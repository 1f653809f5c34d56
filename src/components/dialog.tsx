import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';
import { IconButton } from './icon-button.tsx';

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  description?: ReactNode;
  children?: ReactNode;
  /** Buttons, the one that goes on first. */
  actions?: ReactNode;
  wide?: boolean;
}

/** Keeps focus inside, closes on Escape, gives the focus back to where it came from. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  children,
  actions,
  wide = false,
}: DialogProps) {
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[color-mix(in_srgb,var(--tone-well)_70%,transparent)]" />
        <Primitive.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={`fixed top-[8vh] left-1/2 z-50 flex max-h-[84vh] w-[calc(100vw-2rem)] -translate-x-1/2 flex-col border border-ink bg-sheet shadow-sheet ${wide ? 'max-w-3xl' : 'max-w-lg'}`}
        >
          <header className="flex items-start justify-between gap-3 border-b border-ink py-2 pr-2 pl-4">
            <Primitive.Title className="pt-1 text-lg">{title}</Primitive.Title>
            <Primitive.Close asChild>
              <IconButton icon="close" label="Close" />
            </Primitive.Close>
          </header>
          <div className="flex flex-col gap-3 overflow-y-auto p-4">
            {description && (
              <Primitive.Description asChild>
                <div>{description}</div>
              </Primitive.Description>
            )}
            {children}
          </div>
          {actions && (
            <footer className="flex flex-wrap gap-2 border-t border-hairline px-4 py-3">
              {actions}
            </footer>
          )}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}

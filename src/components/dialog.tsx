import { Dialog as Primitive } from 'radix-ui';
import { useRef, type ReactNode } from 'react';
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
  const openedFrom = useRef<Element | null>(null);
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[color-mix(in_srgb,var(--tone-well)_70%,transparent)]" />
        <Primitive.Content
          // The primitive gives the focus back to its own trigger only; ours stands anywhere.
          onOpenAutoFocus={() => {
            openedFrom.current = document.activeElement;
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            if (openedFrom.current instanceof HTMLElement) openedFrom.current.focus();
          }}
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={`fixed top-[8vh] left-1/2 z-50 flex max-h-[84vh] w-[calc(100vw-2rem)] -translate-x-1/2 flex-col border border-ink bg-sheet shadow-sheet ${wide ? 'max-w-3xl' : 'max-w-lg'}`}
        >
          <header className="border-b border-ink py-2.5 pr-14 pl-4">
            <Primitive.Title className="text-lg">{title}</Primitive.Title>
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
          {/* Last in the order of focus: the dialog opens on its first field or action. */}
          <div className="absolute top-1.5 right-1.5">
            <Primitive.Close asChild>
              <IconButton icon="close" label="Close" />
            </Primitive.Close>
          </div>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}

import { Toast as Primitive } from 'radix-ui';
import { createContext, useCallback, useContext, useMemo, useRef, useState } from 'react';
import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { Icon } from './icon.tsx';

export interface ToastMessage {
  text: string;
  /** Something failed: stays until it is put away and is read out at once. */
  failed?: boolean;
  /** E.g. undo. */
  action?: { label: string; onAction: () => void };
}

type Notify = (message: ToastMessage) => void;

const ToastContext = createContext<Notify | null>(null);

/** Tells, at the foot of the page and to screen readers, what has just been done. */
export function useToast(): Notify {
  const notify = useContext(ToastContext);
  if (notify === null) throw new Error('useToast needs a ToastProvider above it');
  return notify;
}

const shownMs = 6000;

export function ToastProvider({ children }: { children: ReactNode }) {
  const [messages, setMessages] = useState<readonly (ToastMessage & { id: number })[]>([]);
  const nextId = useRef(1);
  const notify = useCallback<Notify>((message) => {
    const id = nextId.current++;
    setMessages((shown) => [...shown.slice(-3), { ...message, id }]);
  }, []);
  const value = useMemo(() => notify, [notify]);
  return (
    <ToastContext value={value}>
      <Primitive.Provider label="Message" swipeDirection="down" duration={shownMs}>
        {children}
        {messages.map((message) => (
          <Primitive.Root
            key={message.id}
            type={message.failed ? 'foreground' : 'background'}
            duration={message.failed || message.action ? Infinity : shownMs}
            onOpenChange={(open) => {
              if (!open) setMessages((shown) => shown.filter((other) => other.id !== message.id));
            }}
            className="flex items-center gap-3 border border-ink bg-ink py-2 pr-2 pl-4 text-paper"
          >
            <Primitive.Title className="flex grow gap-2 text-sm">
              {message.failed && <span className="font-bold">Failed:</span>}
              {message.text}
            </Primitive.Title>
            {message.action && (
              <Primitive.Action altText={message.action.label} asChild>
                <Button size="small" onClick={message.action.onAction}>
                  {message.action.label}
                </Button>
              </Primitive.Action>
            )}
            <Primitive.Close
              aria-label="Put away"
              className="cursor-pointer p-1.5 hover:bg-ink-soft focus-visible:outline-paper"
            >
              <Icon name="close" />
            </Primitive.Close>
          </Primitive.Root>
        ))}
        <Primitive.Viewport className="fixed inset-x-4 bottom-4 z-50 mx-auto flex max-w-lg flex-col gap-2 outline-none" />
      </Primitive.Provider>
    </ToastContext>
  );
}

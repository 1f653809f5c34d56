import type { ReactNode } from 'react';

export interface ErrorStateProps {
  /** What happened, in a sentence. */
  title: string;
  /** What is not lost. */
  safe?: ReactNode;
  /** What to try. */
  advice?: ReactNode;
  /** The id under which the server's log has the failure. */
  errorId?: string | undefined;
  action?: ReactNode;
}

/** What happened, what is safe, what to try, and the id to quote. */
export function ErrorState({ title, safe, advice, errorId, action }: ErrorStateProps) {
  return (
    <div role="alert" className="border-2 border-ink bg-sheet px-6 py-6">
      <p className="text-lg font-semibold">{title}</p>
      <div className="mt-2 flex max-w-prose flex-col gap-1 text-ink-soft">
        {safe && <p>{safe}</p>}
        {advice && <p>{advice}</p>}
      </div>
      {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
      {errorId && (
        <p className="mt-4 text-xs text-ink-faint">
          Error <span className="figures select-all">{errorId}</span>
        </p>
      )}
    </div>
  );
}

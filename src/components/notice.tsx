import type { ReactNode } from 'react';

/** A remark beside the work: what to know, what to mend. Loud ones are read out when they appear. */
export function Notice({
  title,
  children,
  loud = false,
}: {
  title?: ReactNode;
  children?: ReactNode;
  loud?: boolean;
}) {
  return (
    <div
      role={loud ? 'alert' : 'note'}
      className={`bg-sheet px-3 py-2 text-sm ${loud ? 'border-l-4 border-ink' : 'border-l border-rule'}`}
    >
      {title && <p className="font-semibold">{title}</p>}
      {children && <div className="text-ink-soft">{children}</div>}
    </div>
  );
}

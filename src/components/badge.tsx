import type { ReactNode } from 'react';

/** A short fact in a ruled box: a kind, a role, a count. States use StateMark. */
export function Badge({ children }: { children: ReactNode }) {
  return (
    <span className="lettering inline-flex items-center border border-rule px-1.5 whitespace-nowrap">
      {children}
    </span>
  );
}

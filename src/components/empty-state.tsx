import type { ReactNode } from 'react';

/** Says why nothing is here and what to do next. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="border border-dashed border-rule px-6 py-8">
      <p className="text-lg font-semibold">{title}</p>
      {children && <div className="mt-1 max-w-prose text-ink-soft">{children}</div>}
      {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}

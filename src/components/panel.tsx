import { useId, type ReactNode } from 'react';
import { classNames } from './class-names.ts';

/** A part of a page under its own heading. */
export function Panel({
  title,
  aside,
  children,
  className,
}: {
  title: ReactNode;
  /** Small controls or a figure at the heading's right. */
  aside?: ReactNode;
  children: ReactNode;
  className?: string;
}) {
  const headingId = useId();
  return (
    <section
      aria-labelledby={headingId}
      className={classNames('border border-hairline bg-sheet', className)}
    >
      <header className="flex min-h-10 flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-hairline px-4 py-1.5">
        <h2 id={headingId} className="text-base">
          {title}
        </h2>
        {aside}
      </header>
      <div className="p-4">{children}</div>
    </section>
  );
}

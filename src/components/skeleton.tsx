import { classNames } from './class-names.ts';

/** Ruled lines where text will stand; says once that something is loading. */
export function Skeleton({
  lines = 3,
  label = 'Loading…',
  className,
}: {
  lines?: number;
  label?: string;
  className?: string;
}) {
  return (
    <div role="status" className={classNames('flex flex-col gap-3', className)}>
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, index) => (
        <span
          key={index}
          aria-hidden="true"
          className="hatched h-4 border-b border-hairline"
          style={{ width: `${100 - ((index * 17) % 45)}%` }}
        />
      ))}
    </div>
  );
}

/** The room a plot will take, so that nothing jumps when it comes. */
export function PlotSkeleton({ heightPx, label }: { heightPx: number; label: string }) {
  return (
    <div
      role="status"
      className="hatched border border-hairline"
      style={{ height: `${heightPx}px` }}
    >
      <span className="sr-only">{label}</span>
    </div>
  );
}

import { classNames } from './class-names.ts';

/** A number with its unit, digits of even width; a dash where there is none. */
export function Figure({
  value,
  unit,
  className,
}: {
  /** Already rounded text. */
  value: string | null | undefined;
  unit?: string;
  className?: string;
}) {
  if (value === null || value === undefined || value === '') {
    return (
      <span className={classNames('figures text-ink-faint', className)}>
        <span aria-hidden="true">–</span>
        <span className="sr-only">not known</span>
      </span>
    );
  }
  return (
    <span className={classNames('figures whitespace-nowrap', className)}>
      {value}
      {unit && <span className="text-ink-soft"> {unit}</span>}
    </span>
  );
}

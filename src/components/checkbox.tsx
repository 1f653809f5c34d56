import { useId, type ComponentProps, type ReactNode } from 'react';
import { classNames } from './class-names.ts';

interface CheckboxProps extends Omit<ComponentProps<'input'>, 'type'> {
  label: ReactNode;
  hint?: ReactNode;
}

export function Checkbox({ label, hint, className, id, ...rest }: CheckboxProps) {
  const ownId = useId();
  const inputId = id ?? ownId;
  const hintId = `${inputId}-hint`;
  return (
    <div className={classNames('flex items-start gap-2', className)}>
      <input
        {...rest}
        id={inputId}
        type="checkbox"
        aria-describedby={hint ? hintId : rest['aria-describedby']}
        className="mt-0.5 size-[1.125rem] shrink-0 cursor-pointer accent-ink disabled:cursor-not-allowed"
      />
      <div>
        <label htmlFor={inputId} className="cursor-pointer">
          {label}
        </label>
        {hint && (
          <p id={hintId} className="text-xs text-ink-faint">
            {hint}
          </p>
        )}
      </div>
    </div>
  );
}

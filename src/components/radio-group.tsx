import { useId, type ComponentProps, type ReactNode } from 'react';
import { classNames } from './class-names.ts';
import { FieldError } from './field.tsx';

export interface RadioOption {
  value: string;
  label: ReactNode;
  hint?: ReactNode;
}

interface RadioGroupProps extends Omit<ComponentProps<'input'>, 'type' | 'value' | 'defaultValue'> {
  legend: ReactNode;
  options: readonly RadioOption[];
  /** The chosen value, where the parent keeps it; leave out with a form library's `register`. */
  value?: string;
  defaultValue?: string;
  hint?: ReactNode;
  error?: string | undefined;
  /** Side by side instead of beneath each other. */
  inline?: boolean;
}

/** One choice of a few, all in sight. `name` is needed; other props go to every radio. */
export function RadioGroup({
  legend,
  options,
  value,
  defaultValue,
  hint,
  error,
  inline = false,
  className,
  ...rest
}: RadioGroupProps) {
  const groupId = useId();
  const hintId = `${groupId}-hint`;
  const errorId = `${groupId}-error`;
  return (
    <fieldset
      aria-describedby={
        [hint ? hintId : null, error ? errorId : null].filter(Boolean).join(' ') || undefined
      }
      className={classNames(
        'flex flex-col gap-1',
        error && 'border-l-4 border-ink pl-3',
        className,
      )}
    >
      <legend className="mb-1 text-sm font-medium">{legend}</legend>
      {hint && (
        <p id={hintId} className="text-xs text-ink-faint">
          {hint}
        </p>
      )}
      <div className={classNames('flex gap-x-5 gap-y-1.5', inline ? 'flex-wrap' : 'flex-col')}>
        {options.map((option) => (
          <label key={option.value} className="flex cursor-pointer items-start gap-2">
            <input
              {...rest}
              type="radio"
              value={option.value}
              aria-invalid={error ? true : undefined}
              {...(value === undefined
                ? { defaultChecked: defaultValue === option.value }
                : { checked: value === option.value })}
              className="mt-0.5 size-[1.125rem] shrink-0 cursor-pointer accent-ink"
            />
            <span>
              {option.label}
              {option.hint && <span className="block text-xs text-ink-faint">{option.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {error && <FieldError id={errorId}>{error}</FieldError>}
    </fieldset>
  );
}

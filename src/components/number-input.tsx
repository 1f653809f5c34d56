import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { useFieldLinks } from './field.tsx';
import { inputStyle } from './input-style.ts';

interface NumberInputProps extends Omit<ComponentProps<'input'>, 'type' | 'inputMode'> {
  /** Shown behind the number and read out with it. */
  unit?: string;
  /** Whole numbers only: the phone shows a keypad without a separator. */
  whole?: boolean;
}

/**
 * A number as it is typed, with its unit. The text is kept (a `type=number` input drops a decimal
 * comma without a word); read it with `parseDecimal` of lib.
 */
export function NumberInput({ unit, whole, className, ...rest }: NumberInputProps) {
  const links = useFieldLinks(rest);
  const unitId = unit && links.id ? `${links.id}-unit` : undefined;
  return (
    <span className={classNames('relative flex', className)}>
      <input
        {...rest}
        {...links}
        aria-describedby={
          [links['aria-describedby'], unitId].filter(Boolean).join(' ') || undefined
        }
        type="text"
        inputMode={whole ? 'numeric' : 'decimal'}
        autoComplete={rest.autoComplete ?? 'off'}
        className={classNames(inputStyle, 'figures text-right', unit && 'rounded-r-none')}
      />
      {unit && (
        <span
          id={unitId}
          className="figures flex shrink-0 items-center rounded-r-sm border border-l-0 border-rule bg-well px-2 text-sm text-ink-soft"
        >
          {unit}
        </span>
      )}
    </span>
  );
}

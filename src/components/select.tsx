import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { useFieldLinks } from './field.tsx';
import { Icon } from './icon.tsx';
import { inputStyle } from './input-style.ts';

export interface SelectOption {
  value: string;
  label: string;
  disabled?: boolean;
}

interface SelectProps extends Omit<ComponentProps<'select'>, 'children'> {
  options: readonly SelectOption[];
  /** First, empty choice, e.g. "Choose a machine". */
  placeholder?: string;
}

/** The browser's own list: known to every keyboard, phone and screen reader. */
export function Select({ options, placeholder, className, ...rest }: SelectProps) {
  const links = useFieldLinks(rest);
  return (
    <span className={classNames('relative block', className)}>
      <select {...rest} {...links} className={classNames(inputStyle, 'appearance-none pr-8')}>
        {placeholder !== undefined && <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
      <span className="pointer-events-none absolute inset-y-0 right-2 flex items-center">
        <Icon name="chevron-down" size={14} />
      </span>
    </span>
  );
}

import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { useFieldLinks } from './field.tsx';
import { inputStyle } from './input-style.ts';

/** A calendar day as `YYYY-MM-DD`, picked with the browser's own calendar. */
export function DateInput({ className, ...rest }: Omit<ComponentProps<'input'>, 'type'>) {
  const links = useFieldLinks(rest);
  return (
    <input
      {...rest}
      {...links}
      type="date"
      className={classNames(inputStyle, 'figures max-w-44', className)}
    />
  );
}

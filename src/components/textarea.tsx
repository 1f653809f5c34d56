import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { useFieldLinks } from './field.tsx';
import { inputStyle } from './input-style.ts';

export function Textarea({ className, rows = 3, ...rest }: ComponentProps<'textarea'>) {
  const links = useFieldLinks(rest);
  return (
    <textarea {...rest} {...links} rows={rows} className={classNames(inputStyle, className)} />
  );
}

import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { useFieldLinks } from './field.tsx';
import { inputStyle } from './input-style.ts';

export function TextInput({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  const links = useFieldLinks(rest);
  return <input {...rest} {...links} type={type} className={classNames(inputStyle, className)} />;
}

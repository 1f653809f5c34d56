import type { ComponentProps } from 'react';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style.ts';
import { classNames } from './class-names.ts';
import { Icon, type IconName } from './icon.tsx';

export interface ButtonProps extends ComponentProps<'button'> {
  variant?: ButtonVariant;
  size?: ButtonSize;
  icon?: IconName;
  /** Work begun by this button is under way: it stays in place and can't be pressed twice. */
  busy?: boolean;
  /** What it says while busy, e.g. "Saving…". */
  busyLabel?: string;
}

export function Button({
  variant = 'plain',
  size = 'normal',
  icon,
  busy = false,
  busyLabel,
  className,
  children,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={busy ? 'button' : type}
      aria-disabled={busy || undefined}
      onClick={busy ? undefined : onClick}
      className={classNames(buttonStyle(variant, size), className)}
    >
      {icon && <Icon name={icon} />}
      {busy ? (busyLabel ?? children) : children}
    </button>
  );
}

import type { ComponentProps } from 'react';
import { classNames } from './class-names.ts';
import { Icon, type IconName } from './icon.tsx';
import { Tooltip } from './tooltip.tsx';

interface IconButtonProps extends Omit<ComponentProps<'button'>, 'children'> {
  icon: IconName;
  /** The name read out and shown on hover and focus. */
  label: string;
}

export function IconButton({ icon, label, className, type = 'button', ...rest }: IconButtonProps) {
  return (
    <Tooltip text={label}>
      <button
        {...rest}
        type={type}
        aria-label={label}
        className={classNames(
          'inline-flex size-9 shrink-0 cursor-pointer items-center justify-center rounded-sm border border-transparent',
          'not-disabled:hover:border-rule not-disabled:hover:bg-well disabled:cursor-not-allowed disabled:opacity-50',
          className,
        )}
      >
        <Icon name={icon} />
      </button>
    </Tooltip>
  );
}

import { classNames } from './class-names.ts';

export type ButtonVariant = 'primary' | 'plain' | 'quiet';
export type ButtonSize = 'small' | 'normal' | 'large';

const variants: Record<ButtonVariant, string> = {
  primary: 'border-ink bg-ink text-paper not-disabled:hover:bg-ink-soft',
  plain: 'border-rule bg-sheet text-ink not-disabled:hover:border-ink not-disabled:hover:bg-well',
  quiet: 'border-transparent bg-transparent text-ink not-disabled:hover:bg-well',
};

// Large is for gloved thumbs on a phone in the plant.
const sizes: Record<ButtonSize, string> = {
  small: 'min-h-7 px-2 text-sm',
  normal: 'min-h-9 px-3 text-base',
  large: 'min-h-12 px-4 text-lg',
};

/** The looks that buttons and links that act as buttons share. */
export function buttonStyle(variant: ButtonVariant, size: ButtonSize): string {
  return classNames(
    'inline-flex cursor-pointer items-center justify-center gap-2 rounded-sm border font-medium whitespace-nowrap',
    'disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:cursor-not-allowed aria-disabled:opacity-55',
    variants[variant],
    sizes[size],
  );
}

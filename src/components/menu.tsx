import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';
import { Icon, type IconName } from './icon.tsx';

export interface MenuItem {
  label: string;
  icon?: IconName;
  /** Ticked where the item is one of several settings. */
  checked?: boolean;
  disabled?: boolean;
  onSelect: () => void;
}

/** A button (`trigger`) that opens a list of things to do. */
export function Menu({
  trigger,
  heading,
  items,
  align = 'start',
}: {
  trigger: ReactNode;
  heading?: ReactNode;
  items: readonly MenuItem[];
  align?: 'start' | 'end';
}) {
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          collisionPadding={8}
          className="z-50 min-w-44 border border-ink bg-sheet py-1 shadow-sheet"
        >
          {heading && (
            <DropdownMenu.Label className="border-b border-hairline px-3 pt-1 pb-2 text-sm">
              {heading}
            </DropdownMenu.Label>
          )}
          {items.map((item) => (
            <DropdownMenu.Item
              key={item.label}
              role={item.checked === undefined ? 'menuitem' : 'menuitemradio'}
              aria-checked={item.checked}
              disabled={item.disabled ?? false}
              onSelect={item.onSelect}
              className="flex cursor-pointer items-center gap-2 px-3 py-1.5 text-sm outline-none select-none data-disabled:cursor-not-allowed data-disabled:text-ink-faint data-highlighted:bg-ink data-highlighted:text-paper"
            >
              {item.icon && <Icon name={item.icon} />}
              <span className="grow">{item.label}</span>
              {item.checked && <Icon name="check" />}
            </DropdownMenu.Item>
          ))}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

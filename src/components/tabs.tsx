import { Tabs as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

export interface TabItem {
  value: string;
  label: ReactNode;
  content: ReactNode;
}

/** Sheets behind one another; arrow keys go from one to the next. */
export function Tabs({
  label,
  items,
  value,
  defaultValue,
  onValueChange,
}: {
  /** What the tabs divide, for screen readers. */
  label: string;
  items: readonly TabItem[];
  value?: string;
  defaultValue?: string;
  onValueChange?: (value: string) => void;
}) {
  const first = defaultValue ?? items[0]?.value;
  return (
    <Primitive.Root
      {...(value === undefined ? (first === undefined ? {} : { defaultValue: first }) : { value })}
      {...(onValueChange ? { onValueChange } : {})}
    >
      <Primitive.List aria-label={label} className="flex flex-wrap gap-1 border-b border-ink">
        {items.map((item) => (
          <Primitive.Trigger
            key={item.value}
            value={item.value}
            className="-mb-px cursor-pointer border border-transparent px-3 py-1.5 text-sm text-ink-soft hover:border-hairline data-[state=active]:border-ink data-[state=active]:border-b-paper data-[state=active]:font-semibold data-[state=active]:text-ink"
          >
            {item.label}
          </Primitive.Trigger>
        ))}
      </Primitive.List>
      {items.map((item) => (
        <Primitive.Content key={item.value} value={item.value} className="pt-4">
          {item.content}
        </Primitive.Content>
      ))}
    </Primitive.Root>
  );
}

import type { ReactNode } from 'react';
import { Figure } from './figure.tsx';

export interface Description {
  label: ReactNode;
  /** Null and empty show as a dash. */
  value: ReactNode;
}

export function DescriptionList({
  items,
  columns = 1,
}: {
  items: readonly Description[];
  columns?: 1 | 2;
}) {
  return (
    <dl className={columns === 2 ? 'grid gap-x-8 phone:grid-cols-2' : 'grid'}>
      {items.map((item, index) => (
        <div
          key={index}
          className="grid grid-cols-[minmax(7rem,2fr)_3fr] gap-3 border-b border-hairline py-1.5 text-sm"
        >
          <dt className="text-ink-soft">{item.label}</dt>
          <dd>
            {item.value === null || item.value === undefined || item.value === '' ? (
              <Figure value={null} />
            ) : (
              item.value
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}

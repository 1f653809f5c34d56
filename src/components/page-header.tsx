import type { ReactNode } from 'react';
import { Breadcrumbs, type Crumb } from './breadcrumbs.tsx';

export interface TitleBlockFact {
  label: string;
  value: ReactNode;
}

/** The head of a page, ruled like a drawing's title block: name, then the facts that identify it. */
export function PageHeader({
  title,
  crumbs,
  state,
  facts = [],
  actions,
}: {
  title: string;
  crumbs?: readonly Crumb[];
  /** A StateMark beside the title. */
  state?: ReactNode;
  facts?: readonly TitleBlockFact[];
  actions?: ReactNode;
}) {
  return (
    <header className="mb-5 flex flex-col gap-2">
      {crumbs && <Breadcrumbs crumbs={crumbs} />}
      <div className="flex flex-wrap items-stretch border-y border-ink bg-sheet phone:border-x">
        <div className="flex min-w-64 grow flex-wrap items-center gap-x-4 gap-y-1 px-4 py-2.5">
          <h1 className="text-xl">{title}</h1>
          {state}
        </div>
        {facts.length > 0 && (
          <dl className="flex flex-wrap">
            {facts.map((fact) => (
              <div
                key={fact.label}
                className="flex min-w-24 flex-col justify-between border-l border-hairline px-3 py-1.5"
              >
                <dt className="lettering text-ink-faint">{fact.label}</dt>
                <dd className="text-sm">{fact.value}</dd>
              </div>
            ))}
          </dl>
        )}
        {actions && (
          <div className="flex flex-wrap items-center gap-2 border-l border-hairline px-3 py-2">
            {actions}
          </div>
        )}
      </div>
    </header>
  );
}

import { Link } from 'react-router-dom';

export interface Crumb {
  label: string;
  /** Absent for the page one is on. */
  to?: string;
}

export function Breadcrumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="text-sm text-ink-soft">
      <ol className="flex flex-wrap gap-x-2">
        {crumbs.map((crumb, index) => (
          <li key={`${index} ${crumb.label}`} className="flex gap-x-2">
            {index > 0 && <span aria-hidden="true">/</span>}
            {crumb.to === undefined ? (
              <span aria-current="page">{crumb.label}</span>
            ) : (
              <Link to={crumb.to} className="ink-link">
                {crumb.label}
              </Link>
            )}
          </li>
        ))}
      </ol>
    </nav>
  );
}

import { Button } from './button.tsx';
import { Select } from './select.tsx';

export interface PagerProps {
  /** From 1. */
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
  onPageSize?: (pageSize: number) => void;
  pageSizes?: readonly number[];
  /** What is counted, e.g. "machines". */
  noun?: string;
}

/** Which part of a list is in sight, and the way to the rest of it. */
export function Pager({
  page,
  pageSize,
  total,
  onPage,
  onPageSize,
  pageSizes = [25, 50, 100, 200],
  noun = 'rows',
}: PagerProps) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  const from = total === 0 ? 0 : (page - 1) * pageSize + 1;
  const to = Math.min(total, page * pageSize);
  return (
    <nav
      aria-label={`Pages of ${noun}`}
      className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 py-2 text-sm"
    >
      <p aria-live="polite">
        <span className="figures">
          {from}–{to}
        </span>{' '}
        of <span className="figures">{total}</span> {noun}
      </p>
      <div className="flex flex-wrap items-center gap-3">
        {onPageSize && (
          <label className="flex items-center gap-2">
            <span className="whitespace-nowrap">On a page</span>
            <Select
              className="w-20"
              value={String(pageSize)}
              options={pageSizes.map((size) => ({ value: String(size), label: String(size) }))}
              onChange={(event) => onPageSize(Number(event.target.value))}
            />
          </label>
        )}
        <div className="flex items-center gap-3">
          <Button
            size="small"
            icon="chevron-left"
            disabled={page <= 1}
            onClick={() => onPage(page - 1)}
          >
            Previous
          </Button>
          <span>
            Page <span className="figures">{page}</span> of <span className="figures">{pages}</span>
          </span>
          <Button
            size="small"
            icon="chevron-right"
            disabled={page >= pages}
            onClick={() => onPage(page + 1)}
          >
            Next
          </Button>
        </div>
      </div>
    </nav>
  );
}

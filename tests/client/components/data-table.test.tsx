import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import '../charts/browser-stubs.ts';
import { DataTable, type DataTableColumn, type TableSort } from '#src/components/data-table.tsx';
import { Pager } from '#src/components/pager.tsx';
import { SearchInput } from '#src/components/search-input.tsx';

afterEach(cleanup);

interface Machine {
  id: number;
  tag: string;
  speedRpm: number;
}

const columns: DataTableColumn<Machine>[] = [
  { id: 'tag', header: 'Tag', sortable: true, rowHeader: true, cell: (row) => row.tag },
  { id: 'speed', header: 'Speed', sortable: true, align: 'end', cell: (row) => row.speedRpm },
  { id: 'kind', header: 'Kind', cell: () => 'pump' },
];
const machines: Machine[] = [
  { id: 1, tag: 'P-2', speedRpm: 1486 },
  { id: 2, tag: 'P-1', speedRpm: 990 },
];

function show(sort?: TableSort, onSort?: (sort: TableSort) => void) {
  render(
    <DataTable
      label="Machines"
      columns={columns}
      rows={machines}
      rowId={(row) => row.id}
      sort={sort}
      onSort={onSort}
      empty={<p>No machine yet</p>}
    />,
  );
}

describe('DataTable', () => {
  it('shows the rows in the order in which the server sent them', () => {
    show({ column: 'tag', direction: 'asc' });
    const names = screen.getAllByRole('rowheader').map((cell) => cell.textContent);
    expect(names).toEqual(['P-2', 'P-1']);
  });

  it('asks for a column upwards first and for the other way round after that', async () => {
    const onSort = vi.fn();
    show({ column: 'tag', direction: 'asc' }, onSort);
    await userEvent.click(screen.getByRole('button', { name: 'Speed' }));
    expect(onSort).toHaveBeenLastCalledWith({ column: 'speed', direction: 'asc' });
    await userEvent.click(screen.getByRole('button', { name: 'Tag' }));
    expect(onSort).toHaveBeenLastCalledWith({ column: 'tag', direction: 'desc' });
  });

  it('tells screen readers how it is sorted, and offers no sorting where there is none', () => {
    show({ column: 'speed', direction: 'desc' });
    const speed = screen.getByRole('columnheader', { name: 'Speed' });
    expect(speed.getAttribute('aria-sort')).toBe('descending');
    const kind = screen.getByRole('columnheader', { name: 'Kind' });
    expect(within(kind).queryByRole('button')).toBeNull();
  });

  it('says what to do where there are no rows', () => {
    render(
      <DataTable
        label="M"
        columns={columns}
        rows={[]}
        rowId={(r) => r.id}
        empty="No machine yet"
      />,
    );
    screen.getByText('No machine yet');
    expect(screen.queryByRole('table')).toBeNull();
  });

  it('can be scrolled by keyboard', () => {
    show();
    expect(screen.getByRole('region', { name: 'Machines' }).tabIndex).toBe(0);
  });
});

describe('DataTable with thousands of rows', () => {
  // jsdom lays nothing out: a height is what makes the virtualiser render rows.
  beforeEach(() => {
    vi.spyOn(HTMLElement.prototype, 'offsetHeight', 'get').mockReturnValue(340);
    vi.spyOn(HTMLElement.prototype, 'offsetWidth', 'get').mockReturnValue(800);
  });
  afterEach(() => vi.restoreAllMocks());

  it('renders those in sight and still tells how many there are', () => {
    const many = Array.from({ length: 20_000 }, (_, i) => ({ id: i, tag: `P-${i}`, speedRpm: i }));
    render(
      <DataTable
        label="Many"
        columns={columns}
        rows={many}
        rowId={(row) => row.id}
        empty={null}
        virtual={{ heightPx: 340 }}
      />,
    );
    const rendered = screen.getAllByRole('rowheader').length;
    expect(rendered).toBeGreaterThanOrEqual(10);
    expect(rendered).toBeLessThan(60);
    expect(screen.getByRole('table').getAttribute('aria-rowcount')).toBe('20001');
    const first = screen.getByRole('rowheader', { name: 'P-0' }).closest('tr');
    expect(first?.getAttribute('aria-rowindex')).toBe('2');
  });
});

describe('Pager', () => {
  it('says which rows are in sight and stops at both ends', async () => {
    const onPage = vi.fn();
    render(<Pager page={3} pageSize={50} total={112} noun="machines" onPage={onPage} />);
    screen.getByText((_, element) => element?.textContent === '101–112 of 112 machines');
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Next' }).disabled).toBe(true);
    await userEvent.click(screen.getByRole('button', { name: 'Previous' }));
    expect(onPage).toHaveBeenCalledWith(2);
  });

  it('counts from nothing in an empty list', () => {
    render(<Pager page={1} pageSize={50} total={0} noun="machines" onPage={() => undefined} />);
    screen.getByText((_, element) => element?.textContent === '0–0 of 0 machines');
  });
});

describe('SearchInput', () => {
  it('asks once when typing rests', async () => {
    const onSearch = vi.fn();
    render(<SearchInput label="Search" value="" onSearch={onSearch} delayMs={60} />);
    await userEvent.type(screen.getByRole('searchbox', { name: 'Search' }), 'P-21');
    await vi.waitFor(() => expect(onSearch).toHaveBeenCalled());
    expect(onSearch.mock.calls).toEqual([['P-21']]);
  });
});

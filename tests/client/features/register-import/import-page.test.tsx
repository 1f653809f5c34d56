import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type {
  ImportRowsResponse,
  RegisterImportResponse,
} from '#shared/contracts/register-import.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const address = '/api/sites/1/register/imports/4';
const anImport = (overrides: Partial<RegisterImportResponse> = {}): RegisterImportResponse => ({
  id: 4,
  kind: 'machines',
  state: 'ready',
  fileName: 'plant.csv',
  encoding: 'Windows-1252',
  separator: 'semicolon',
  rowCount: 2,
  rowsRead: 2,
  counts: { new: 1, changed: 1, same: 0, wrong: 0 },
  failure: null,
  uploadedAt: '2026-11-03T08:00:00.000Z',
  uploadedByName: 'Lena Lead',
  appliedAt: null,
  appliedByName: null,
  undoneAt: null,
  undoneByName: null,
  can: { apply: true, undo: false },
  ...overrides,
});

const rows: ImportRowsResponse = {
  items: [
    { id: 1, rowNumber: 2, fate: 'new', label: 'P-1', faults: [], changes: [] },
    {
      id: 2,
      rowNumber: 3,
      fate: 'changed',
      label: 'P-2',
      faults: [],
      changes: [{ column: 'power [kW]', before: '', after: '7.5' }],
    },
  ],
  total: 2,
  page: 1,
  pageSize: 50,
};

function openImport(answers: Parameters<typeof renderPage>[1], role: 'lead' | 'analyst' = 'lead') {
  return renderPage('/sites/1/machines/import/4', {
    'GET /api/session': aSession(role),
    [`GET ${address}/rows`]: rows,
    ...answers,
  });
}

describe('the page of an import', () => {
  it('shows how the file was read, each row’s fate and what changes', async () => {
    openImport({ [`GET ${address}`]: anImport() });
    await screen.findByText('Windows-1252, semicolon');
    const table = await screen.findByRole('table', { name: 'Rows of the file' });
    expect(within(table).getByRole('row', { name: /3 Changed P-2/ }).textContent).toContain(
      'power [kW]: empty becomes 7.5',
    );
  });

  it('shows the progress of the dry run and then, by itself, its result', async () => {
    let asked = 0;
    openImport({
      [`GET ${address}`]: () => {
        asked += 1;
        return asked < 3
          ? anImport({ state: 'reading', rowsRead: 1, can: { apply: false, undo: false } })
          : anImport();
      },
    });
    const bar = await screen.findByRole('progressbar', { name: 'Rows checked' });
    expect(bar.getAttribute('aria-valuetext')).toBe('1 of 2');
    await screen.findByRole('button', { name: 'Write 2 rows to the register' });
  });

  it('names the faults of wrong rows with what to do, and offers no writing', async () => {
    openImport({
      [`GET ${address}`]: anImport({
        counts: { new: 1, changed: 0, same: 0, wrong: 1 },
        can: { apply: false, undo: false },
      }),
      [`GET ${address}/rows`]: {
        ...rows,
        items: [
          {
            id: 3,
            rowNumber: 7,
            fate: 'wrong',
            label: 'P-3',
            changes: [],
            faults: [
              { column: 'kind', reason: '"pmp" is not known here.', remedy: 'Write one of: pump.' },
            ],
          },
        ],
        total: 1,
      },
    });
    const row = await screen.findByRole('row', { name: /7 Wrong P-3/ });
    expect(row.textContent).toContain('kind: "pmp" is not known here. Write one of: pump.');
    screen.getByText('1 row wrong: nothing can be written yet.');
    expect(screen.queryByRole('button', { name: /to the register/ })).toBeNull();
  });

  it('writes when told to, and says why where the server refuses', async () => {
    const { sent } = openImport({
      [`GET ${address}`]: anImport(),
      [`POST ${address}/apply`]: () =>
        refusal(409, 'conflict', 'Row 3 (P-2): somebody else has changed it since the dry run.'),
    });
    await userEvent.click(await screen.findByRole('button', { name: /Write 2 rows/ }));
    expect((await screen.findByRole('alert')).textContent).toContain('Row 3 (P-2): somebody else');
    expect(sent).toEqual([{ call: `POST ${address}/apply`, body: undefined }]);
  });

  it('undoes after asking once more, and not when the answer is no', async () => {
    const { sent } = openImport({
      [`GET ${address}`]: anImport({
        state: 'applied',
        appliedAt: '2026-11-03T08:05:00.000Z',
        appliedByName: 'Lena Lead',
        can: { apply: false, undo: true },
      }),
      [`POST ${address}/undo`]: anImport({ state: 'undone' }),
    });
    await userEvent.click(await screen.findByRole('button', { name: 'Undo this import' }));
    await userEvent.click(screen.getByRole('button', { name: 'Keep it' }));
    expect(sent).toEqual([]);
    await userEvent.click(screen.getByRole('button', { name: 'Undo this import' }));
    await userEvent.click(screen.getByRole('button', { name: 'Undo the import' }));
    await waitFor(() => expect(sent.map(({ call }) => call)).toEqual([`POST ${address}/undo`]));
  });
});

describe('the page of import and export', () => {
  const list = '/api/sites/1/register/imports';

  it('lists earlier imports for the lead', async () => {
    renderPage('/sites/1/machines/import', {
      'GET /api/session': aSession('lead'),
      [`GET ${list}`]: { items: [anImport()], total: 1, page: 1, pageSize: 25 },
    });
    const link = await screen.findByRole('link', { name: 'plant.csv' });
    expect(link.getAttribute('href')).toBe('/sites/1/machines/import/4');
  });

  it('gives an analyst the export alone', async () => {
    renderPage('/sites/1/machines/import', { 'GET /api/session': aSession('analyst') });
    await screen.findByRole('button', { name: 'Fit records' });
    expect(screen.queryByText('The file holds')).toBeNull();
  });
});

import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { DeskItem, DeskResponse } from '#shared/contracts/desk.ts';
import { inspectionStates } from '#shared/contracts/inspection.ts';
import { anInspection, aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const item: DeskItem = {
  ...anInspection({ state: 'accepted', dueOn: '2026-11-20', overdue: true }),
  assigneeUserId: 8,
  version: 2,
};

const desk = (overrides: Partial<DeskResponse> = {}): DeskResponse => ({
  columns: inspectionStates.map((state) => ({
    state,
    total: state === 'accepted' ? 1 : 0,
    items: state === 'accepted' ? [item] : [],
  })),
  owners: [
    { userId: 8, name: 'Oskar Owner', machineCount: 12, openCount: 1, overdueCount: 1 },
    { userId: 9, name: 'Olga Owner', machineCount: 3, openCount: 0, overdueCount: 0 },
  ],
  machinesWithoutOwner: { total: 1, machines: [{ id: 31, tag: 'Z-1', name: 'Sump pump' }] },
  today: '2026-11-30',
  ...overrides,
});

const openDesk = (extra: Parameters<typeof renderPage>[1] = {}) =>
  renderPage('/sites/1/desk', {
    'GET /api/session': aSession('lead'),
    'GET /api/sites/1/desk': desk(),
    'GET /api/sites/1/calendar-feed': { createdAt: null, lastReadAt: null },
    ...extra,
  });

const choose = async (label: string) => {
  const user = userEvent.setup();
  const name = 'Change the inspection of P-101 Pump, drive end';
  await user.click(await screen.findByRole('button', { name }));
  await user.click(await screen.findByRole('menuitem', { name: label }));
  return user;
};

describe('the desk', () => {
  it('shows each state’s inspections with work order and overdue, the load and machines without owner', async () => {
    openDesk();
    const column = await screen.findByRole('region', { name: 'Accepted, 1' });
    expect(within(column).getByRole('link', { name: 'P-101 Pump, drive end' })).toBeTruthy();
    expect(within(column).getByText('WO-4711')).toBeTruthy();
    expect(within(column).getByText('overdue')).toBeTruthy();
    const load = screen.getByRole('table', { name: 'Asset owners and what they have on hand' });
    const row = within(load).getByRole('row', { name: /Oskar Owner/ });
    expect(row.textContent).toBe('Oskar Owner1211');
    expect(screen.getByRole('link', { name: 'Z-1 Sump pump' })).toBeTruthy();
  });

  it('reminds at once, and says why where it can’t', async () => {
    const refused = 'Oskar Owner was reminded of this today already.';
    const { sent } = openDesk({
      'POST /api/sites/1/inspections/5/remind': () => refusal(409, 'wrong_state', refused),
    });
    await choose('Remind now');
    expect(await screen.findByText(refused)).toBeTruthy();
    expect(sent.map(({ call }) => call)).toEqual(['POST /api/sites/1/inspections/5/remind']);
  });

  it('hands the task to another owner, chosen among the others with their load in sight', async () => {
    const { sent } = openDesk({
      'POST /api/sites/1/inspections/5/reassign': () => new Response(null, { status: 204 }),
    });
    const user = await choose('Hand to somebody else');
    const dialog = await screen.findByRole('dialog');
    const person = within(dialog).getByLabelText('Asset owner');
    expect(
      within(person)
        .getAllByRole('option')
        .map(({ textContent }) => textContent),
    ).toEqual(['Choose a person', 'Olga Owner (0 open, 0 overdue)']);
    await user.click(within(dialog).getByRole('button', { name: 'Hand it over' }));
    expect(await within(dialog).findByText('Choose an asset owner.')).toBeTruthy();
    await user.selectOptions(person, '9');
    await user.click(within(dialog).getByRole('button', { name: 'Hand it over' }));
    expect(await screen.findByText('The inspection is handed over.')).toBeTruthy();
    expect(sent).toEqual([
      {
        call: 'POST /api/sites/1/inspections/5/reassign',
        body: { version: 2, assigneeUserId: 9, dueOn: '2026-11-20', reason: '' },
      },
    ]);
  });

  it('keeps the dialog and what was typed where another lead was faster', async () => {
    openDesk({
      'POST /api/sites/1/inspections/5/due-date': () =>
        refusal(409, 'conflict', 'This inspection was changed meanwhile.'),
    });
    const user = await choose('Move the due date');
    const dialog = await screen.findByRole('dialog');
    const day = within(dialog).getByLabelText('Due');
    await user.clear(day);
    await user.type(day, '2026-12-24');
    await user.click(within(dialog).getByRole('button', { name: 'Move the date' }));
    expect((await within(dialog).findByRole('alert')).textContent).toContain('changed meanwhile');
    expect((day as HTMLInputElement).value).toBe('2026-12-24');
  });
});

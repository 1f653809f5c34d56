import { cleanup, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const anItem = {
  id: 3,
  findingId: 2,
  state: 'assigned',
  machineId: 1,
  machineTag: 'P-101',
  machineName: 'Pump',
  positionCode: 'DE',
  positionName: 'Pump, drive end',
  assigneeName: 'Oskar Owner',
  assignedByName: 'Lena Lead',
  assignedAt: '2026-11-03T08:00:00.000Z',
  dueOn: '2026-12-20',
  overdue: false,
  workOrderReference: 'WO-4711',
  checkShaftSeat: true,
  checkHousingSeat: false,
  checkInPlace: false,
};

function openInspections(answers: Parameters<typeof renderPage>[1]) {
  const saved: { name: string; content: Blob }[] = [];
  let content = new Blob();
  URL.createObjectURL = (blob) => {
    content = blob as Blob;
    return 'blob:here';
  };
  URL.revokeObjectURL = () => undefined;
  vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (
    this: HTMLAnchorElement,
  ) {
    saved.push({ name: this.download, content });
  });
  renderPage('/sites/1/inspections?state=assigned', {
    'GET /api/session': aSession('owner'),
    'GET /api/sites/1/calendar-feed': { createdAt: null, lastReadAt: null },
    'GET /api/sites/1/inspections': { items: [anItem], total: 1, page: 1, pageSize: 50 },
    ...answers,
  });
  return saved;
}

describe('the button that saves a list', () => {
  it('saves the file that the server writes', async () => {
    const saved = openInspections({
      'GET /api/sites/1/exports/inspections': () => new Response('inspection,state\r\n3,assigned'),
    });
    await userEvent.click(await screen.findByRole('button', { name: 'Save as CSV' }));
    await vi.waitFor(() => expect(saved).toHaveLength(1));
    expect(saved[0]?.name).toBe('inspections.csv');
    expect(saved[0]?.content.size).toBe('inspection,state\r\n3,assigned'.length);
  });

  it('says what went wrong, and saves nothing', async () => {
    const saved = openInspections({
      'GET /api/sites/1/exports/inspections': () =>
        refusal(403, 'forbidden', 'Your role may not do this.'),
    });
    await userEvent.click(await screen.findByRole('button', { name: 'Save as CSV' }));
    expect(await screen.findByText(/Your role may not do this/)).toBeTruthy();
    expect(saved).toHaveLength(0);
  });
});

import { cleanup, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { aSession } from '#tests/support/client-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the calendar address of an asset owner', () => {
  it('is shown once when it is made, and is gone when it is revoked', async () => {
    let createdAt: string | null = null;
    const address = 'https://fretline.example/api/calendar/abc.ics';
    renderPage('/sites/1/inspections', {
      'GET /api/session': aSession('owner'),
      'GET /api/sites/1/inspections': { items: [], total: 0, page: 1, pageSize: 50 },
      'GET /api/sites/1/calendar-feed': () => ({ createdAt, lastReadAt: null }),
      'POST /api/sites/1/calendar-feed': () => {
        createdAt = '2026-12-01T08:00:00.000Z';
        return { address };
      },
      'DELETE /api/sites/1/calendar-feed': () => {
        createdAt = null;
        return new Response(null, { status: 204 });
      },
    });
    const user = userEvent.setup();
    const make = await screen.findByRole('button', { name: 'Make a calendar address' });
    expect(screen.queryByRole('button', { name: 'Revoke it' })).toBeNull();
    await user.click(make);
    const field = await screen.findByLabelText('Calendar address');
    expect((field as HTMLInputElement).value).toBe(address);
    await user.click(screen.getByRole('button', { name: 'Revoke it' }));
    expect(await screen.findByRole('button', { name: 'Make a calendar address' })).toBeTruthy();
    expect(screen.queryByLabelText('Calendar address')).toBeNull();
  });
});

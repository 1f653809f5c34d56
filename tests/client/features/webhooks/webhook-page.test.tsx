import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { WebhookResponse } from '#shared/contracts/webhook.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const url = 'https://maintenance.example/changes';
const webhook = (overrides: Partial<WebhookResponse> = {}): WebhookResponse => ({
  url: null,
  since: null,
  deliveries: [],
  ...overrides,
});

const openPage = (answers: Parameters<typeof renderPage>[1]) =>
  renderPage('/sites/1/webhook', { 'GET /api/session': aSession('lead'), ...answers });

describe('the page of the maintenance system', () => {
  it('sets address and secret, and forgets the secret on the page', async () => {
    const { sent } = openPage({
      'GET /api/sites/1/webhook': webhook(),
      'PUT /api/sites/1/webhook': webhook({ url, since: '2026-12-01T08:00:00.000Z' }),
    });
    const user = userEvent.setup();
    await user.type(await screen.findByLabelText('Address'), url);
    await user.type(screen.getByLabelText('Secret'), 'too short');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('At least 16 characters.')).toBeTruthy();
    expect(sent).toEqual([]);
    await user.type(screen.getByLabelText('Secret'), ' no longer');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    const secret = await screen.findByLabelText(/^Secret \(optional\)/);
    expect((secret as HTMLInputElement).value).toBe('');
    expect(sent).toEqual([
      { call: 'PUT /api/sites/1/webhook', body: { url, secret: 'too short no longer' } },
    ]);
  });

  it('shows at its field why an address is refused', async () => {
    const message = '10.0.0.4 is an address of an inner network.';
    openPage({
      'GET /api/sites/1/webhook': webhook({ url, since: '2026-12-01T08:00:00.000Z' }),
      'PUT /api/sites/1/webhook': () =>
        Response.json(
          { error: { code: 'validation', message, id: 'x', fields: [{ path: 'url', message }] } },
          { status: 422 },
        ),
    });
    const user = userEvent.setup();
    const address = await screen.findByLabelText('Address');
    await user.clear(address);
    await user.type(address, 'http://10.0.0.4/x');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText(message)).toBeTruthy();
    expect(address.getAttribute('aria-invalid')).toBe('true');
  });

  it('shows a fault and tells again', async () => {
    const { sent } = openPage({
      'GET /api/sites/1/webhook': webhook({
        url,
        since: '2026-12-01T08:00:00.000Z',
        deliveries: [
          {
            id: 4,
            inspectionId: 5,
            toState: 'reported',
            state: 'failed',
            attempts: 30,
            lastError: 'The receiver answered 503.',
            createdAt: '2026-12-01T09:00:00.000Z',
            sentAt: null,
            nextAttemptAt: null,
          },
        ],
      }),
      'POST /api/sites/1/webhook/deliveries/4/send-again': () =>
        new Response(null, { status: 204 }),
    });
    const table = await screen.findByRole('table', { name: 'What was told' });
    expect(within(table).getByText('Given up after 30 attempts')).toBeTruthy();
    expect(within(table).getByText('The receiver answered 503.')).toBeTruthy();
    const name = 'Tell now: inspection 5, reported';
    await userEvent.setup().click(within(table).getByRole('button', { name }));
    expect(await screen.findByText('It is told again now.')).toBeTruthy();
    expect(sent.map(({ call }) => call)).toEqual([
      'POST /api/sites/1/webhook/deliveries/4/send-again',
    ]);
  });
});

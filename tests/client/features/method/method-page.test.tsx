import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the page on the screening method', () => {
  it('tells what the method can’t, and each measured figure beside what is wanted', async () => {
    renderPage('/method', { 'GET /api/session': aSession('analyst') });
    await screen.findByRole('heading', { level: 1, name: 'The screening method' });
    screen.getByText('“No looseness signs” is no proof of a tight fit.');
    const table = screen.getByRole('table', { name: 'Measured figures beside their targets' });
    const found = within(table).getByRole('row', { name: /looseness found, where physics/u });
    expect(found.textContent).toMatch(/\d %at least 95.*%(met|falls short)$/u);
  });

  it('shows what a flag is worth where one point in a hundred is loose', async () => {
    renderPage('/method', { 'GET /api/session': aSession('owner') });
    const table = await screen.findByRole('table', {
      name: 'What a flag is worth where 1 % of the points are loose',
    });
    const half = within(table).getByRole('row', { name: /^0\.50/u });
    const [found, alarms, right] = within(half)
      .getAllByRole('cell')
      .map((cell) => Number.parseFloat(cell.textContent ?? '') / 100);
    // Bayes' theorem.
    const expected = (0.01 * found!) / (0.01 * found! + 0.99 * alarms!);
    expect(right).toBeCloseTo(expected, 2);
  });

  it('sends people who are not signed in to sign in, and back', async () => {
    const { router } = renderPage('/method', {
      'GET /api/session': () => refusal(401, 'not_signed_in', 'Sign in first.'),
      'POST /api/session/refresh': () => refusal(401, 'not_signed_in', 'Sign in first.'),
    });
    await vi.waitFor(() => expect(router.state.location.pathname).toBe('/sign-in'), {
      timeout: 10_000,
    });
    expect(router.state.location.search).toBe('?next=%2Fmethod');
  });
});

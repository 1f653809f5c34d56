import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { publishedFits } from '#fixtures/fits/worked-fits.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';
import '../../charts/browser-stubs.ts';

beforeEach(() => localStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const show = (search: string, role: 'lead' | 'owner' = 'lead') =>
  renderPage(`/sites/1/fit-workbench${search}`, { 'GET /api/session': aSession(role) });

const inWords = (um: number) =>
  um === 0 ? '0 µm' : `${Math.abs(um)} µm ${um < 0 ? 'clearance' : 'interference'}`;

describe('the fit workbench', () => {
  // Printed fits of a bearing maker's table, see fixtures/fits/worked-fits.ts.
  it.each(publishedFits.filter(({ sizeMm }) => sizeMm === 60 || sizeMm === 130))(
    'gives the published fit of $seat $sizeMm $toleranceClass',
    async ({ seat, sizeMm, toleranceClass, minUm, maxUm }) => {
      show(`?${seat === 'shaft' ? 'd' : 'D'}=${sizeMm}&${seat}Class=${toleranceClass}`);
      const card = await screen.findByRole('article', {
        name: seat === 'shaft' ? 'Shaft seat' : 'Housing seat',
      });
      const gauge = within(card).getByRole('img');
      const words = gauge.getAttribute('aria-label') ?? '';
      expect(words).toContain(inWords(minUm));
      expect(words).toContain(inWords(maxUm));
    },
  );

  it('works out what is typed, and keeps it in the address', async () => {
    const person = userEvent.setup();
    const { router } = show('');
    await screen.findByText('Nothing is tried yet');
    await person.type(screen.getByRole('textbox', { name: /^Designation/u }), '6312');
    await person.type(screen.getByRole('textbox', { name: /^Shaft class/u }), 'k5');
    await person.selectOptions(
      screen.getByRole('combobox', { name: /^Load on the inner ring/u }),
      'rotating',
    );
    const card = await screen.findByRole('article', { name: 'Shaft seat' });
    // ISO 286: 60 k5 is +2 … +15 µm.
    expect(card.textContent).toMatch(/60\.002 to 60\.015/u);
    expect(router.state.location.search).toBe('?designation=6312&shaftClass=k5&innerLoad=rotating');
  });

  it('names a wrong value at its field and goes on with the rest', async () => {
    show('?designation=6312&shaftClass=k5&loadLevel=huge&shaftC=-300');
    await screen.findByText('This can’t be worked out yet');
    expect(screen.getByRole('combobox', { name: /^Load \(/u }).getAttribute('aria-invalid')).toBe(
      'true',
    );
    const temperature = screen.getAllByRole('textbox', { name: /^Shaft \(/u })[0]!;
    expect(temperature.getAttribute('aria-invalid')).toBe('true');
    cleanup();
    show('?designation=6312&shaftClass=k5&loadLevel=huge&shape=round');
    await screen.findByRole('article', { name: 'Shaft seat' });
    screen.getByText(/does not know: shape/u);
  });

  it('questions a diameter that was typed in the other unit, and takes it in inches', async () => {
    show('?designation=6312&shaftClass=k5&shaftMeasuredMm=2.3626');
    await screen.findByText('This can’t be worked out yet');
    cleanup();
    show('?designation=6312&shaftClass=k5&shaftMeasuredMm=2.3626&unit=in');
    // 2.3626 in × 25.4 = 60.010 mm.
    const card = await screen.findByRole('article', { name: 'Shaft seat' });
    expect(within(card).getByRole('img').getAttribute('aria-label')).toMatch(/easured/u);
  });

  it('offers to copy a fit to the lead alone, who lands in the form of the seat', async () => {
    show('?designation=6312&shaftClass=k5', 'owner');
    await screen.findByRole('article', { name: 'Shaft seat' });
    expect(screen.queryByRole('button', { name: 'Copy into a fit record' })).toBeNull();
    cleanup();
    show('?designation=6312&shaftClass=k5', 'lead');
    await screen.findByRole('button', { name: 'Copy into a fit record' });
  });
});

import { cleanup, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import '../../charts/browser-stubs.ts';
import { aFinding, anInspection, aSession } from '#tests/support/client-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

const path = '/api/sites/1/findings/3';
const answers = {
  'GET /api/session': aSession('lead'),
  [`GET ${path}`]: aFinding(),
  'GET /api/sites/1/members': {
    members: [
      { userId: 8, name: 'Lena Lead', email: 'lena@plant.example', role: 'lead' },
      { userId: 9, name: 'Oskar Owner', email: 'oskar@plant.example', role: 'owner' },
    ],
  },
};

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('a finding', () => {
  it('says which seat explains it', async () => {
    renderPage('/sites/1/findings/3', answers);
    await screen.findByText('The shaft seat of Pump, drive end explains the finding best.');
    screen.getByText(/70 %/);
  });

  it('offers only what the server says the person may do', async () => {
    const none = { assign: false, monitor: false, dismiss: false, reopen: true, verify: false };
    renderPage('/sites/1/findings/3', {
      ...answers,
      [`GET ${path}`]: aFinding({ state: 'dismissed', can: none }),
    });
    await screen.findByRole('button', { name: 'Reopen' });
    expect(screen.queryByRole('button', { name: 'Dismiss' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Assign inspection' })).toBeNull();
  });

  it('is dismissed with a reason only', async () => {
    const dismissed = aFinding({ state: 'dismissed', version: 2 });
    const { sent } = renderPage('/sites/1/findings/3', {
      ...answers,
      [`POST ${path}/decision`]: dismissed,
    });
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Dismiss' }));
    const dialog = await screen.findByRole('dialog');
    const submit = screen
      .getAllByRole('button', { name: 'Dismiss' })
      .find((b) => dialog.contains(b));
    if (submit === undefined) throw new Error('The dialog has no button to dismiss.');
    await user.click(submit);
    await screen.findByText('Give a reason.');
    expect(sent).toEqual([]);
    await user.type(screen.getByLabelText('Reason'), 'Resonance of the guard.');
    await user.click(submit);
    await waitFor(() =>
      expect(sent).toEqual([
        {
          call: `POST ${path}/decision`,
          body: { action: 'dismiss', reason: 'Resonance of the guard.', version: 1 },
        },
      ]),
    );
  });

  it('is assigned to the owner of the machine unless another is chosen', async () => {
    const { sent } = renderPage('/sites/1/findings/3', {
      ...answers,
      [`POST ${path}/inspections`]: anInspection({ state: 'assigned' }),
    });
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Assign inspection' }));
    await screen.findByRole('option', { name: 'Oskar Owner', selected: true });
    expect(screen.queryByRole('option', { name: 'Lena Lead' })).toBeNull();
    await user.type(screen.getByLabelText(/Work order/), 'WO-1');
    await user.click(screen.getByRole('button', { name: /Assign and send/ }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toMatchObject({
      assigneeUserId: 9,
      checkShaftSeat: true,
      checkHousingSeat: false,
      checkInPlace: false,
      workOrderReference: 'WO-1',
      instructions: null,
      version: 1,
    });
  });
});

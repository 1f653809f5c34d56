import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import '../../charts/browser-stubs.ts';
import { aFinding, anInspection, aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

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

const repaired = (overrides: Partial<FindingResponse> = {}) =>
  aFinding({
    state: 'repaired',
    version: 4,
    verification: { repairedOn: '2026-11-10', surveyCount: 0, comparison: null },
    can: { assign: false, monitor: false, dismiss: false, reopen: true, verify: true },
    ...overrides,
  });
const reading = {
  surveyedOn: '2026-11-02',
  verdict: 'likely' as const,
  score: 0.82,
  runLength: 6,
  runMmPerSRms: 1.9,
  overallMmPerSRms: 4.6,
  speedRpm: 1476,
};

describe('a repaired finding', () => {
  it('says that the survey after the repair is waited for', async () => {
    renderPage('/sites/1/findings/3', { ...answers, [`GET ${path}`]: repaired() });
    await screen.findByText(/No survey has measured this bearing position since/);
  });

  it('shows the numbers before and after, what was measured otherwise, and the proposal', async () => {
    const comparison = {
      surveyedOn: '2026-12-01',
      proposal: 'measure again' as const,
      sentence: 'Survey of 2026-12-01: this can’t tell yet.',
      points: [
        {
          pointLabel: 'P-101/DE/V',
          outcome: 'The signs are gone',
          sentence: 'The signs are gone: …',
          before: reading,
          after: { ...reading, surveyedOn: '2026-12-01', score: 0.05, speedRpm: 990 },
        },
        {
          pointLabel: 'P-101/DE/H',
          outcome: 'Not measured',
          sentence: 'Not measured.',
          before: reading,
          after: null,
        },
      ],
      conditions: ['At P-101/DE/V the shaft ran at 990 r/min instead of 1476 r/min.'],
    };
    renderPage('/sites/1/findings/3', {
      ...answers,
      [`GET ${path}`]: repaired({
        verification: { repairedOn: '2026-11-10', surveyCount: 1, comparison },
      }),
    });
    await screen.findByText('Proposed: measure again before deciding.');
    const row = screen.getByRole('row', { name: /^Score/ });
    expect(row.textContent).toBe('Score0.820.05');
    screen.getByText('At P-101/DE/V the shaft ran at 990 r/min instead of 1476 r/min.');
    screen.getByText('Not measured.');
  });

  it('tells the second lead what the first did, and keeps the reason typed', async () => {
    renderPage('/sites/1/findings/3', {
      ...answers,
      [`GET ${path}`]: repaired(),
      [`POST ${path}/decision`]: () =>
        refusal(409, 'conflict', 'It is now open. Lena Lead reopened it: “Still loud.”'),
    });
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Verify' }));
    const dialog = await screen.findByRole('dialog');
    await user.type(within(dialog).getByLabelText('Reason'), 'All quiet.');
    await user.click(within(dialog).getByRole('button', { name: 'Verify' }));
    await within(dialog).findByText(/Lena Lead reopened it: “Still loud.”/);
    expect(within(dialog).getByLabelText<HTMLTextAreaElement>('Reason').value).toBe('All quiet.');
  });
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

  it('is monitored until a day or for a number of surveys, never without an end', async () => {
    const monitoring = {
      since: '2026-12-01T08:00:00.000Z',
      untilOn: null,
      surveyLimit: 2,
      surveyCount: 0,
      overdue: false,
    };
    const { sent } = renderPage('/sites/1/findings/3', {
      ...answers,
      [`POST ${path}/decision`]: aFinding({ state: 'monitoring', version: 2, monitoring }),
    });
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Monitor' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.type(dialog.getByLabelText('Reason'), 'Low level.');
    await user.click(dialog.getByRole('button', { name: 'Monitor' }));
    await dialog.findByText('Say until which day or for how many surveys.');
    expect(sent).toEqual([]);
    await user.type(dialog.getByLabelText(/so many surveys/), '2');
    await user.click(dialog.getByRole('button', { name: 'Monitor' }));
    await waitFor(() =>
      expect(sent[0]?.body).toEqual({
        action: 'monitor',
        reason: 'Low level.',
        version: 1,
        monitorUntilOn: null,
        monitorSurveys: 2,
      }),
    );
  });

  it('says that a monitored finding is to be decided again', async () => {
    const monitoring = {
      since: '2026-11-03T08:00:00.000Z',
      untilOn: '2026-11-30',
      surveyLimit: 3,
      surveyCount: 1,
      overdue: true,
    };
    renderPage('/sites/1/findings/3', {
      ...answers,
      [`GET ${path}`]: aFinding({ state: 'monitoring', monitoring }),
    });
    await screen.findByText(/until 30 Nov 2026, 1 of 3 surveys/);
    screen.getByText(/decide again/);
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

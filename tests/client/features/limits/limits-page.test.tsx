import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { LimitsResponse, LimitsTrialResponse } from '#shared/contracts/limits.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

const limits: LimitsResponse = {
  site: { machineKind: null, suspectedScore: 0.5, likelyScore: 0.8, own: false, machineCount: 9 },
  kinds: [
    { machineKind: 'fan', suspectedScore: 0.6, likelyScore: 0.9, own: true, machineCount: 4 },
    { machineKind: 'pump', suspectedScore: 0.5, likelyScore: 0.8, own: false, machineCount: 5 },
  ],
  method: { suspectedScore: 0.5, likelyScore: 0.8 },
  history: [
    {
      id: 7,
      machineKind: 'fan',
      suspectedScore: 0.6,
      likelyScore: 0.9,
      reason: 'Blade pass looks alike.',
      changedByName: 'Lena Lead',
      changedAt: '2026-11-03T08:00:00.000Z',
    },
  ],
  version: 7,
};
const trial: LimitsTrialResponse = {
  now: { suspectedScore: 0.5, likelyScore: 0.8 },
  tried: { suspectedScore: 0.6, likelyScore: 0.8 },
  screeningCount: 120,
  flagsNowCount: 9,
  flagsThenCount: 7,
  coming: { flagCount: 0, looseCount: 0, notLooseCount: 0 },
  going: { flagCount: 2, looseCount: 1, notLooseCount: 0 },
  changingCount: 0,
  otherMethodCount: 0,
  changes: [
    {
      screeningId: 11,
      surveyId: 2,
      surveyedOn: '2026-09-28',
      machineTag: 'P-101',
      positionName: 'Pump, drive end',
      pointLabel: 'P-101/DE/V',
      score: 0.587,
      verdictNow: 'suspected',
      verdictThen: 'none',
      verdictGiven: 'suspected',
      decision: 'accepted',
      inspection: { outcome: 'loose', reportedOn: '2026-10-08' },
    },
  ],
};
const open = (answers: Record<string, object | (() => object)> = {}) =>
  renderPage('/sites/1/limits', {
    'GET /api/session': aSession('lead'),
    'GET /api/sites/1/limits': limits,
    'GET /api/sites/1/limits/trial': trial,
    ...answers,
  });

async function tryWith(suspected: string) {
  const user = userEvent.setup();
  const field = await screen.findByLabelText('Looseness suspected from');
  await user.clear(field);
  await user.type(field, suspected);
  await user.click(screen.getByRole('button', { name: 'Try on the past surveys' }));
  return user;
}

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the limits of the verdict', () => {
  it('show what is in force, for whom, and who changed it why', async () => {
    open();
    const table = within(await screen.findByRole('table', { name: 'Limits in force' }));
    table.getByRole('row', { name: 'The whole site 9 0.50 0.80 the method' });
    table.getByRole('row', { name: 'fan 4 0.60 0.90 this site, for the kind' });
    table.getByRole('row', { name: 'pump 5 0.50 0.80 as the site' });
    screen.getByText('Blade pass looks alike.');
  });

  it.each([
    ['0.9', 'Suspicion begins at or below the limit of likely.'],
    ['1.5', 'A score lies between 0 and 1.'],
    ['high', 'Enter a number.'],
  ])('name at the field what is wrong with %s', async (typed, message) => {
    open();
    await tryWith(typed);
    await screen.findByText(message);
    expect(screen.queryByText('What the past surveys say')).toBeNull();
  });

  it('tell before saving which flags would go and what inspections found there', async () => {
    const { sent } = open({ 'POST /api/sites/1/limits': { ...limits, version: 8 } });
    const user = await tryWith('0,6');
    await screen.findByText(/2 flags would go \(inspected since: 1 loose, 0 not loose/);
    screen.getByText(/would have missed 1 that an inspection found loose/);
    const table = within(screen.getByRole('table', { name: /verdict would change/ }));
    table.getByRole('row', { name: /P-101\/DE\/V.*0\.587.*suspected.*No looseness.*Loose 8 Oct/ });

    await user.click(screen.getByRole('button', { name: 'Save these limits' }));
    await screen.findByText('Give a reason.');
    expect(sent).toEqual([]);
    await user.type(screen.getByLabelText('Reason'), 'Fewer false ones.');
    await user.click(screen.getByRole('button', { name: 'Save these limits' }));
    await waitFor(() =>
      expect(sent[0]?.body).toEqual({
        machineKind: null,
        suspectedScore: 0.6,
        likelyScore: 0.8,
        reason: 'Fewer false ones.',
        version: 7,
      }),
    );
    await screen.findByText('The limits are in force for new screenings.');
  });

  it('let a kind follow the site again', async () => {
    const { sent } = open({ 'POST /api/sites/1/limits': limits });
    const user = userEvent.setup();
    await user.selectOptions(await screen.findByLabelText('For'), 'Machine kind: fan');
    expect(screen.getByLabelText<HTMLInputElement>('Looseness likely from').value).toBe('0.9');
    await user.click(screen.getByLabelText('As the whole site (0.50 and 0.80)'));
    await user.click(screen.getByRole('button', { name: 'Try on the past surveys' }));
    await user.type(await screen.findByLabelText('Reason'), 'As the others.');
    await user.click(screen.getByRole('button', { name: 'Save these limits' }));
    await waitFor(() =>
      expect(sent[0]?.body).toMatchObject({
        machineKind: 'fan',
        suspectedScore: null,
        likelyScore: null,
      }),
    );
  });

  it('keep the reason where another lead was first', async () => {
    open({
      'POST /api/sites/1/limits': () =>
        refusal(409, 'conflict', 'Otto Other changed the limits meanwhile.'),
    });
    const user = await tryWith('0.6');
    await user.type(await screen.findByLabelText('Reason'), 'Fewer false ones.');
    await user.click(screen.getByRole('button', { name: 'Save these limits' }));
    await screen.findByText('Otto Other changed the limits meanwhile.');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Reason').value).toBe('Fewer false ones.');
  });
});

import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { OutcomeGroupResponse, OutcomesResponse } from '#shared/contracts/outcomes.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

const aGroup = (overrides: Partial<OutcomeGroupResponse> = {}): OutcomeGroupResponse => ({
  confirmedCount: 3,
  notFoundCount: 7,
  unsettledCount: 0,
  dismissedCount: 1,
  waitingCount: 2,
  predictiveValue: { share: 0.3, low: 0.1077913, high: 0.6032219 },
  ...overrides,
});
const outcomes = (overrides: Partial<OutcomesResponse> = {}): OutcomesResponse => ({
  flags: {
    flaggedCount: 30,
    acceptedCount: 13,
    rejectedCount: 11,
    retakeCount: 1,
    waitingCount: 5,
  },
  site: aGroup(),
  byVerdict: [
    { verdict: 'likely', ...aGroup() },
    { verdict: 'suspected', ...aGroup({ predictiveValue: null }) },
  ],
  byMachineKind: [{ machineKind: 'fan', ...aGroup() }],
  times: [
    { step: 'survey to inspection', medianDays: 15.5, findingCount: 10 },
    { step: 'inspection to closing', medianDays: null, findingCount: 0 },
    { step: 'survey to closing', medianDays: null, findingCount: 0 },
  ],
  traits: [
    { trait: 'machine kind', value: 'fan', confirmedCount: 3, notFoundCount: 8 },
    { trait: 'speed source', value: 'estimated', confirmedCount: 1, notFoundCount: 8 },
    { trait: 'kind of looseness', value: 'seat', confirmedCount: 3, notFoundCount: 8 },
    { trait: 'direction', value: 'axial', confirmedCount: 3, notFoundCount: 8 },
  ],
  ...overrides,
});
const show = (answer: OutcomesResponse) =>
  renderPage('/sites/1/outcomes', {
    'GET /api/session': aSession('analyst'),
    'GET /api/sites/1/outcomes': answer,
  });

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the outcomes of a site', () => {
  it('show how often flags proved right, with the interval', async () => {
    show(outcomes());
    const table = within(await screen.findByRole('table', { name: 'Findings by outcome' }));
    const row = table.getByRole('row', { name: /^The whole site/ });
    expect(
      within(row)
        .getAllByRole('cell')
        .map(({ textContent }) => textContent),
    ).toEqual(['3', '7', '0', '1', '2', '30 %', '11 to 60 %']);
    const suspected = table.getByRole('row', { name: /Looseness suspected/ });
    expect(within(suspected).getAllByRole('cell').at(-1)?.textContent).toBe('–');
  });

  it('show medians with the findings they stand on', async () => {
    show(outcomes());
    const table = within(await screen.findByRole('table', { name: 'Time taken' }));
    table.getByRole('row', { name: /report of the inspection 15\.5 ?days 10$/ });
    expect(table.getAllByRole('row', { name: /closing of the finding not known 0/ })).toHaveLength(
      2,
    );
  });

  it('set wrong flags against right ones, and say where they are too few for a pattern', async () => {
    show(outcomes());
    const table = within(await screen.findByRole('table', { name: 'Running speed' }));
    table.getByRole('row', { name: 'estimated from the record 8 1' });
    screen.getByText(/8 flags proved wrong and 3 right.*too few for a pattern/);
  });

  it('make nothing of no wrong flags', async () => {
    show(
      outcomes({
        traits: [{ trait: 'machine kind', value: 'fan', confirmedCount: 3, notFoundCount: 0 }],
      }),
    );
    await screen.findByText(/No flag has proved wrong at an inspection yet.*3 proved right/);
  });

  it('say so where there is no flag at all', async () => {
    const none = {
      flaggedCount: 0,
      acceptedCount: 0,
      rejectedCount: 0,
      retakeCount: 0,
      waitingCount: 0,
    };
    show(outcomes({ flags: none }));
    await screen.findByText('No flags yet');
  });
});

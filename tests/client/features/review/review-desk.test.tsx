import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import '../../charts/browser-stubs.ts';
import { aQueueItem, aScreening, aSession, aWaveform } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

const site = '/api/sites/1';
const labels = { 1: 'P-101/DE/V', 2: 'P-101/DE/H' } as const;

const recordingAnswers = (id: 1 | 2) => ({
  [`GET ${site}/screenings/${id}`]: aScreening(id),
  [`GET ${site}/waveforms/${id + 100}`]: aWaveform(id + 100, labels[id]),
  [`GET ${site}/waveforms/${id + 100}/samples`]: new Float32Array(64),
  [`GET ${site}/screenings/${id}/spectrum`]: new Float32Array([1, ...Array<number>(32).fill(0.1)]),
  [`GET ${site}/screenings/${id}/averaged-revolution`]: new Float32Array(16),
});

/** A desk with two flags; what was decided leaves the queue. */
function openDesk(more: Parameters<typeof renderPage>[1] = {}, path = '/sites/1/review') {
  const decided = new Set<number>();
  const accept = (id: 1 | 2) => () => {
    decided.add(id);
    return { screeningId: id, decision: 'accepted', findingId: 3, findingIsNew: id === 1 };
  };
  return renderPage(path, {
    'GET /api/session': aSession('analyst'),
    [`GET ${site}/review-queue`]: () => {
      const items = ([1, 2] as const)
        .filter((id) => !decided.has(id))
        .map((id) => aQueueItem(id, labels[id]));
      return { items, total: items.length, page: 1, pageSize: 100 };
    },
    ...recordingAnswers(1),
    ...recordingAnswers(2),
    [`POST ${site}/screenings/1/decision`]: accept(1),
    [`POST ${site}/screenings/2/decision`]: accept(2),
    ...more,
  });
}

const shown = (label: string) => screen.findByRole('heading', { name: label });

beforeEach(() => localStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the review desk', () => {
  it('shows the first flag with its evidence and what was ruled out', async () => {
    openDesk();
    await shown(labels[1]);
    await screen.findByText('Orders 1 to 6 stand out.');
    screen.getByText(/is ruled out: The run is too long\./);
    screen.getByText('1476.0 ± 1.2');
  });

  it('goes on and back by j and k, and keeps the place in the address', async () => {
    const { router } = openDesk();
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.keyboard('j');
    await shown(labels[2]);
    expect(router.state.location.search).toContain('screening=2');
    await user.keyboard('k');
    await shown(labels[1]);
  });

  it('accepts by key, says what came of it and goes to the next flag', async () => {
    const { sent } = openDesk();
    await shown(labels[1]);
    await userEvent.keyboard('a');
    await shown(labels[2]);
    expect(sent).toEqual([
      { call: `POST ${site}/screenings/1/decision`, body: { decision: 'accepted', reason: '' } },
    ]);
    await screen.findByText('P-101/DE/V: accepted. Finding 3 is open.');
  });

  it('says what to do once the queue is empty', async () => {
    openDesk();
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.keyboard('a');
    await shown(labels[2]);
    await user.keyboard('a');
    await screen.findByText('No flag waits for a decision');
    within(screen.getByRole('main')).getByRole('link', { name: 'Surveys' });
  });

  it('asks for a reason before it rejects, and typing it triggers no key', async () => {
    const { sent } = openDesk({
      [`POST ${site}/screenings/1/decision`]: {
        screeningId: 1,
        decision: 'rejected',
        findingId: null,
        findingIsNew: false,
      },
    });
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.keyboard('r');
    const dialog = await screen.findByRole('dialog', { name: 'Reject this flag' });
    await user.click(within(dialog).getByRole('button', { name: 'Reject' }));
    await within(dialog).findByText('Give a reason.');
    await user.type(within(dialog).getByLabelText('Reason'), 'a jammed tarp');
    expect(sent).toEqual([]);
    await user.click(within(dialog).getByRole('button', { name: 'Reject' }));
    await waitFor(() =>
      expect(sent).toEqual([
        {
          call: `POST ${site}/screenings/1/decision`,
          body: { decision: 'rejected', reason: 'a jammed tarp' },
        },
      ]),
    );
  });

  it('tells the second of two people that somebody has decided already', async () => {
    const message = 'Otto Analyst rejected this flag on 2026-11-03 09:00 UTC.';
    openDesk({
      [`POST ${site}/screenings/1/decision`]: () => refusal(409, 'conflict', message),
    });
    await shown(labels[1]);
    await userEvent.keyboard('a');
    await screen.findByText(message);
  });

  it('takes the last decision back by u', async () => {
    const { sent } = openDesk({
      [`DELETE ${site}/screenings/1/decision`]: () => new Response(null, { status: 204 }),
    });
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.keyboard('a');
    await screen.findByText(/Finding 3 is open/);
    await user.keyboard('u');
    await waitFor(() =>
      expect(sent.map(({ call }) => call)).toContain(`DELETE ${site}/screenings/1/decision`),
    );
  });

  it('lists its keys on ? and lets them be switched off', async () => {
    const { sent } = openDesk();
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.keyboard('?');
    const dialog = await screen.findByRole('dialog', { name: 'Keys of the review desk' });
    await user.click(within(dialog).getByLabelText(/Single keys act/));
    await user.keyboard('{Escape}');
    await user.keyboard('ja');
    await shown(labels[1]);
    expect(sent).toEqual([]);
  });

  it('shows the spectrum in the unit chosen, which stays the person’s on this device', async () => {
    const { router } = openDesk();
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.selectOptions(await screen.findByLabelText('Unit'), 'µm');
    await user.selectOptions(screen.getByLabelText('Size stated as'), 'Peak-to-peak');
    await screen.findByRole('application', { name: /Spectrum, µm peak-to-peak/ });
    await screen.findByText(/Integrated from m\/s²; nothing is shown below 1\.5 Hz/);
    expect(new URLSearchParams(router.state.location.search).get('unit')).toBe('µm');
    cleanup();
    openDesk();
    await screen.findByRole('application', { name: /Spectrum, µm peak-to-peak/ });
  });

  it('says the reference of a level where the level is shown', async () => {
    openDesk({}, '/sites/1/review?scale=db&unit=mm/s&size=rms');
    await screen.findByRole('application', { name: /Spectrum, dB re 1 nm\/s, rms/ });
    await screen.findByText(/0 dB is 1 nm\/s \(ISO 1683\)/);
  });

  it('opens with the cursor of the address and keeps it for the next flag', async () => {
    openDesk({}, '/sites/1/review?cursor=harmonics_1&zoom=0.2_1.2');
    await screen.findByText(/^Harmonics of 24\.60 Hz \(1\.000×\)/);
    await userEvent.keyboard('j');
    await shown(labels[2]);
    await screen.findByText(/^Harmonics of 24\.60 Hz/);
    const group = within(screen.getByRole('group', { name: 'Cursor' }));
    expect(group.getByRole('button', { name: 'Harmonics' }).getAttribute('aria-pressed')).toBe(
      'true',
    );
  });

  it('writes the cursor into the address, and carries it over to an axis in Hz', async () => {
    const { router } = openDesk();
    await shown(labels[1]);
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Sidebands' }));
    const search = () => new URLSearchParams(router.state.location.search);
    await waitFor(() => expect(search().get('cursor')).toMatch(/^sidebands_[\d.]+_1$/));
    await user.selectOptions(screen.getByLabelText('Frequency axis'), 'Hz');
    await waitFor(() => expect(search().get('cursor')).toMatch(/^sidebands_[\d.]+_24\.6$/));
  });

  it('leaves out what it does not understand of the address, and says so', async () => {
    openDesk(
      {},
      '/sites/1/review?axis=bananas&zoom=9_2&cursor=harmonics_x&unit=parsec&screening=x',
    );
    await shown(labels[1]);
    await screen.findByText('A part of the address was not understood and is left out');
    screen.getByText(/“bananas” is no frequency axis\./);
    screen.getByText(/“9_2” is no stretch of a spectrum\./);
    screen.getByText(/“harmonics_x” is no cursor\./);
    screen.getByText(/“parsec” is no unit of vibration/);
    screen.getByText(/“x” is no flag\./);
    await screen.findByRole('application', { name: /Spectrum, m\/s² peak/ });
  });

  it('shows the other directions of the position beneath, in the same unit', async () => {
    const alongside = [
      {
        waveformId: 109,
        screeningId: 9,
        direction: 'axial' as const,
        unit: 'm/s²' as const,
        speedHz: 24.6,
      },
    ];
    openDesk(
      {
        [`GET ${site}/waveforms/101`]: { ...aWaveform(101, labels[1]), alongside },
        [`GET ${site}/screenings/9/spectrum`]: new Float32Array([
          1,
          ...Array<number>(32).fill(0.1),
        ]),
      },
      '/sites/1/review?unit=mm/s',
    );
    const others = within(await screen.findByRole('region', { name: 'Other directions' }));
    await others.findByRole('application', { name: /^Axial, same survey, mm\/s peak/ });
  });
});

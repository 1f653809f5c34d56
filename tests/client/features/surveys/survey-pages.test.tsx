import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { directionLetter, type PointChoice } from '#shared/contracts/measuring-point.ts';
import type { SurveyCounts, SurveyResponse } from '#shared/contracts/survey.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { aSession, aWaveform } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

const aPoint = (
  id: number,
  positionCode: string,
  direction: 'horizontal' | 'vertical' = 'horizontal',
): PointChoice => ({
  id,
  label: `P-101/${positionCode}/${directionLetter[direction]}`,
  machineId: 2,
  machineTag: 'P-101',
  machineName: 'Circulation pump',
  positionCode,
  positionName: 'Pump, drive end',
  direction,
  nominalSpeedRpm: 1480,
});
const points = [aPoint(1, 'M-DE'), aPoint(2, 'P-DE'), aPoint(3, 'P-DE', 'vertical')];

const aListed = (id: number, overrides: Partial<WaveformListItem>): WaveformListItem => ({
  ...aWaveform(id, 'P-101/M-DE/H'),
  ...overrides,
});

const counts: SurveyCounts = {
  pointCount: 3,
  measuredPointCount: 2,
  waveformCount: 3,
  queuedCount: 0,
  runningCount: 0,
  doneCount: 2,
  failedCount: 1,
  rejectedFileCount: 1,
  noneCount: 1,
  suspectedCount: 0,
  likelyCount: 1,
  retakeCount: 0,
  undecidedFlagCount: 1,
};
const survey: SurveyResponse = {
  id: 4,
  routeId: 9,
  routeName: 'Monthly walk',
  surveyedOn: '2026-11-30',
  createdByName: 'Ada Analyst',
  counts,
  points,
  missingPoints: [aPoint(3, 'P-DE', 'vertical')],
  waveforms: [
    aListed(31, {
      measuringPointId: 2,
      pointLabel: 'P-101/P-DE/H',
      screeningState: 'failed',
      screeningFailure: 'It took longer than 5 minutes.',
      screeningId: null,
      verdict: null,
      score: null,
    }),
    aListed(32, { measuringPointId: 1, verdict: 'likely', score: 0.91, screeningId: 77 }),
    aListed(33, {
      measuringPointId: 8,
      pointLabel: 'P-300/F-DE/H',
      verdict: 'none',
      score: 0.05,
      screeningId: 78,
    }),
  ],
  rejectedFiles: [
    {
      id: 6,
      fileName: 'broken.csv',
      errorCode: 'not-a-number',
      errorLine: 17,
      errorMessage: '“overflow” stands where a number was expected.',
      rejectedAt: '2026-11-30T10:00:00.000Z',
    },
  ],
  can: { upload: true },
};
const answers = {
  'GET /api/session': aSession('analyst'),
  'GET /api/sites/1/surveys/4': survey,
  'GET /api/sites/1/surveys/4/progress': counts,
  'GET /api/sites/1/points': { points },
};

describe('the page of a survey', () => {
  it('lists the waveforms in walking order, the gaps, and points off the route last', async () => {
    renderPage('/sites/1/surveys/4', answers);
    const table = await screen.findByRole('table', { name: 'Points and waveforms' });
    const rows = within(table).getAllByRole('row').slice(1);
    expect(rows.map((row) => within(row).getByRole('rowheader').textContent)).toEqual([
      'P-101/M-DE/HCirculation pump',
      'P-101/P-DE/HCirculation pump',
      'P-101/P-DE/VCirculation pump',
      'P-300/F-DE/HNot a point of this route',
    ]);
    expect(rows[0]?.textContent).toContain('Looseness likely');
    expect(rows[0]?.textContent).toContain('0.91');
    expect(rows[2]?.textContent).toContain('No waveform');
    const missing = screen.getByRole('region', { name: '1 point without a waveform' });
    expect(missing.textContent).toContain('P-101/P-DE/V');
  });

  it('leads to the review of its flags and of one waveform', async () => {
    renderPage('/sites/1/surveys/4', answers);
    const all = await screen.findByRole('link', { name: 'Review 1 flag' });
    expect(all.getAttribute('href')).toBe('/sites/1/review?surveyId=4');
    const one = screen.getByRole('link', { name: 'Review P-101/M-DE/H' });
    expect(one.getAttribute('href')).toBe('/sites/1/review?surveyId=4&screening=77');
  });

  it('says why a screening failed and starts it again', async () => {
    const { sent } = renderPage('/sites/1/surveys/4', {
      ...answers,
      'POST /api/sites/1/waveforms/31/screen-again': survey.waveforms[0]!,
    });
    expect(await screen.findByText('It took longer than 5 minutes.')).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Screen P-101/P-DE/H again' }));
    expect(sent).toEqual([{ call: 'POST /api/sites/1/waveforms/31/screen-again', body: {} }]);
  });

  it('names the line and reason of a file that could not be read, until it is put away', async () => {
    const { sent } = renderPage('/sites/1/surveys/4', {
      ...answers,
      'DELETE /api/sites/1/surveys/4/rejected-files/6': () => new Response(null, { status: 204 }),
    });
    const panel = await screen.findByRole('region', { name: '1 file could not be read' });
    expect(panel.textContent).toContain('Line 17: “overflow” stands where a number');
    await userEvent.click(within(panel).getByRole('button', { name: 'Put broken.csv away' }));
    expect(sent[0]?.call).toBe('DELETE /api/sites/1/surveys/4/rejected-files/6');
  });

  it('follows the screening and shows each verdict as it comes', async () => {
    const queued = aListed(32, { measuringPointId: 1, screeningState: 'running', verdict: null });
    const running = { ...counts, waveformCount: 1, runningCount: 1, doneCount: 0, failedCount: 0 };
    const ended = { ...running, runningCount: 0, doneCount: 1 };
    let done = false;
    renderPage('/sites/1/surveys/4', {
      ...answers,
      'GET /api/sites/1/surveys/4': () => ({
        ...survey,
        counts: done ? ended : running,
        waveforms: [done ? survey.waveforms[1]! : queued],
      }),
      'GET /api/sites/1/surveys/4/progress': () => (done ? ended : running),
    });
    const bar = await screen.findByRole('progressbar', { name: 'Screening' });
    expect(bar.getAttribute('aria-valuetext')).toBe('0 of 1 screened');
    expect(screen.getByText('Being screened')).toBeTruthy();
    done = true;
    expect(await screen.findByText('Looseness likely')).toBeTruthy();
    expect(screen.queryByRole('progressbar')).toBeNull();
  });

  it('shows a dropped file with its point before anything is sent', async () => {
    const { sent } = renderPage('/sites/1/surveys/4', answers);
    const user = userEvent.setup({ applyAccept: false });
    await user.click(await screen.findByRole('button', { name: 'Add waveforms' }));
    const rows = Array.from({ length: 40 }, (_, i) => i % 7).join('\n');
    const csv = `# point: P-101/P-DE/V\n# sample_rate_hz: 2560\n# speed_rpm: 1482\nvelocity [mm/s]\n${rows}\n`;
    await user.upload(screen.getByLabelText('Waveform files of this survey: files'), [
      new File([csv], 'walk-0007.csv'),
      new File(['no numbers here'], 'letter.csv'),
    ]);
    const item = await screen.findByRole('listitem', { name: 'walk-0007.csv' });
    expect(await within(item).findByDisplayValue('P-101/P-DE/V')).toBeTruthy();
    for (const said of ['velocity mm/s', '2560 Hz', '1482 r/min', 'matched by its comment lines']) {
      expect(item.textContent).toContain(said);
    }
    const letter = await screen.findByRole('listitem', { name: 'letter.csv' });
    expect(await within(letter).findByText('Can’t be read')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Send 1 file' })).toBeTruthy();
    expect(sent).toEqual([]);
  });
});

describe('the page of a new survey', () => {
  const today = (day: string) => {
    vi.useFakeTimers({ toFake: ['Date'], now: new Date(`${day}T10:00:00Z`) });
  };
  const route = {
    id: 9,
    name: 'Monthly walk',
    pointCount: 3,
    surveyCount: 1,
    lastSurveyedOn: null,
  };
  const pages = {
    ...answers,
    'GET /api/sites/1/routes': { items: [route], total: 1, page: 1, pageSize: 200 },
    'GET /api/sites/1/surveys': { items: [survey], total: 1, page: 1, pageSize: 200 },
  };

  it('makes the survey of today’s walk and goes there', async () => {
    today('2026-12-01');
    const { sent, router } = renderPage('/sites/1/surveys/new', {
      ...pages,
      'POST /api/sites/1/surveys': survey,
    });
    await userEvent.click(await screen.findByRole('button', { name: 'Make the survey' }));
    await vi.waitFor(() => expect(router.state.location.pathname).toBe('/sites/1/surveys/4'));
    expect(sent[0]?.body).toEqual({ routeId: 9, surveyedOn: '2026-12-01' });
  });

  it('leads to the survey that is there for this route and day', async () => {
    today('2026-11-30');
    renderPage('/sites/1/surveys/new', pages);
    const link = await screen.findByRole('link', { name: 'Go to that survey' });
    expect(link.getAttribute('href')).toBe('/sites/1/surveys/4');
    expect(screen.queryByRole('button', { name: 'Make the survey' })).toBeNull();
  });

  it('refuses a day in the future', async () => {
    today('2026-11-29');
    const { sent } = renderPage('/sites/1/surveys/new', pages);
    const date = await screen.findByLabelText('Date of the walk');
    await userEvent.clear(date);
    await userEvent.type(date, '2026-12-24');
    await userEvent.click(screen.getByRole('button', { name: 'Make the survey' }));
    expect(await screen.findAllByText('The date lies in the future.')).not.toHaveLength(0);
    expect(sent).toEqual([]);
  });

  it('says what the server refused', async () => {
    today('2026-12-01');
    renderPage('/sites/1/surveys/new', {
      ...pages,
      'POST /api/sites/1/surveys': () => refusal(409, 'conflict', 'Somebody was faster.'),
    });
    await userEvent.click(await screen.findByRole('button', { name: 'Make the survey' }));
    expect(await screen.findByText('Somebody was faster.')).toBeTruthy();
  });
});

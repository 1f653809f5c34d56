import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import '../../charts/browser-stubs.ts';
import type { SeatHistoryResponse, SeatWearStep } from '#shared/contracts/seat-history.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { aFitRecord } from '#tests/support/register-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

const aStep = (overrides: Partial<SeatWearStep> = {}): SeatWearStep => ({
  fromRecordId: 21,
  toRecordId: 22,
  fromOn: '2020-05-14',
  toOn: '2024-05-14',
  isWork: false,
  lossUm: 20.5,
  expandedUncertaintyUm: 5.8,
  perYearUm: 5.1,
  perYearUncertaintyUm: 1.4,
  isSignificant: true,
  ...overrides,
});

const aHistory = (overrides: Partial<SeatHistoryResponse> = {}): SeatHistoryResponse => ({
  machineId: 2,
  machineTag: 'P-101',
  positionId: 11,
  positionCode: 'P-DE',
  positionName: 'Pump, drive end',
  seat: 'shaft',
  nominalMm: 60,
  taper: null,
  entries: [
    {
      kind: 'record',
      on: '2024-05-14',
      corrected: false,
      record: aFitRecord({
        id: 22,
        recordedOn: '2024-05-14',
        source: 'inspection',
        stage: 'as found',
        toleranceClass: null,
        seatMeasuredMm: 59.9895,
        condition: 'fretting corrosion',
        inspectionId: 5,
        recordedByName: 'Oskar Owner',
      }),
      figures: [
        {
          part: 'seat',
          planes: [
            { plane: 1, meanMm: 59.991, outOfRoundnessUm: 6, readingCount: 4 },
            { plane: 2, meanMm: 59.988, outOfRoundnessUm: null, readingCount: 1 },
          ],
          taperUm: 3,
          expandedUncertaintyUm: 4.2,
        },
      ],
    },
    {
      kind: 'inspection',
      on: '2024-05-14',
      inspectionId: 5,
      state: 'reported',
      outcome: 'loose',
      workDone: 'Shaft sprayed and ground.',
      checksThisSeat: true,
    },
    { kind: 'finding', on: '2024-04-02', findingId: 3, state: 'repaired' },
    {
      kind: 'record',
      on: '2020-05-14',
      corrected: true,
      record: aFitRecord({ seatMeasuredMm: 60.00623, diameterUnit: 'in', source: 'mounting' }),
      figures: [],
    },
  ],
  wear: [aStep()],
  plan: {
    instrument: 'Outside micrometer reading to 1 µm for 60 mm.',
    planesMm: [7.75, 23.25],
    directionsDeg: [0, 45, 90, 135],
    steps: ['Clean the seat.'],
  },
  ...overrides,
});

const openHistory = (history: SeatHistoryResponse) =>
  renderPage('/sites/1/machines/2/positions/11/seats/shaft', {
    'GET /api/session': aSession('lead'),
    'GET /api/sites/1/positions/11/seats/shaft/history': history,
  });

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('the history of a seat', () => {
  it('stands on one line with the findings and inspections, newest first', async () => {
    openHistory(aHistory());
    await screen.findByRole('heading', { name: 'Shaft seat of P-101/P-DE' });
    const line = screen.getByRole('list', { name: 'History of the shaft seat' });
    const titles = [...line.children].map((entry) => entry.textContent);
    expect(titles.map((title) => /\d+ \w+ \d{4}/.exec(title)?.[0])).toEqual([
      '14 May 2024',
      '14 May 2024',
      '2 Apr 2024',
      '14 May 2020',
    ]);
    within(line).getByText('At an inspection, as found');
    expect(
      within(line).getByRole('link', { name: 'Inspection 5 reported' }).getAttribute('href'),
    ).toBe('/sites/1/inspections/5');
    expect(within(line).getByRole('link', { name: 'Finding 3 opened' }).getAttribute('href')).toBe(
      '/sites/1/findings/3',
    );
  });

  it('names the source, the person and the condition in the words of ISO 15243', async () => {
    openHistory(aHistory());
    await screen.findByText('Recorded by Oskar Owner');
    screen.getByText('Fretting corrosion');
    screen.getByText(/ISO 15243, 5\.3\.3\.2.*the ring moves on the seat/);
  });

  it('shows taper and out-of-roundness by plane', async () => {
    openHistory(aHistory());
    const table = within(await screen.findByRole('table', { name: 'Shaft diameter, by plane' }));
    const [, first, second, taper] = table.getAllByRole('row').map((row) => row.textContent);
    expect(first).toMatch(/Plane 1.*59\.9910 mm.*6\.0 µm.*4/);
    expect(second).toMatch(/Plane 2.*59\.9880 mm.*not known.*1/);
    expect(taper).toMatch(/\+3\.0 µm.*± 4\.2 µm/);
  });

  it('keeps a corrected record in sight and says so', async () => {
    openHistory(aHistory());
    await screen.findByText('corrected by a later record of that day');
    screen.getByText('2.36245');
  });

  it.each([
    [aStep(), /\+20\.5 ± 5\.8 µm.*\+5\.1 ± 1\.4 µm\/a.*lost to wear/],
    [aStep({ lossUm: 3, isSignificant: false }), /Within the uncertainty/],
    [aStep({ lossUm: -20.5 }), /−20\.5 ± 5\.8 µm.*Tighter than before/],
    [aStep({ lossUm: -20.5, isWork: true, perYearUm: null }), /Work on the seat, not wear/],
  ])('tells wear from work and from uncertainty (%#)', async (step, words) => {
    openHistory(aHistory({ wear: [step] }));
    const table = within(await screen.findByRole('table', { name: 'Wear between measurements' }));
    expect(table.getAllByRole('row')[1]?.textContent).toMatch(words);
  });

  it('says what to get first where nothing is recorded', async () => {
    openHistory(aHistory({ entries: [], wear: [] }));
    await screen.findByText('Nothing is on record');
    screen.getByText(/Wear needs two measurements/);
    screen.getByText('7.75 and 23.25');
  });
});

import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import '../../charts/browser-stubs.ts';
import type { BearingPositionResponse } from '#shared/contracts/bearing-position.ts';
import { aSession } from '#tests/support/client-fixtures.ts';
import { aFitRecord, aMachine, aPosition } from '#tests/support/register-fixtures.ts';
import { renderPage } from '#tests/support/render-page.tsx';

const records = '/api/sites/1/positions/11/fit-records';
const noSeats = {
  seats: [],
  internalClearanceUm: null,
  mounting: null,
  neighbours: [],
  conclusion: 'Nothing is recorded.',
  cautions: [],
};

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

/** The words under an input: its hint and what is wrong with it. */
const descriptionOf = (input: HTMLElement) =>
  (input.getAttribute('aria-describedby') ?? '')
    .split(' ')
    .map((id) => document.getElementById(id)?.textContent)
    .join(' ');

function openMachine(position: BearingPositionResponse = aPosition(), others = [position]) {
  const seatAnswers = others.map(({ id }) => [`GET /api/sites/1/positions/${id}/seats`, noSeats]);
  return renderPage('/sites/1/machines/2', {
    'GET /api/session': aSession('lead'),
    'GET /api/sites/1/machines/2': aMachine(others),
    ...(Object.fromEntries(seatAnswers) as Record<string, object>),
    [`POST ${records}`]: position,
    'PATCH /api/sites/1/positions/11': position,
  });
}

async function openRecordForm(position?: BearingPositionResponse) {
  const page = openMachine(position);
  const user = userEvent.setup();
  await user.click(await screen.findByRole('button', { name: 'Fit record' }));
  const dialog = within(await screen.findByRole('dialog'));
  await user.type(dialog.getByLabelText('Date'), '2026-05-04');
  const send = () => user.click(dialog.getByRole('button', { name: 'Add fit record' }));
  return { ...page, user, dialog, send };
}

describe('the fit record form', () => {
  it('takes diameters in inches and sends millimetres with the unit', async () => {
    const { sent, user, dialog, send } = await openRecordForm();
    await user.selectOptions(dialog.getByLabelText('Unit'), 'Inches');
    await user.type(dialog.getByLabelText(/^Shaft/), '2,36245');
    await send();
    await screen.findByRole('button', { name: 'Fit record' });
    // 2.36245 in × 25.4 = 60.00623 mm.
    expect(sent).toEqual([
      {
        call: `POST ${records}`,
        body: expect.objectContaining({ seatMeasuredMm: 60.00623, diameterUnit: 'in' }) as object,
      },
    ]);
  });

  it.each([
    ['Millimetres', '2.3624', /2.3624 looks like inches/],
    ['Inches', '60.012', /60.012 looks like millimetres taken for inches/],
    ['Millimetres', '60012', /off by a factor of 1000/],
  ])('questions a diameter in %s of %s at its field', async (unit, typed, words) => {
    const { sent, user, dialog, send } = await openRecordForm();
    await user.selectOptions(dialog.getByLabelText('Unit'), unit);
    const field = dialog.getByLabelText(/^Shaft/);
    await user.type(field, typed);
    await send();
    await dialog.findByRole('alert');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(descriptionOf(field)).toMatch(words);
    expect(sent).toEqual([]);
  });

  it('asks for drive-up instead of diameters on a tapered shaft seat', async () => {
    const sleeve = aPosition({ designation: '22312', shaftSeatForm: 'adapter sleeve' });
    const { sent, user, dialog, send } = await openRecordForm(sleeve);
    expect(dialog.queryByLabelText('Unit')).toBeNull();
    await user.type(dialog.getByLabelText(/^Drive-up/), '-0.5');
    await send();
    await dialog.findByRole('alert');
    expect(descriptionOf(dialog.getByLabelText(/^Drive-up/))).toMatch(/drive-up can’t be negative/);
    await user.clear(dialog.getByLabelText(/^Drive-up/));
    await user.type(dialog.getByLabelText(/^Drive-up/), '0.48');
    await user.type(dialog.getByLabelText(/^Loss of internal clearance/), '30');
    await send();
    await screen.findByRole('button', { name: 'Fit record' });
    expect(sent[0]?.body).toMatchObject({
      driveUpMm: 0.48,
      clearanceReductionUm: 30,
      seatMeasuredMm: null,
    });
  });

  it('sends a second record of a seat and date as a correction only when it is told so', async () => {
    const recorded = aPosition({ fitRecords: [aFitRecord({ recordedOn: '2026-05-04' })] });
    const { sent, user, dialog, send } = await openRecordForm(recorded);
    await user.click(dialog.getByLabelText(/corrects the record of this seat and date/));
    await user.type(dialog.getByLabelText(/^Tolerance class/), 'm5');
    await send();
    await screen.findByRole('button', { name: 'Fit record' });
    expect(sent[0]?.body).toMatchObject({ toleranceClass: 'm5', correctsSameDay: true });
  });

  it('shows what was typed, with the millimetres beside it', async () => {
    openMachine(
      aPosition({ fitRecords: [aFitRecord({ seatMeasuredMm: 60.00623, diameterUnit: 'in' })] }),
    );
    const table = within(await screen.findByRole('table', { name: 'Fit records of P-DE' }));
    table.getByText('2.36245');
    table.getByText('60.006');
  });
});

describe('the bearing position form', () => {
  it('asks a plain bearing for nothing that belongs to seats', async () => {
    openMachine();
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Edit' }));
    const dialog = within(await screen.findByRole('dialog'));
    dialog.getByLabelText(/^Designation/);
    await user.selectOptions(dialog.getByLabelText('Bearing'), 'Plain bearing');
    expect(dialog.queryByLabelText(/^Designation/)).toBeNull();
    dialog.getByText(/has no seats/);
  });

  it('keeps sleeve, taper, hollow shaft and housing wall', async () => {
    const { sent } = openMachine();
    const user = userEvent.setup();
    await user.click(await screen.findByRole('button', { name: 'Edit' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.selectOptions(dialog.getByLabelText('Shaft seat'), 'Withdrawal sleeve');
    await user.selectOptions(dialog.getByLabelText(/^Taper/), '1:30');
    await user.type(dialog.getByLabelText(/^Bore of a hollow shaft/), '20');
    await user.type(dialog.getByLabelText(/^Housing wall/), '12');
    await user.click(dialog.getByRole('button', { name: 'Save bearing position' }));
    await screen.findByRole('button', { name: 'Edit' });
    expect(sent[0]?.body).toMatchObject({
      shaftSeatForm: 'withdrawal sleeve',
      seatTaper: '1:30',
      shaftBoreMm: 20,
      housingWallMm: 12,
    });
  });

  it('tells the speeds of the machine’s shafts beside the ratio', async () => {
    const slow = aPosition({ id: 12, code: 'G-LS', name: 'Gearbox, slow', shaftRatio: 0.25 });
    openMachine(aPosition(), [aPosition(), slow]);
    // 1480 r/min × 0.25.
    await screen.findByText('370');
    const user = userEvent.setup();
    const [edit] = await screen.findAllByRole('button', { name: 'Edit' });
    if (edit === undefined) throw new Error('No position can be edited.');
    await user.click(edit);
    const ratio = within(await screen.findByRole('dialog')).getByLabelText('Shaft speed ratio');
    expect(descriptionOf(ratio)).toMatch(/1 \(1480 r\/min\), 0.25 \(370 r\/min\)/);
  });
});

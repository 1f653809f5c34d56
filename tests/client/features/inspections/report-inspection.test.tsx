import { cleanup, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import '../../charts/browser-stubs.ts';
import { aSession, anInspection } from '#tests/support/client-fixtures.ts';
import { refusal, renderPage } from '#tests/support/render-page.tsx';

const path = '/api/sites/1/inspections/5';
const answers = {
  'GET /api/session': aSession('owner'),
  [`GET ${path}`]: anInspection(),
};

beforeEach(() => localStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

async function openReport(more: Parameters<typeof renderPage>[1] = {}) {
  const page = renderPage('/sites/1/inspections/5', { ...answers, ...more });
  const user = userEvent.setup();
  await user.click(await screen.findByLabelText(/I have read the cautions/));
  return { ...page, user };
}

describe('reporting an inspection', () => {
  it('keeps the report shut until the cautions are ticked', async () => {
    renderPage('/sites/1/inspections/5', answers);
    await screen.findByText(/lock it out and prove it dead/);
    expect(screen.queryByRole('form', { name: 'Inspection report' })).toBeNull();
    await userEvent.click(screen.getByLabelText(/I have read the cautions/));
    screen.getByRole('form', { name: 'Inspection report' });
  });

  it('says at once what a reading means', async () => {
    const { user } = await openReport();
    await user.type(screen.getByLabelText('Shaft diameter, plane 1, 0°'), '59.982');
    await screen.findByText(/20\.0 µm below k5/);
  });

  it('asks about a reading in inches where millimetres are wanted', async () => {
    const { user } = await openReport();
    const cell = screen.getByLabelText('Shaft diameter, plane 2, 45°');
    await user.type(cell, '2.361');
    await screen.findByText(/Plane 2, 45°: 2\.361 looks like inches/);
    expect(cell.getAttribute('aria-invalid')).toBe('true');
  });

  it('names what is missing and sends nothing', async () => {
    const { user, sent } = await openReport();
    await user.click(screen.getByRole('button', { name: 'Report' }));
    const summary = await screen.findByRole('alert');
    expect(summary.textContent).toMatch(/Choose the condition of the shaft seat as found/);
    expect(summary.textContent).toMatch(/Choose a result/);
    expect(sent).toEqual([]);
  });

  it('sends what was measured with the version it was read in', async () => {
    const reported = anInspection({
      state: 'reported',
      can: { ...anInspection().can, report: false },
    });
    const { user, sent } = await openReport({ [`POST ${path}/report`]: reported });
    await user.selectOptions(screen.getByLabelText('Condition'), 'creep marks');
    await user.type(screen.getByLabelText('Shaft diameter, plane 1, 0°'), '59,982');
    await user.type(screen.getByLabelText('Work done'), 'Sleeve fitted.');
    await user.click(screen.getByLabelText(/The fit was put right/));
    await user.click(screen.getByLabelText(/^Loose/));
    await user.click(screen.getByRole('button', { name: 'Report' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]).toEqual({
      call: `POST ${path}/report`,
      body: {
        version: 2,
        report: {
          cautionsRead: true,
          outcome: 'loose',
          seats: [
            {
              seat: 'shaft',
              stage: 'as found',
              condition: 'creep marks',
              readings: [{ part: 'seat', plane: 1, directionDeg: 0, diameterMm: 59.982 }],
            },
          ],
          inPlaceResult: null,
          inPlaceChecks: [],
          causeInPlace: false,
          workDone: 'Sleeve fitted.',
          repaired: true,
        },
      },
    });
  });

  it('tells what was checked in place, what it means, and leaves the seats closed', async () => {
    const { user, sent } = await openReport({
      [`GET ${path}`]: anInspection({ checkInPlace: true }),
      [`POST ${path}/report`]: anInspection({ state: 'reported' }),
    });
    await user.selectOptions(
      screen.getByRole('combobox', { name: /^Movement across the joint/ }),
      'fault',
    );
    await user.type(screen.getByRole('textbox', { name: /^Below the joint/ }), '0,8');
    await user.type(screen.getByRole('textbox', { name: /^Above the joint/ }), '2.9');
    await screen.findByText(/moves 3\.6 times as much as below: the joint works/);
    await user.selectOptions(screen.getByRole('combobox', { name: /^Bolt torque/ }), 'fault');
    await user.type(screen.getByRole('textbox', { name: /^Lowest torque/ }), 'loose');
    await user.click(screen.getByLabelText('The cause was found here'));
    expect(screen.queryByLabelText('Condition')).toBeNull();
    await user.type(screen.getByLabelText('Work done'), 'Bolts tightened.');
    await user.click(screen.getByLabelText(/^Loose/));
    await user.click(screen.getByRole('button', { name: 'Report' }));
    expect((await screen.findByRole('alert')).textContent).toMatch(/reading of the bolt torque/);
    expect(sent).toEqual([]);
    await user.clear(screen.getByRole('textbox', { name: /^Lowest torque/ }));
    await user.type(screen.getByRole('textbox', { name: /^Lowest torque/ }), '45');
    await user.click(screen.getByRole('button', { name: 'Report' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toMatchObject({
      report: {
        seats: [],
        causeInPlace: true,
        inPlaceChecks: [
          { check: 'bolt torque', finding: 'fault', reading: 45, readingAbove: null },
          { check: 'movement across the joint', reading: 0.8, readingAbove: 2.9 },
        ],
      },
    });
  });

  it('loses nothing typed when the page is left and opened again', async () => {
    const { user } = await openReport();
    await user.type(screen.getByLabelText('Work done'), 'Half a sentence');
    cleanup();
    renderPage('/sites/1/inspections/5', answers);
    const field = await screen.findByLabelText<HTMLTextAreaElement>('Work done');
    expect(field.value).toBe('Half a sentence');
  });

  it('keeps what was typed where the server refuses', async () => {
    const message = 'This inspection was changed meanwhile.';
    const { user } = await openReport({
      [`POST ${path}/report`]: () => refusal(409, 'conflict', message),
    });
    await user.selectOptions(screen.getByLabelText('Condition'), 'sound');
    await user.type(screen.getByLabelText('Work done'), 'Nothing.');
    await user.click(screen.getByLabelText(/^Not loose/));
    await user.click(screen.getByRole('button', { name: 'Report' }));
    await screen.findByText(message);
    expect(screen.getByLabelText<HTMLTextAreaElement>('Work done').value).toBe('Nothing.');
  });
});

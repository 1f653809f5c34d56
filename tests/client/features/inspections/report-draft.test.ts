import { describe, expect, it } from 'vitest';
import { inspectionReport } from '#shared/contracts/inspection.ts';
import {
  emptyDraft,
  placeKey,
  reportOf,
  type ReportDraft,
} from '#src/features/inspections/components/report-draft.ts';
import { reportFaults } from '#src/features/inspections/components/report-faults.ts';

const aDraft = (overrides: Partial<ReportDraft> = {}): ReportDraft => ({
  ...emptyDraft,
  cautionsRead: true,
  outcome: 'loose',
  workDone: 'Measured.',
  seats: {
    'shaft/as found': {
      condition: 'creep marks',
      readings: { [placeKey('seat', 1, 0)]: '59,982', [placeKey('seat', 2, 90)]: ' ' },
    },
    'shaft/as left': { condition: 'sound', readings: { [placeKey('seat', 1, 0)]: '60.008' } },
  },
  ...overrides,
});

describe('a report from what was typed', () => {
  it('reads a decimal comma and leaves empty cells out', () => {
    const report = inspectionReport.parse(reportOf(aDraft(), ['shaft']));
    expect(report.seats).toEqual([
      {
        seat: 'shaft',
        stage: 'as found',
        condition: 'creep marks',
        readings: [{ part: 'seat', plane: 1, directionDeg: 0, diameterMm: 59.982 }],
      },
    ]);
  });

  it('tells the seat as left only where the fit was put right', () => {
    const report = inspectionReport.parse(reportOf(aDraft({ repaired: true }), ['shaft']));
    expect(report.seats.map(({ stage }) => stage)).toEqual(['as found', 'as left']);
  });

  it('turns inches into millimetres to a tenth of a micrometre', () => {
    const seats = {
      'shaft/as found': {
        condition: 'sound' as const,
        readings: { [placeKey('seat', 1, 0)]: '2.3624' },
      },
    };
    const report = inspectionReport.parse(reportOf(aDraft({ unit: 'in', seats }), ['shaft']));
    // 2.3624 in × 25.4 mm/in = 60.00496 mm.
    expect(report.seats[0]?.readings[0]?.diameterMm).toBe(60.005);
  });

  it('names what is missing, each with its input, in the order of the form', () => {
    const report = reportOf({ ...emptyDraft, cautionsRead: true }, ['shaft']);
    expect(reportFaults(report)).toEqual([
      {
        inputId: 'condition-shaft-as-found',
        message: 'Choose the condition of the shaft seat as found.',
      },
      { inputId: 'workDone', message: 'Say what was done, or that nothing was.' },
      { inputId: 'outcome', message: 'Choose a result.' },
    ]);
  });
});

import { describe, expect, it } from 'vitest';
import type { CaseOutcome } from '#server/cli/evaluate/case-outcome.ts';
import {
  calibration,
  calibrationError,
  falseAlarms,
  percentile,
  predictiveValue,
  recall,
  recallBySigns,
  retakes,
} from '#server/cli/evaluate/measures.ts';

function outcome(changes: Partial<CaseOutcome>): CaseOutcome {
  return {
    machineId: 'machine-1',
    looseness: null,
    severity: null,
    lookAlike: 'sound',
    physicsLeavesSign: null,
    risenOrders: null,
    visibleOrders: 5,
    fault: null,
    expectsRetake: false,
    verdict: 'none',
    score: 0.1,
    speedSource: 'refined',
    speedError: 0,
    toldError: 0,
    features: null,
    screeningMs: 1,
    ...changes,
  };
}
const loose = (changes: Partial<CaseOutcome>) =>
  outcome({ looseness: 'foot', severity: 'severe', physicsLeavesSign: true, ...changes });

describe('the measures of an evaluation', () => {
  it('count a loose record that is sent back as missed', () => {
    const [all] = recall([
      loose({ verdict: 'likely' }),
      loose({ verdict: 'suspected' }),
      loose({ verdict: 'retake', score: null }),
      loose({ verdict: 'none' }),
    ]);
    expect(all).toMatchObject({ cases: 4, hits: 2 });
  });

  it('leave out loose machines that leave no sign', () => {
    const [all] = recall([loose({ verdict: 'likely' }), loose({ physicsLeavesSign: false })]);
    expect(all).toMatchObject({ cases: 1, hits: 1 });
  });

  it('tell recall by how many orders the looseness raised', () => {
    const ranges = recallBySigns([
      loose({ verdict: 'likely', risenOrders: 9 }),
      loose({ verdict: 'none', risenOrders: 2 }),
      loose({ verdict: 'suspected', risenOrders: 2 }),
    ]);
    expect(ranges.map(({ cases, hits }) => [cases, hits])).toEqual([
      [2, 1],
      [0, 0],
      [0, 0],
      [1, 1],
    ]);
  });

  it('count false alarms on sound records of tight machines only', () => {
    const [all, ...each] = falseAlarms([
      outcome({ verdict: 'likely', lookAlike: 'rub' }),
      outcome({}),
      outcome({ verdict: 'likely', fault: 'gaps' }),
      loose({ verdict: 'likely' }),
    ]);
    expect(all).toMatchObject({ cases: 2, hits: 1 });
    expect(each).toContainEqual({ name: 'rub', cases: 1, hits: 1 });
  });

  it('tell retakes that were due from those that were not', () => {
    const asked = retakes([
      outcome({ verdict: 'retake', fault: 'gaps', expectsRetake: true }),
      outcome({ fault: 'gaps', expectsRetake: true }),
      outcome({ verdict: 'retake' }),
    ]);
    expect(asked.defective).toMatchObject({ cases: 2, hits: 1 });
    expect(asked.sound).toMatchObject({ cases: 1, hits: 1 });
  });

  it('find scores that mean what they say well calibrated, and others not', () => {
    const right = [
      ...Array(8).fill(loose({ score: 0.8 })),
      ...Array(2).fill(outcome({ score: 0.8 })),
    ];
    const wrong = [
      ...Array(2).fill(loose({ score: 0.8 })),
      ...Array(8).fill(outcome({ score: 0.8 })),
    ];
    expect(calibrationError(calibration(right as CaseOutcome[]))).toBeCloseTo(0, 9);
    expect(calibrationError(calibration(wrong as CaseOutcome[]))).toBeCloseTo(0.6, 9);
  });

  // The design's worked figures: recall 0.95 at 5 % and 1 %, 0.9 at 0.5 %, one in a hundred loose.
  it.each([
    [0.95, 0.05, 0.16],
    [0.95, 0.01, 0.49],
    [0.9, 0.005, 0.65],
  ])('give a predictive value for recall %s and false alarms %s', (found, alarms, expected) => {
    expect(predictiveValue(found, alarms, 0.01)).toBeCloseTo(expected, 2);
  });

  it('take percentiles of the size of errors', () => {
    expect(percentile([-3, 1, 2, -4], 0.5)).toBe(2);
    expect(percentile([], 0.5)).toBeNull();
  });
});

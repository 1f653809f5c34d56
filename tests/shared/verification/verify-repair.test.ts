import { describe, expect, it } from 'vitest';
import {
  verificationReading,
  type VerificationReading,
} from '#shared/verification/verification-reading.ts';
import { verifyRepair } from '#shared/verification/verify-repair.ts';
import { anOrderLine, aScreeningResult } from '#tests/support/screening-result.ts';

const before = (overrides: Partial<VerificationReading> = {}): VerificationReading => ({
  pointLabel: 'P-101/DE/V',
  surveyedOn: '2026-09-28',
  verdict: 'likely',
  score: 0.93,
  runLength: 8,
  runMmPerSRms: 1.9,
  overallMmPerSRms: 5.2,
  overallBandHz: [10, 1000],
  speedRpm: 1476,
  quantity: 'acceleration',
  methodVersion: '3',
  suspectedScore: 0.5,
  ...overrides,
});
const after = (overrides: Partial<VerificationReading> = {}): VerificationReading =>
  before({
    surveyedOn: '2026-10-26',
    verdict: 'none',
    score: 0.06,
    runLength: 2,
    runMmPerSRms: 0.21,
    overallMmPerSRms: 1.4,
    speedRpm: 1480,
    ...overrides,
  });
const verify = (old: VerificationReading[], now: VerificationReading[]) =>
  verifyRepair(old, now, '2026-10-26');

describe('the reading of a screening', () => {
  it('takes the level of orders 2 to 10 as the root of their summed squares', () => {
    const orders = [1, 1.5, 2, 3, 11].map((order) =>
      anOrderLine(order, { velocityMmPerSRms: order === 2 ? 3 : 4 }),
    );
    const reading = verificationReading(aScreeningResult({ orders }), {
      pointLabel: 'P-101/DE/V',
      surveyedOn: '2026-09-28',
    });
    // Orders 2 and 3 alone: √(3² + 4²).
    expect(reading.runMmPerSRms).toBeCloseTo(5, 12);
    expect(reading).toMatchObject({ runLength: 6, overallMmPerSRms: 4.6, suspectedScore: 0.4 });
    expect(reading.speedRpm).toBeCloseTo(1476, 9);
  });
});

describe('the survey after a repair', () => {
  it('proposes to verify where the signs are gone, with the numbers and without claiming proof', () => {
    const told = verify([before()], [after()]);
    expect(told.proposal).toBe('verified');
    expect(told.sentence).toBe(
      'Survey of 2026-10-26: no looseness signs any more at the point that raised the finding (score 0.93 before and 0.06 after at P-101/DE/V; orders 2 to 10 from 1.9 mm/s rms to 0.21 mm/s rms at P-101/DE/V). This compares records; it is no proof of a tight fit.',
    );
    expect(told.points[0]?.sentence).toBe(
      'The signs are gone: score 0.93 before, 0.06 after; run of 8 orders before, 2 orders after; orders 2 to 10 1.9 mm/s rms before, 0.21 mm/s rms after; overall velocity 5.2 mm/s rms before, 1.4 mm/s rms after.',
    );
    expect(told.conditions).toEqual([]);
  });

  it('proposes to reopen where the signs are there still', () => {
    const told = verify([before()], [after({ verdict: 'suspected', score: 0.61 })]);
    expect(told.proposal).toBe('reopen');
    expect(told.sentence).toContain('looseness signs at P-101/DE/V after the repair');
    expect(told.sentence).toContain('score 0.93 before and 0.61 after');
  });

  it('proposes to reopen where a point shows them that did not raise the finding', () => {
    const told = verify(
      [before()],
      [after(), after({ pointLabel: 'P-101/DE/H', verdict: 'likely', score: 0.88 })],
    );
    expect(told.proposal).toBe('reopen');
    expect(told.sentence).toContain('looseness signs at P-101/DE/H');
  });

  it('asks for another measurement where a point that raised the finding was left out', () => {
    const told = verify([before(), before({ pointLabel: 'P-101/DE/H' })], [after()]);
    expect(told.proposal).toBe('measure again');
    expect(told.sentence).toContain('P-101/DE/H was not measured');
    expect(told.points.map(({ sentence }) => sentence)).toContain('Not measured in this survey.');
  });

  it('asks for another measurement where the record could not be judged', () => {
    const told = verify([before()], [after({ verdict: 'retake', score: null })]);
    expect(told.proposal).toBe('measure again');
    expect(told.sentence).toContain('the record at P-101/DE/V could not be judged');
  });

  it('asks for another measurement where the machine ran at another speed, and names both', () => {
    const told = verify([before()], [after({ speedRpm: 990 })]);
    expect(told.proposal).toBe('measure again');
    expect(told.conditions).toEqual([
      'At P-101/DE/V the shaft ran at 990 r/min instead of 1476 r/min.',
    ]);
    expect(told.sentence).toContain('990 r/min instead of 1476 r/min');
  });

  it('takes a speed within a tenth for the same', () => {
    expect(verify([before()], [after({ speedRpm: 1400 })]).proposal).toBe('verified');
  });

  it('is not satisfied where the verdict is none but the run has hardly fallen', () => {
    // A fall by less than the factor of 1.5 is within what a route repeats to.
    expect(verify([before()], [after({ runMmPerSRms: 1.3 })]).proposal).toBe('measure again');
    expect(verify([before()], [after({ runMmPerSRms: 1.26 })]).proposal).toBe('verified');
  });

  it('is not satisfied by a limit that was raised since', () => {
    const told = verify([before()], [after({ score: 0.55, suspectedScore: 0.7 })]);
    expect(told.proposal).toBe('measure again');
    expect(told.conditions).toEqual([
      'At P-101/DE/V the limit of suspicion is 0.7 instead of 0.5.',
    ]);
  });

  it('names what was measured otherwise but leaves the comparison standing', () => {
    const told = verify(
      [before()],
      [after({ quantity: 'velocity', overallBandHz: [10, 400], methodVersion: '4' })],
    );
    expect(told.proposal).toBe('verified');
    expect(told.conditions).toEqual([
      'At P-101/DE/V velocity was recorded instead of acceleration.',
      'At P-101/DE/V the overall velocity covers 10–400 Hz instead of 10–1000 Hz.',
      'At P-101/DE/V the method is version 4 instead of 3, so the scores are not on one scale.',
    ]);
  });

  it('says the same whatever the order of the readings', () => {
    const old = [before(), before({ pointLabel: 'P-101/DE/H', score: 0.7 })];
    const now = [after(), after({ pointLabel: 'P-101/DE/H', score: 0.1 })];
    expect(verify([...old].reverse(), [...now].reverse())).toEqual(verify(old, now));
    expect(verify(old, now).sentence).toContain('at both points');
  });

  it('refuses to compare with nothing', () => {
    expect(() => verify([], [after()])).toThrow(RangeError);
    expect(() => verify([before()], [])).toThrow(RangeError);
  });
});

import { describe, expect, it } from 'vitest';
import { measuredDeviationUm } from '#shared/fits/measured-diameter.ts';

describe('a measured diameter', () => {
  it('is given as deviation from the nominal size, free of the bits of a double', () => {
    expect(measuredDeviationUm(60.015, 60, 'shaftMeasuredMm')).toBe(15);
    expect(measuredDeviationUm(59.9985, 60, 'shaftMeasuredMm')).toBe(-1.5);
  });

  it.each([
    [2.3622, 'measured_in_inches'],
    [1524, 'measured_in_millimetres'],
    [60_010, 'factor_1000'],
    [0.06, 'factor_1000'],
    [61, 'far_from_nominal'],
    [59, 'far_from_nominal'],
    [Number.NaN, 'not_finite'],
  ])('%d mm on a nominal 60 mm is questioned as %s', (value, code) => {
    expect(() => measuredDeviationUm(value, 60, 'shaftMeasuredMm')).toThrow(
      expect.objectContaining({ code, field: 'shaftMeasuredMm' }),
    );
  });

  it('lets a badly worn seat pass', () => {
    expect(measuredDeviationUm(59.6, 60, 'shaftMeasuredMm')).toBe(-400);
  });
});

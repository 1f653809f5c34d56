import { describe, expect, it } from 'vitest';
import { measuredWear, type MeasuredSeat } from '#shared/fits/measured-wear.ts';

const at = (day: string, diameterMm: number, standardUncertaintyUm = 2): MeasuredSeat => ({
  atMs: Date.parse(day),
  diameterMm,
  standardUncertaintyUm,
});

describe('wear between two measurements', () => {
  it('is what a shaft has lost and a housing bore has gained', () => {
    const [first, second] = [at('2022-01-01', 60.01), at('2024-01-01', 60)];
    expect(measuredWear('shaft', first, second).lossUm).toBe(10);
    expect(measuredWear('housing', first, second).lossUm).toBe(-10);
  });

  it('is given a year, with its uncertainty', () => {
    const wear = measuredWear('shaft', at('2022-01-01', 60.01), at('2024-01-01', 60));
    // By hand: 730 days are 1.9986 years; U = 2·√(2² + 2²) = 5.657 µm.
    expect(wear.perYearUm).toBeCloseTo(5.003, 3);
    expect(wear.expandedUncertaintyUm).toBeCloseTo(5.657, 3);
    expect(wear.perYearUncertaintyUm).toBeCloseTo(2.83, 2);
    expect(wear.isSignificant).toBe(true);
  });

  it('is not told from the uncertainty where it is smaller', () => {
    const wear = measuredWear('shaft', at('2022-01-01', 60.004), at('2024-01-01', 60));
    expect(wear.isSignificant).toBe(false);
  });

  it('gets no rate a year from a few days', () => {
    const wear = measuredWear('shaft', at('2024-01-01', 60.01), at('2024-01-15', 60));
    expect(wear.lossUm).toBe(10);
    expect(wear.perYearUm).toBeUndefined();
  });

  it('refuses a later measurement given first', () => {
    expect(() => measuredWear('shaft', at('2024-01-01', 60), at('2022-01-01', 60))).toThrow(
      RangeError,
    );
  });
});

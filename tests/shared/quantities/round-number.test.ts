import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decadeOf, roundToDecimals, roundToSignificant } from '#shared/quantities/round-number.ts';

describe('roundToDecimals', () => {
  it.each([
    [1.005, 2, 1.01],
    [-1.005, 2, -1.01],
    [2.5, 0, 3],
    [-2.5, 0, -3],
    [8.345, 2, 8.35],
    [1e-7, 3, 0],
    [-1e-7, 3, 0],
    [1e21, 2, 1e21],
    [5e-21, 20, 1e-20],
    [123456.789, 1, 123456.8],
  ])('rounds %d to %d decimals as on paper: %d', (value, decimals, expected) => {
    expect(roundToDecimals(value, decimals)).toBe(expected);
  });

  it('leaves alone what has no more decimals than asked for', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -1e9, max: 1e9 }),
        fc.integer({ min: 0, max: 6 }),
        (whole, decimals) => {
          const value = Number(`${whole}e-${decimals}`) + 0;
          expect(roundToDecimals(value, decimals)).toBe(value);
        },
      ),
      { seed: 6 },
    );
  });

  it('never moves a number by more than half a place', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        (value, decimals) => {
          const moved = Math.abs(roundToDecimals(value, decimals) - value);
          expect(moved).toBeLessThanOrEqual(0.5 * 10 ** -decimals + 1e-9);
        },
      ),
      { seed: 7 },
    );
  });

  it('leaves what is not finite as it is and refuses impossible decimals', () => {
    expect(roundToDecimals(NaN, 2)).toBeNaN();
    expect(roundToDecimals(-Infinity, 2)).toBe(-Infinity);
    for (const decimals of [-1, 0.5, 21, NaN]) {
      expect(() => roundToDecimals(1, decimals)).toThrow(RangeError);
    }
  });
});

describe('roundToSignificant', () => {
  it.each([
    [0.012345, 3, 0.0123],
    [99.95, 3, 100],
    [-0.0009995, 3, -0.001],
    [12345, 2, 12000],
    [0, 3, 0],
    [1e300, 2, 1e300],
  ])('rounds %d to %d digits: %d', (value, digits, expected) => {
    expect(roundToSignificant(value, digits)).toBe(expected);
  });
});

describe('decadeOf', () => {
  it('is right just beside the powers of ten, where a logarithm is not', () => {
    expect(decadeOf(1000)).toBe(3);
    expect(decadeOf(999.9999999999999)).toBe(2);
    expect(decadeOf(-0.001)).toBe(-3);
    expect(decadeOf(5e-324)).toBe(-324);
  });
});

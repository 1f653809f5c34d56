import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  effectiveInterference,
  heatingLossUm,
  mountedClearance,
  unmountedClearance,
} from '#shared/fits/internal-clearance.ts';

describe('unmounted clearance, ISO 5753-1', () => {
  // Published tables of ball bearings (a bearing maker's page) and of cylindrical roller bearings.
  it.each([
    ['ball', 10, 'CN', 2, 13],
    ['ball', 15, 'C2', 0, 9],
    ['ball', 24, 'C4', 20, 36],
    ['ball', 30, 'C3', 13, 28],
    ['ball', 60, 'CN', 8, 28],
    ['ball', 60, 'C5', 55, 90],
    ['ball', 80, 'C3', 25, 51],
    ['ball', 100, 'C5', 75, 120],
    ['roller', 20, 'CN', 20, 45],
    ['roller', 60, 'C3', 60, 90],
    ['roller', 120, 'C2', 15, 55],
    ['roller', 200, 'C4', 195, 250],
    ['roller', 300, 'C3', 200, 275],
    ['roller', 450, 'CN', 210, 310],
  ] as const)('%s %d mm %s: %d to %d µm', (type, d, group, min, max) => {
    expect(unmountedClearance(type, d, group)).toEqual({ min, mean: (min + max) / 2, max });
  });

  it('has no value outside the table', () => {
    expect(unmountedClearance('ball', 260, 'CN')).toBeUndefined();
    expect(unmountedClearance('spherical roller', 15, 'CN')).toBeUndefined();
  });

  it('grows from C2 to C5 for every bore', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('ball', 'roller', 'spherical roller' as const),
        fc.double({ min: 19, max: 200, noNaN: true }),
        (type, d) => {
          const means = (['C2', 'CN', 'C3', 'C4', 'C5'] as const).map(
            (g) => unmountedClearance(type, d, g)?.mean ?? 0,
          );
          expect(means).toEqual([...means].sort((a, b) => a - b));
        },
      ),
    );
  });
});

describe('clearance left', () => {
  it('pairs the least clearance with the greatest interference', () => {
    // By hand: 23 − 0.75·28 = 2; 33 − 0.75·14 = 22.5; 43 − 0.75·0 = 43.
    const effective = effectiveInterference({ min: 2, mean: 16, max: 30 }, 2);
    expect(mountedClearance({ min: 23, mean: 33, max: 43 }, [{ factor: 0.75, effective }])).toEqual(
      {
        min: 2,
        mean: 22.5,
        max: 43,
      },
    );
  });

  it('does not count clearance as negative interference', () => {
    expect(effectiveInterference({ min: -58, mean: -29, max: 1 }, 2)).toEqual({
      min: 0,
      mean: 0,
      max: 0,
    });
  });

  it('loses α·ΔT·Do to a warmer inner ring (by hand: 12.5e-6 · 10 K · 116 mm = 14.5 µm)', () => {
    expect(heatingLossUm(12.5e-6, 10, 116)).toBeCloseTo(14.5, 9);
  });
});

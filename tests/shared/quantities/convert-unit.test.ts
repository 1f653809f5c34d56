import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertUnit, unitsLike } from '#shared/quantities/convert-unit.ts';
import { quantityOfUnit, units } from '#shared/quantities/quantity.ts';

describe('convertUnit', () => {
  // Exact by definition: standard gravity (ISO 80000-3) and the inch (1959 agreement).
  it.each([
    [1, 'g', 'm/s²', 9.80665],
    [9.80665, 'm/s²', 'g', 1],
    [1, 'in/s', 'mm/s', 25.4],
    [7.62, 'mm/s', 'in/s', 0.3],
    [1, 'mil', 'µm', 25.4],
    [50.8, 'µm', 'mil', 2],
  ] as const)('makes of %d %s in %s %d', (value, from, to, expected) => {
    expect(convertUnit(value, from, to)).toBeCloseTo(expected, 14);
  });

  it('comes back to the value it started from', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...units),
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        (unit, value) => {
          for (const other of unitsLike(unit)) {
            const back = convertUnit(convertUnit(value, unit, other), other, unit);
            expect(Math.abs(back - value)).toBeLessThanOrEqual(Math.abs(value) * 2 ** -50 + 1e-320);
          }
        },
      ),
      { seed: 5 },
    );
  });

  it('leaves a gap a gap', () => {
    expect(convertUnit(NaN, 'g', 'm/s²')).toBeNaN();
  });

  it('refuses to make one quantity of another', () => {
    expect(() => convertUnit(1, 'g', 'mm/s')).toThrow(RangeError);
  });
});

describe('unitsLike', () => {
  it('names the two units of each quantity, the metric one first', () => {
    expect(unitsLike('g')).toEqual(['m/s²', 'g']);
    expect(unitsLike('mil')).toEqual(['µm', 'mil']);
    for (const unit of units) {
      expect(unitsLike(unit).every((like) => quantityOfUnit[like] === quantityOfUnit[unit])).toBe(
        true,
      );
    }
  });
});

import { describe, expect, it } from 'vitest';
import { formatFixed, formatSignificant, withUnit } from '#shared/quantities/format-number.ts';

/** Makes the narrow no-break space and the true minus visible, and plain to write in a test. */
const plain = (text: string) => text.replaceAll('\u202f', '_').replaceAll('\u2212', '-');

describe('formatFixed', () => {
  it.each([
    [1480, 0, '1480'],
    [25600.04, 1, '25_600.0'],
    [-1234567.891, 2, '-1_234_567.89'],
    [0, 2, '0.00'],
    [-0.001, 2, '0.00'],
    [1.005, 2, '1.01'],
    [1e21, 0, '1_000_000_000_000_000_000_000'],
  ])('writes %d with %d decimals as %s', (value, decimals, expected) => {
    expect(plain(formatFixed(value, decimals))).toBe(expected);
  });

  it('writes a true minus, as wide as a digit', () => {
    expect(formatFixed(-3, 0)).toBe('\u22123');
  });

  it('shows a dash for what is not known or not finite', () => {
    for (const value of [null, NaN, Infinity]) expect(formatFixed(value, 1)).toBe('–');
  });
});

describe('formatSignificant', () => {
  it.each([
    [0.012345, 3, '0.0123'],
    [4.5, 3, '4.50'],
    [99.96, 3, '100'],
    [12345.6, 3, '12_346'],
    [-2.345, 2, '-2.3'],
    [0, 3, '0'],
    [0.0001, 2, '0.00010'],
    [0.0000012, 2, '1.2_×_10⁻⁶'],
    [-3.2e12, 2, '-3.2_×_10¹²'],
  ])('writes %d with %d digits as %s', (value, digits, expected) => {
    expect(plain(formatSignificant(value, digits))).toBe(expected);
  });
});

describe('withUnit', () => {
  it('keeps number and unit on one line', () => {
    expect(withUnit('4.50', 'mm/s')).toBe('4.50\u202fmm/s');
  });

  it('puts no unit behind a dash', () => {
    expect(withUnit(formatFixed(null, 1), 'mm/s')).toBe('–');
  });
});

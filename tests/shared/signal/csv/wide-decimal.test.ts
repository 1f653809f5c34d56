import { describe, expect, it } from 'vitest';
import { scaleWideDecimal } from '#shared/signal/csv/wide-decimal.ts';

describe('scaleWideDecimal', () => {
  it('gives the nearest double to more digits than one holds', () => {
    expect(scaleWideDecimal(314159265358979, 323846264, 9, -23)).toBe(Math.PI);
    expect(scaleWideDecimal(271828182845904, 523536, 6, -20)).toBe(Math.E);
  });

  it('declines where the rounding hangs on the last bit: half way between two doubles', () => {
    // 2^53 + 1
    expect(scaleWideDecimal(900719925474099, 3, 1, 0)).toBeNaN();
  });

  it('declines powers it has no exact steps for', () => {
    expect(scaleWideDecimal(123456789012345, 6, 1, 23)).toBeNaN();
    expect(scaleWideDecimal(123456789012345, 6, 1, -45)).toBeNaN();
  });
});

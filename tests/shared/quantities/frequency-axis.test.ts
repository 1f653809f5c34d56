import { describe, expect, it } from 'vitest';
import { fromFrequencyUnit, toFrequencyUnit } from '#shared/quantities/frequency-axis.ts';

describe('the units of a frequency axis', () => {
  it('shows 50 Hz on a shaft of 25 revolutions a second as 3000 cycles/min and as order 2', () => {
    expect(toFrequencyUnit(50, 'Hz', null)).toBe(50);
    expect(toFrequencyUnit(50, 'cycles/min', null)).toBe(3000);
    expect(toFrequencyUnit(50, 'orders', 25)).toBe(2);
  });

  it('finds the frequency again from what stands on the axis', () => {
    expect(fromFrequencyUnit(50, 'Hz', null)).toBe(50);
    expect(fromFrequencyUnit(3000, 'cycles/min', null)).toBe(50);
    expect(fromFrequencyUnit(2, 'orders', 25)).toBe(50);
  });

  it('refuses orders without a speed, and frequencies that are none', () => {
    for (const speed of [null, 0, -25, NaN, Infinity]) {
      expect(() => toFrequencyUnit(50, 'orders', speed)).toThrow(RangeError);
      expect(() => fromFrequencyUnit(2, 'orders', speed)).toThrow(RangeError);
    }
    for (const frequency of [-1, NaN, Infinity]) {
      expect(() => toFrequencyUnit(frequency, 'Hz', null)).toThrow(RangeError);
    }
  });
});

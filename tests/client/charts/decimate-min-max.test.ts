import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimateMinMax } from '#src/charts/decimate-min-max.ts';

describe('decimateMinMax', () => {
  it('keeps every sample of a short stretch', () => {
    const { index, value, samplesPerPoint } = decimateMinMax([5, 6, 7, 8], 1, 3, 100);
    expect([...index]).toEqual([1, 2]);
    expect([...value]).toEqual([6, 7]);
    expect(samplesPerPoint).toBe(1);
  });

  it('never loses the least or the greatest sample, wherever they are', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 200, max: 5000 }),
        fc.nat(4999),
        fc.nat(4999),
        (count, highAt, lowAt) => {
          const samples = new Float32Array(count).map((_, i) => Math.sin(i));
          samples[lowAt % count] = -9;
          samples[highAt % count] = 9;
          const { value } = decimateMinMax(samples, 0, count, 100);
          return value.includes(9) && (lowAt % count === highAt % count || value.includes(-9));
        },
      ),
    );
  });

  it('stays within the points allowed and keeps the order of time', () => {
    const samples = Float32Array.from({ length: 100_003 }, (_, i) => Math.cos(i * i));
    const { index, samplesPerPoint } = decimateMinMax(samples, 0, samples.length, 8000);
    expect(index.length).toBeLessThanOrEqual(8000);
    expect(samplesPerPoint).toBeCloseTo(100_003 / index.length, 9);
    for (let i = 1; i < index.length; i += 1) {
      expect(index[i]).toBeGreaterThan(index[i - 1] ?? 0);
    }
  });

  it('lets gaps neither hide a peak nor become one', () => {
    const samples = new Float32Array(1000).fill(Number.NaN);
    samples[500] = 3;
    const { value } = decimateMinMax(samples, 0, 1000, 20);
    expect([...value].filter((sample) => !Number.isNaN(sample))).toEqual([3]);
  });

  it('cuts a stretch to the record', () => {
    expect([...decimateMinMax([1, 2], -5, 9, 10).index]).toEqual([0, 1]);
    expect(decimateMinMax([], 0, 10, 10).index.length).toBe(0);
  });
});

import { describe, expect, it } from 'vitest';
import { median } from '#shared/statistics/median.ts';
import { wilsonInterval } from '#shared/statistics/wilson-interval.ts';

describe('the interval of a share', () => {
  // R 3.6.2, prop.test(k, 10, correct = FALSE)$conf.int, as printed in SciPy's own tests of
  // binomtest (scipy/stats/tests/test_morestats.py); seven figures.
  it.each([
    [0, 10, 0, 0.2775328],
    [3, 10, 0.1077913, 0.6032219],
    [10, 10, 0.7224672, 1],
  ])('of %i in %i is what R gives', (hits, cases, low, high) => {
    const interval = wilsonInterval(hits, cases);
    expect(interval?.low).toBeCloseTo(low, 6);
    expect(interval?.high).toBeCloseTo(high, 6);
    expect(interval?.share).toBe(hits / cases);
  });

  // R. G. Newcombe, Statistics in Medicine 17 (1998) 857–872, table I, method 3; from memory.
  it.each([
    [81, 263, 0.2553, 0.3662],
    [15, 148, 0.0624, 0.1605],
    [0, 20, 0, 0.1611],
    [1, 29, 0.0061, 0.1718],
  ])('of %i in %i is the published example', (hits, cases, low, high) => {
    const interval = wilsonInterval(hits, cases);
    expect(interval?.low).toBeCloseTo(low, 4);
    expect(interval?.high).toBeCloseTo(high, 4);
  });

  it('is mirrored where hits and misses change places', () => {
    const [one, other] = [wilsonInterval(3, 11), wilsonInterval(8, 11)];
    expect(one?.low).toBeCloseTo(1 - (other?.high ?? 0), 12);
    expect(one?.high).toBeCloseTo(1 - (other?.low ?? 0), 12);
  });

  it('does not exist without cases', () => {
    expect(wilsonInterval(0, 0)).toBeNull();
  });

  it.each([
    [2, 1],
    [-1, 3],
    [0.5, 3],
    [1, Number.NaN],
  ])('refuses %d of %d', (hits, cases) => {
    expect(() => wilsonInterval(hits, cases)).toThrow(RangeError);
  });
});

describe('the median', () => {
  it('is the middle value, or the mean of the two in the middle', () => {
    expect(median([5])).toBe(5);
    expect(median([9, 1, 4])).toBe(4);
    expect(median([3, 1, 2, 10])).toBe(2.5);
    expect(median([])).toBeNull();
  });

  it('leaves its input as it was', () => {
    const values = [3, 1, 2];
    median(values);
    expect(values).toEqual([3, 1, 2]);
  });
});

import { describe, expect, it } from 'vitest';
import {
  chanceOfLine,
  medianInPlace,
  noiseFloor,
  selectSmallest,
} from '#shared/signal/noise-floor.ts';
import { gammaTail } from '#shared/signal/tail-chances.ts';
import { uniform } from './test-signals.ts';

/** Level over the mean noise at which one line's chance is `p`, dB. */
function thresholdDb(p: number, averages: number): number {
  let [low, high] = [1, 100];
  for (let i = 0; i < 60; i += 1) {
    const middle = (low + high) / 2;
    if (chanceOfLine(middle, 1, averages) > p) low = middle;
    else high = middle;
  }
  return 10 * Math.log10(low);
}

describe('chanceOfLine', () => {
  // Chi-square quantiles at 1 − 1e-3 over their degrees of freedom: 13.816/2, 26.124/8, 39.252/16
  // (Abramowitz and Stegun 1964, table 26.8).
  it('has the thresholds of the chi-square tables at one in a thousand', () => {
    expect(thresholdDb(1e-3, 1)).toBeCloseTo(10 * Math.log10(13.816 / 2), 3);
    expect(thresholdDb(1e-3, 4)).toBeCloseTo(10 * Math.log10(26.124 / 8), 3);
    expect(thresholdDb(1e-3, 8)).toBeCloseTo(10 * Math.log10(39.252 / 16), 3);
    expect(thresholdDb(1e-3, 1)).toBeCloseTo(8.4, 1);
    expect(thresholdDb(1e-3, 4)).toBeCloseTo(5.1, 1);
    expect(thresholdDb(1e-3, 8)).toBeCloseTo(3.9, 1);
  });

  it('sinks to the mean of six orders with four averages at 2.4 dB', () => {
    let [low, high] = [1, 10];
    for (let i = 0; i < 60; i += 1) {
      const middle = (low + high) / 2;
      if (gammaTail(24, 24 * middle) > 1e-3) low = middle;
      else high = middle;
    }
    expect(10 * Math.log10(low)).toBeCloseTo(2.4, 1);
  });

  it('grows with the lines looked at and with an unsure floor', () => {
    const one = chanceOfLine(8, 1, 2);
    expect(chanceOfLine(8, 3, 2)).toBeCloseTo(1 - (1 - one) ** 3, 12);
    expect(chanceOfLine(8, 1, 2, 5)).toBeGreaterThan(one);
    expect(chanceOfLine(8, 1, 2, 1e7)).toBeCloseTo(one, 6);
    expect(chanceOfLine(0, 2, 3, 9)).toBe(1);
  });
});

describe('noiseFloor', () => {
  it('is the mean power of the noise within 5 %, and strong lines do not lift it', () => {
    const next = uniform(5);
    const power = Float64Array.from({ length: 4000 }, () => -Math.log(next()) * 3);
    for (let k = 50; k < 4000; k += 50) power[k] = 1e6;
    const floor = noiseFloor(power, 200);
    const mean = floor.slice(300, 3700).reduce((a, b) => a + b, 0) / 3400;
    expect(mean / 3).toBeGreaterThan(0.97);
    expect(mean / 3).toBeLessThan(1.08);
  });
});

describe('selectSmallest', () => {
  it('gives the value that sorting would put there', () => {
    const next = uniform(9);
    for (const count of [1, 2, 5, 100, 1001]) {
      const values = Float64Array.from({ length: count }, () => Math.round(next() * 50));
      const sorted = values.slice().sort();
      for (const k of [0, count >> 1, count - 1]) {
        expect(selectSmallest(values.slice(), count, k)).toBe(sorted[k]);
      }
      expect(medianInPlace(values.slice(), count)).toBe(sorted[count >> 1]);
    }
  });
});

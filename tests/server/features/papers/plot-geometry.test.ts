import { describe, expect, it } from 'vitest';
import {
  highestPath,
  reachOf,
  samplePaths,
  ticksOf,
  tickText,
  type Axis,
} from '#server/features/papers/plot-geometry.ts';

const axis = (from: number, to: number, start: number, length: number): Axis => ({
  from,
  to,
  start,
  length,
});

describe('a spectrum on paper', () => {
  it('keeps a single high line among a hundred thousand', () => {
    const heights = new Float64Array(100_000);
    heights[54_321] = 1;
    const path = highestPath(heights, 0.01, axis(0, 1000, 0, 500), axis(0, 1, 100, -100));
    expect(path.length).toBeLessThanOrEqual(1001);
    const top = path.reduce((best, point) => (point[1] < best[1] ? point : best));
    expect(top[1]).toBe(0);
    expect(top[0]).toBeCloseTo((543.21 / 1000) * 500, 6);
  });

  it('cuts lines off at the edges of the drawing and leaves out what is no number', () => {
    const path = highestPath(
      [Number.NaN, -Infinity, 5],
      1,
      axis(0, 2, 0, 100),
      axis(-3, 1, 100, -100),
    );
    expect(path).toEqual([
      [50, 100],
      [100, 0],
    ]);
  });
});

describe('a record on paper', () => {
  it('keeps a spike of one sample, upwards and downwards', () => {
    const samples = new Float32Array(50_000);
    samples[12_345] = 9;
    samples[40_001] = -7;
    const ys = samplePaths(samples, axis(0, 49_999, 0, 250), axis(-10, 10, 0, 20)).flatMap((path) =>
      path.map(([, y]) => y),
    );
    expect(ys.length).toBeLessThan(1400);
    expect(Math.max(...ys)).toBe(19);
    expect(Math.min(...ys)).toBe(3);
  });

  it('draws no line over a gap', () => {
    const gap = [1, 2, Number.NaN, 3];
    const paths = samplePaths(gap, axis(0, 3, 0, 300), axis(0, 4, 0, 4));
    expect(paths.map((path) => path.map(([, y]) => y))).toEqual([[1, 2], [3]]);
  });

  it('has a reach also where every sample is the same, and none where there is no sample', () => {
    const flat = reachOf([2, 2, 2]);
    expect(flat?.from).toBeLessThan(2);
    expect(flat?.to).toBeGreaterThan(2);
    expect(reachOf([])).toBeNull();
    expect(reachOf([Number.NaN])).toBeNull();
  });
});

describe('ticks', () => {
  it('are round, few and written with the decimals they need', () => {
    const ticks = ticksOf(0, 0.61, 5);
    expect(ticks.map((tick) => tickText(tick, ticks))).toEqual(['0.0', '0.2', '0.4', '0.6']);
    const whole = ticksOf(-6, 6, 4);
    expect(whole.map((tick) => tickText(tick, whole))).toEqual(['−5', '0', '5']);
  });

  it('are none for an axis without length', () => {
    expect(ticksOf(1, 1, 5)).toEqual([]);
    expect(ticksOf(0, Number.NaN, 5)).toEqual([]);
  });
});

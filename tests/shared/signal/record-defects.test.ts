import { describe, expect, it } from 'vitest';
import { countCableJumps } from '#shared/signal/cable-jumps.ts';
import { clippedBeforeIntegration } from '#shared/signal/clipping-before-integration.ts';
import { findClipping } from '#shared/signal/clipping.ts';
import { settlingDrift } from '#shared/signal/slow-drift.ts';
import { stuckShare } from '#shared/signal/stuck-samples.ts';
import { uniform } from './test-signals.ts';

const rateHz = 5120;
const count = 8192;
const random = uniform(7);
const noise = Float64Array.from({ length: count }, () => random() + random() + random() - 1.5);
const shaft = Float64Array.from(
  { length: count },
  (_, i) => Math.sin((2 * Math.PI * 24.7 * i) / rateHz) + 0.2 * (noise[i] ?? 0),
);

describe('defects of a record', () => {
  it('finds an input cut off on both sides, and the share that sits on the rails', () => {
    const clipped = shaft.map((value) => Math.max(-0.8, Math.min(0.8, value)));
    const on = clipped.filter((value) => Math.abs(value) === 0.8).length / count;
    const found = findClipping(clipped);
    expect([found.upper, found.lower]).toEqual([true, true]);
    expect(found.share).toBeCloseTo(on, 2);
    expect(findClipping(shaft)).toEqual({ upper: false, lower: false, share: 0 });
  });

  it('finds acceleration that was cut off before it became velocity', () => {
    const integrate = (values: Float64Array) => {
      let sum = 0;
      return values.map((value) => (sum += value / rateHz));
    };
    expect(clippedBeforeIntegration(integrate(noise.map((v) => Math.min(0.3, v))))).toBe(true);
    expect(clippedBeforeIntegration(integrate(noise))).toBe(false);
  });

  it('counts the samples that a dropped link held', () => {
    const held = shaft.slice();
    held.fill(0.4, 1000, 1400);
    expect(stuckShare(held)).toBeCloseTo(400 / count, 10);
    expect(stuckShare(shaft)).toBe(0);
  });

  it('tells the jumps of a loose plug from ringing blows', () => {
    const rings = (decayS: number, hz: number) =>
      noise.map((value, i) => {
        const since = i % 1024;
        return (
          value +
          40 * Math.exp(-since / rateHz / decayS) * Math.cos((2 * Math.PI * hz * since) / rateHz)
        );
      });
    expect(countCableJumps(rings(0.02, 0), rateHz)).toBe(7);
    expect(countCableJumps(rings(0.02, 900), rateHz)).toBe(0);
  });

  it('measures how far a settling sensor starts from where it ends', () => {
    const settling = shaft.map((value, i) => value + 20 * Math.exp(-i / 1500));
    expect(settlingDrift(settling)).toBeGreaterThan(10);
    expect(settlingDrift(shaft)).toBeLessThan(0.5);
  });
});

import { describe, expect, it } from 'vitest';
import { convertDetector, detectors } from '#shared/quantities/detector.ts';

describe('convertDetector', () => {
  it('agrees with the figures of a sine sampled over one period', () => {
    const sine = Array.from({ length: 4096 }, (_, i) => 3 * Math.sin((2 * Math.PI * i) / 4096));
    const measured = {
      rms: Math.sqrt(sine.reduce((sum, value) => sum + value * value, 0) / sine.length),
      peak: Math.max(...sine),
      'peak-to-peak': Math.max(...sine) - Math.min(...sine),
    };
    for (const from of detectors) {
      for (const to of detectors) {
        expect(convertDetector(measured[from], from, to)).toBeCloseTo(measured[to], 12);
      }
    }
  });
});

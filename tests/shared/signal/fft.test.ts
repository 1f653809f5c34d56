import { describe, expect, it } from 'vitest';
import { realFft, realFromLines } from '#shared/signal/fft.ts';
import { directLine, tones, whiteNoise } from './test-signals.ts';

describe('realFft', () => {
  // The sum that defines the discrete Fourier transform.
  it('equals the direct sum for lengths of any kind', () => {
    for (const count of [2, 3, 4, 5, 12, 97, 128, 600, 1000, 1021, 1024, 1536]) {
      const samples = whiteNoise(count, count);
      const lines = realFft(samples);
      expect(lines).toHaveLength(2 * (Math.floor(count / 2) + 1));
      for (let k = 0; k <= count / 2; k += Math.max(1, Math.floor(count / 40))) {
        const [re, im] = directLine(samples, k);
        expect(Math.abs((lines[2 * k] ?? NaN) - re), `${count}: ${k}`).toBeLessThan(1e-9);
        expect(Math.abs((lines[2 * k + 1] ?? NaN) - im), `${count}: ${k}`).toBeLessThan(1e-9);
      }
    }
  });

  it('does not mix up lengths it has kept plans for', () => {
    const before = realFft(whiteNoise(1000, 1));
    for (let count = 900; count < 930; count += 1) realFft(whiteNoise(count, count));
    expect([...realFft(whiteNoise(1000, 1))]).toEqual([...before]);
  });

  it('leaves the samples as they were', () => {
    const samples = whiteNoise(300, 3);
    const copy = samples.slice();
    realFft(samples);
    expect(samples).toEqual(copy);
  });
});

describe('realFromLines', () => {
  it('samples the sum of the lines anew at a power of two', () => {
    const list = [
      { frequencyHz: 3, amplitude: 1.5, phase: 0.3 },
      { frequencyHz: 40, amplitude: 0.2, phase: 2 },
    ];
    const samples = tones(list, 1000, 1000);
    const lines = realFft(samples).map((value) => value / 1000);
    const again = realFromLines(lines.subarray(0, 2 * 60), 256);
    const wanted = tones(list, 256, 256);
    wanted.forEach((value, i) => expect(again[i]).toBeCloseTo(value, 10));
  });

  it('refuses a length that is not a power of two', () => {
    expect(() => realFromLines(new Float64Array(8), 48)).toThrow(RangeError);
  });
});

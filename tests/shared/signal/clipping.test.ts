import { describe, expect, it } from 'vitest';
import { findClipping } from '#shared/signal/clipping.ts';
import { tones, whiteNoise } from './test-signals.ts';

const count = 8192;
const sound = () => {
  const samples = tones(
    [
      { frequencyHz: 25.3, amplitude: 1 },
      { frequencyHz: 141, amplitude: 0.4, phase: 1 },
    ],
    2048,
    count,
  );
  return samples.map((value, i) => value + 0.1 * (noise[i] ?? 0));
};
const noise = whiteNoise(count, 12);
const rounded = (samples: Float64Array, step: number) =>
  samples.map((value) => Math.round(value / step) * step);
const limited = (samples: Float64Array, low: number, high: number) =>
  samples.map((value) => Math.min(high, Math.max(low, value)));

describe('findClipping', () => {
  it('sees a record cut off on both sides or on one', () => {
    expect(findClipping(limited(sound(), -0.9, 0.9))).toMatchObject({ upper: true, lower: true });
    expect(findClipping(limited(sound(), -9, 0.9))).toMatchObject({ upper: true, lower: false });
    expect(findClipping(limited(sound(), -0.9, 9))).toMatchObject({ upper: false, lower: true });
  });

  it('gives the share of the samples on the rail', () => {
    const samples = limited(sound(), -0.8, 0.8);
    const onRail = samples.filter((value) => Math.abs(value) >= 0.8).length / count;
    expect(findClipping(samples).share).toBeCloseTo(onRail, 3);
  });

  it('sees it through a little noise of a fine converter on the rail, and at few bits', () => {
    const fine = limited(sound(), -0.9, 0.9).map((value, i) => value + 1e-5 * (noise[i] ?? 0));
    expect(findClipping(fine)).toMatchObject({ upper: true, lower: true });
    const coarse = limited(rounded(sound(), 1 / 16), -0.75, 0.75);
    expect(findClipping(coarse)).toMatchObject({ upper: true, lower: true });
  });

  it('does not take the few levels of a low-resolution record for a rail', () => {
    const pure = tones([{ frequencyHz: 25.3, amplitude: 1 }], 2048, count);
    for (const samples of [pure, sound()]) {
      for (const levels of [12, 20, 40, 100, 1000, 65_536]) {
        const found = findClipping(rounded(samples, 1 / levels));
        expect(found, `${levels}`).toMatchObject({ upper: false, lower: false, share: 0 });
      }
    }
  });

  // A machine that hits a stop rounds its motion off; it does not return to one value bit for bit.
  it('leaves a motion that the machine flattens alone', () => {
    const flattened = sound().map((value) => Math.tanh(3 * value) / 3);
    expect(findClipping(flattened)).toMatchObject({ upper: false, lower: false });
  });

  it('has nothing to say of a constant or empty record', () => {
    expect(findClipping(new Float64Array(100))).toMatchObject({ upper: false, share: 0 });
    expect(findClipping(new Float64Array(0))).toMatchObject({ upper: false, share: 0 });
  });
});

import { describe, expect, it } from 'vitest';
import { analyseWaveform } from '#shared/signal/analyse-waveform.ts';
import { whiteNoise } from './test-signals.ts';

const sampleRateHz = 2560;
const count = 4096; // 1.6 s

/** Speeds found for orders of 0 dB a sample in white noise, over the Cramér–Rao bound. */
function misses(orders: number, records: number) {
  let squares = 0;
  for (let order = 1; order <= orders; order += 1) squares += order * order;
  // Rife and Boorstyn, IEEE Trans. Inf. Theory 20 (1974): var ω = 12 σ²/(A² N³) for a real tone; the
  // orders' informations add up with the square of the order.
  const boundHz = (Math.sqrt(6 / (squares * count ** 3)) * sampleRateHz) / (2 * Math.PI);
  let inside = 0;
  const over = Array.from({ length: records }, (_, index) => {
    const speedHz = 22 + 6 * ((index * 0.618) % 1);
    const samples = whiteNoise(count, 77 * index + orders + 1);
    for (let order = 1; order <= orders; order += 1) {
      for (let i = 0; i < count; i += 1) {
        const turns = (order * speedHz * i) / sampleRateHz;
        samples[i] =
          (samples[i] ?? 0) + Math.SQRT2 * Math.cos(2 * Math.PI * turns + 1.7 * index * order);
      }
    }
    const told = speedHz * 60 * (1 + 0.025 * Math.sin(index));
    const { speed } = analyseWaveform({ samples, sampleRateHz, unit: 'mm/s', toldSpeedRpm: told });
    const [low, high] = speed.intervalHz ?? [NaN, NaN];
    if (low <= speedHz && speedHz <= high) inside += 1;
    return ((speed.speedHz ?? NaN) - speedHz) / boundHz;
  });
  return {
    rms: Math.sqrt(over.reduce((sum, value) => sum + value * value, 0) / records),
    insideShare: inside / records,
  };
}

describe('running speed in noise', () => {
  it('is found within three times the Cramér–Rao bound, and its interval holds it', () => {
    for (const orders of [1, 3, 6]) {
      const { rms, insideShare } = misses(orders, 100);
      expect(rms, `${orders} orders`).toBeLessThan(2.5);
      expect(insideShare, `${orders} orders`).toBeGreaterThan(0.9);
    }
  });
});

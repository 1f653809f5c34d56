import { describe, expect, it } from 'vitest';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import type { ScreeningInput } from '#shared/signal/screening-types.ts';
import { tones, uniform } from './test-signals.ts';

const speedHz = 24.7;
const family = (orders: readonly number[], sampleRateHz = 5120, count = 16_384) =>
  tones(
    orders.map((order) => ({
      frequencyHz: order * speedHz,
      // 3 mm/s peak each, as acceleration in m/s².
      amplitude: 2 * Math.PI * order * speedHz * 3e-3,
      phase: order,
    })),
    sampleRateHz,
    count,
  );
const withNoise = (samples: Float64Array, size: number, seed = 1) => {
  const random = uniform(seed);
  return samples.map((value) => value + size * (random() + random() + random() - 1.5));
};
const input = (samples: Float64Array, more: Partial<ScreeningInput> = {}): ScreeningInput => ({
  samples,
  sampleRateHz: 5120,
  unit: 'm/s²',
  toldSpeedRpm: 1482,
  ...more,
});

/** Every number in the result and its plots is finite, so that JSON carries it. */
function hasOnlyFiniteNumbers(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value);
  if (ArrayBuffer.isView(value)) return Array.from(value as Float32Array).every(Number.isFinite);
  if (value !== null && typeof value === 'object') {
    return Object.values(value).every(hasOnlyFiniteNumbers);
  }
  return true;
}

describe('screenWaveform', () => {
  it.each([
    ['no samples', new Float64Array(0)],
    ['two samples', Float64Array.of(1, -1)],
    ['zeros', new Float64Array(4096)],
    ['gaps alone', new Float64Array(4096).fill(Number.NaN)],
    ['one blow', Float64Array.from({ length: 4096 }, (_, i) => (i === 2000 ? 1 : 0))],
    [
      'numbers as large as they come',
      Float64Array.from({ length: 512 }, (_, i) => (i % 2 ? 1e308 : -1e308)),
    ],
    [
      'numbers as small as they come',
      Float64Array.from({ length: 4096 }, (_, i) => (i % 7) * 1e-310),
    ],
  ])('sends %s back without an error and with finite numbers', (_, samples) => {
    const { result, plots } = screenWaveform(input(samples));
    expect(result.verdict).toBe('retake');
    expect(result.quality.length).toBeGreaterThan(0);
    expect(hasOnlyFiniteNumbers(result)).toBe(true);
    expect(hasOnlyFiniteNumbers(plots)).toBe(true);
  });

  it.each([1000, 1001, 4097, 16_384, 65_536])(
    'gives finite numbers and chances between 0 and 1 for %i samples',
    (count) => {
      const samples = withNoise(family([1, 2, 3], 1000, count), 0.01);
      const { result, plots } = screenWaveform(input(samples, { sampleRateHz: 1000 }));
      expect(hasOnlyFiniteNumbers(result) && hasOnlyFiniteNumbers(plots)).toBe(true);
      const chances = [result.harmonicRun.pChance, ...result.orders.map(({ pNoise }) => pNoise)];
      expect(chances.every((chance) => chance >= 0 && chance <= 1)).toBe(true);
      expect(result.speed.speedHz).toBeCloseTo(speedHz, 1);
    },
  );

  it('looks at the first 2^20 samples of a longer record and says so without asking a retake', () => {
    const samples = withNoise(family([1], 25_600, 1_100_000), 0.01);
    const { result } = screenWaveform(input(samples, { sampleRateHz: 25_600 }));
    expect(result.quality.map(({ code }) => code)).toEqual(['cut-short']);
    expect(result.verdict).toBe('none');
  });

  it('refuses a sampling rate that is not positive', () => {
    expect(() => screenWaveform(input(family([1]), { sampleRateHz: 0 }))).toThrow(RangeError);
    expect(() => screenWaveform(input(family([1]), { sampleRateHz: Number.NaN }))).toThrow(
      RangeError,
    );
  });

  it('leaves the samples as they were', () => {
    const samples = family([1, 2]);
    const before = samples.slice();
    screenWaveform(input(samples));
    expect(samples).toEqual(before);
  });

  it('calls neither unbalance nor misalignment (2× and 3× of a falling share) loose', () => {
    for (const shares of [[1], [1, 0.5], [1, 0.6, 0.2], [0.5, 1, 0.1]]) {
      const samples = new Float64Array(16_384);
      shares.forEach((share, i) => family([i + 1]).forEach((v, n) => (samples[n]! += share * v)));
      expect(screenWaveform(input(withNoise(samples, 0.3))).result.verdict).toBe('none');
    }
  });

  it('reads a level of 3 mm/s peak from acceleration at every order (a = 2πf·v)', () => {
    const { result } = screenWaveform(input(withNoise(family([1, 2, 5, 10]), 0.01)));
    for (const order of [1, 2, 5, 10]) {
      const line = result.orders.find((one) => one.order === order);
      expect(line?.velocityMmPerSRms).toBeCloseTo(3 / Math.SQRT2, 2);
    }
  });

  it('names what explains an order: blade pass and twice the line frequency', () => {
    const machine = { bladeCount: 5, lineFrequencyHz: 49.4 };
    const { result } = screenWaveform(input(withNoise(family([1, 4, 5]), 0.01), { machine }));
    const words = (order: number) => result.orders.find((one) => one.order === order)?.explainedBy;
    expect(words(5)).toBe('blade pass');
    expect(words(4)).toBe('twice the line frequency');
    expect(words(1)).toBeNull();
  });

  it('shows in the plot the peak in the recorded unit', () => {
    const sampleRateHz = 2048;
    const samples = tones([{ frequencyHz: 32, amplitude: 0.5 }], sampleRateHz, 4096);
    const { plots } = screenWaveform(
      input(samples, { sampleRateHz, unit: 'g', toldSpeedRpm: 1920 }),
    );
    expect(plots.spectrum.amplitudePeak[32 / plots.spectrum.stepHz]).toBeCloseTo(0.5, 6);
  });
});

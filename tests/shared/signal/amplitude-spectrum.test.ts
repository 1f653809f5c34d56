import { describe, expect, it } from 'vitest';
import { amplitudeSpectrum, windowOf } from '#shared/signal/amplitude-spectrum.ts';
import { clippedSine, clippedSineHarmonic, rms, tones, whiteNoise } from './test-signals.ts';

const dbOf = (amplitude: number, over: number) => 20 * Math.log10(amplitude / over);

describe('amplitudeSpectrum', () => {
  it('gives a sine on a line its peak value, whatever the window and the length', () => {
    for (const count of [1000, 1024, 4999, 10_000]) {
      for (const window of ['hann', 'none'] as const) {
        const line = 37;
        const samples = tones([{ frequencyHz: line, amplitude: 3.25, phase: 0.7 }], count, count);
        const { amplitudePeak, stepHz } = amplitudeSpectrum(samples, count, window);
        expect(stepHz).toBe(1);
        expect(amplitudePeak[line]).toBeCloseTo(3.25, 8);
      }
    }
  });

  // Fourier series of the square wave, 4/(πk) for odd k (Fourier 1822); of the sampled one exactly
  // 4/(N sin(πk/N)) by the geometric sum.
  it('shows the odd harmonics of a square wave at 4/πk', () => {
    const [perCycle, cycles] = [512, 16];
    const count = perCycle * cycles;
    const samples = Float64Array.from({ length: count }, (_, i) =>
      i % perCycle < perCycle / 2 ? 1 : -1,
    );
    const { amplitudePeak } = amplitudeSpectrum(samples, count, 'none');
    for (let k = 1; k <= 25; k += 1) {
      const found = amplitudePeak[k * cycles] ?? 0;
      if (k % 2 === 0) expect(found).toBeLessThan(1e-12);
      else {
        expect(found).toBeCloseTo(4 / (perCycle * Math.sin((Math.PI * k) / perCycle)), 12);
        expect(found * ((Math.PI * k) / 4)).toBeCloseTo(1, 2);
      }
    }
  });

  // Closed form by integrating the pieces of the wave; 3× at −29.7 dB is its value at 0.9.
  it('shows a sine clipped on both sides as odd orders of the closed form', () => {
    const cycles = 8;
    const samples = clippedSine(cycles, 2 ** 17, 0.9, 'both');
    const { amplitudePeak } = amplitudeSpectrum(samples, 2 ** 17, 'hann');
    const first = amplitudePeak[cycles] ?? 0;
    for (const n of [1, 2, 3, 5, 7, 9]) {
      expect(Math.abs((amplitudePeak[n * cycles] ?? 0) - clippedSineHarmonic(n, 0.9))).toBeLessThan(
        1e-6,
      );
    }
    expect(dbOf(amplitudePeak[3 * cycles] ?? 0, first)).toBeCloseTo(-29.7, 1);
  });

  // A one-sided clip is half the difference to the sine, mirrored: even orders appear too.
  it('shows a sine clipped on one side with 2× at −34.9 dB and 3× at −35.9 dB', () => {
    const cycles = 8;
    const samples = clippedSine(cycles, 2 ** 16, 0.9, 'upper');
    const { amplitudePeak } = amplitudeSpectrum(samples, 2 ** 16, 'none');
    const first = amplitudePeak[cycles] ?? 0;
    expect(dbOf(amplitudePeak[2 * cycles] ?? 0, first)).toBeCloseTo(-34.9, 1);
    expect(dbOf(amplitudePeak[3 * cycles] ?? 0, first)).toBeCloseTo(-35.9, 1);
    const onRail = samples.filter((value) => value >= 0.9).length / samples.length;
    expect(onRail).toBeCloseTo(Math.acos(0.9) / Math.PI, 3);
  });

  // Parseval's theorem.
  it('holds the power of the record without a window', () => {
    for (const count of [1024, 1000, 999]) {
      const samples = whiteNoise(count, count);
      const { amplitudePeak } = amplitudeSpectrum(samples, 1000, 'none');
      let power = 0;
      amplitudePeak.forEach((peak, k) => {
        power += k === 0 || 2 * k === count ? peak ** 2 : peak ** 2 / 2;
      });
      expect(Math.sqrt(power)).toBeCloseTo(rms(samples), 10);
    }
  });

  // Harris, "On the use of windows for harmonic analysis with the discrete Fourier transform",
  // Proc. IEEE 66 (1978), table I: Hann coherent gain 0.50, equivalent noise bandwidth 1.50 bins,
  // scallop loss 1.42 dB; rectangle 1.00, 1.00, 3.92 dB.
  it('has the window gains, noise bandwidths and scallop losses of the literature', () => {
    const count = 4096;
    for (const [name, gain, bandwidth, scallopDb] of [
      ['hann', 0.5, 1.5, 1.42],
      ['none', 1, 1, 3.92],
    ] as const) {
      const window = windowOf(name, count);
      const sum = window.reduce((a, b) => a + b, 0);
      const squares = window.reduce((a, b) => a + b * b, 0);
      expect(sum / count).toBeCloseTo(gain, 12);
      expect((count * squares) / sum ** 2).toBeCloseTo(bandwidth, 12);
      const between = tones([{ frequencyHz: 500.5, amplitude: 1 }], count, count);
      const { amplitudePeak } = amplitudeSpectrum(between, count, name);
      expect(-dbOf(amplitudePeak[500] ?? 0, 1)).toBeCloseTo(scallopDb, 2);
    }
  });

  it('refuses a record without two samples or a rate', () => {
    expect(() => amplitudeSpectrum(new Float64Array(1), 100)).toThrow(RangeError);
    expect(() => amplitudeSpectrum(new Float64Array(8), 0)).toThrow(RangeError);
  });
});

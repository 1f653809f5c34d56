import { realFft } from './fft.ts';

export const windowNames = ['hann', 'none'] as const;
export type WindowName = (typeof windowNames)[number];

/** A single-sided amplitude spectrum: `amplitudePeak[i]` is the line at `i × stepHz`. */
export interface AmplitudeSpectrum {
  stepHz: number;
  /** Peak amplitude in the unit of the samples. */
  amplitudePeak: Float64Array;
}

/**
 * Window coefficients in the periodic form, as spectra want it (Harris 1978): Hann has a coherent
 * gain of 0.5 and an equivalent noise bandwidth of 1.5 lines.
 *
 * @param length - samples, at least 1
 */
export function windowOf(name: WindowName, length: number): Float64Array {
  const window = new Float64Array(length);
  for (let i = 0; i < length; i += 1) {
    window[i] = name === 'none' ? 1 : 0.5 - 0.5 * Math.cos((2 * Math.PI * i) / length);
  }
  return window;
}

/**
 * Amplitude spectrum of the whole record, corrected for the window's coherent gain: a sine on a line
 * shows its peak value there.
 *
 * @param samples - finite, at least 2; the mean should have been taken out before
 * @param sampleRateHz - Hz, > 0
 * @throws {RangeError} for fewer than 2 samples or a rate that is not positive
 */
export function amplitudeSpectrum(
  samples: Float64Array,
  sampleRateHz: number,
  windowName: WindowName = 'hann',
): AmplitudeSpectrum {
  const n = samples.length;
  if (n < 2) throw new RangeError('A spectrum needs at least 2 samples.');
  if (!(sampleRateHz > 0)) throw new RangeError('The sampling rate must be positive.');
  const window = windowOf(windowName, n);
  let gain = 0;
  const windowed = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    const w = window[i] ?? 0;
    gain += w;
    windowed[i] = (samples[i] ?? 0) * w;
  }
  const lines = realFft(windowed);
  const count = lines.length / 2;
  const amplitudePeak = new Float64Array(count);
  for (let k = 0; k < count; k += 1) {
    const doubled = k === 0 || (n % 2 === 0 && k === count - 1) ? 1 : 2;
    amplitudePeak[k] = (doubled * Math.hypot(lines[2 * k] ?? 0, lines[2 * k + 1] ?? 0)) / gain;
  }
  return { stepHz: sampleRateHz / n, amplitudePeak };
}

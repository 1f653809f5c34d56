import { realFft, realFromLines } from './fft.ts';

/** How an integration was done, to undo it: by the exact factor of each line, or by trapezoids. */
export type IntegrationRule = 'spectral' | 'trapezoidal';

/**
 * Undoes an integration over time line by line. The ends are joined by taking a straight line out,
 * so the first and last samples ring.
 *
 * @param samples - the last power of two of them is used; finite
 * @param rule - spectral multiplies by jωT, trapezoidal by 2j·tan(ωT/2), the inverse of summing
 *   trapezoids (Oppenheim and Schafer, bilinear transform); T is one sample
 * @returns change per sample, as many values as the power of two that was used
 */
export function differentiate(samples: Float64Array, rule: IntegrationRule): Float64Array {
  const length = 2 ** Math.floor(Math.log2(Math.max(4, samples.length)));
  const first = samples[0] ?? 0;
  const slope = ((samples[length - 1] ?? 0) - first) / Math.max(1, length - 1);
  const joined = new Float64Array(length);
  for (let i = 0; i < length; i += 1) joined[i] = (samples[i] ?? 0) - first - slope * i;
  const lines = realFft(joined);
  for (let k = 0; 2 * k + 1 < lines.length; k += 1) {
    const angle = (2 * Math.PI * k) / length;
    // The tangent grows without limit towards half the sampling rate, where only rounding is left.
    const factor =
      rule === 'spectral' ? angle : k > 0.48 * length ? 0 : 2 * Math.tan(Math.min(angle / 2, 1.5));
    const [re, im] = [lines[2 * k] ?? 0, lines[2 * k + 1] ?? 0];
    lines[2 * k] = -factor * im;
    lines[2 * k + 1] = factor * re;
  }
  const out = realFromLines(lines, length);
  for (let i = 0; i < length; i += 1) out[i] = (out[i] ?? 0) / length + slope;
  return out;
}

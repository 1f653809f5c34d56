/** Signals that the tests of the method state in closed form, and noise from fixed seeds. */

export interface Tone {
  frequencyHz: number;
  amplitude: number;
  /** rad, of the sine at the first sample. */
  phase?: number;
}

export function tones(list: readonly Tone[], sampleRateHz: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, i) =>
    list.reduce(
      (sum, { frequencyHz, amplitude, phase = 0 }) =>
        sum + amplitude * Math.sin((2 * Math.PI * frequencyHz * i) / sampleRateHz + phase),
      0,
    ),
  );
}

/** Uniform random numbers in (0, 1) of a seed (mulberry32). */
export function uniform(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return (((t ^ (t >>> 14)) >>> 0) + 0.5) / 2 ** 32;
  };
}

/** White Gaussian noise of standard deviation 1 (Box and Muller 1958). */
export function whiteNoise(count: number, seed: number): Float64Array {
  const next = uniform(seed);
  for (let i = 0; i < 8; i += 1) next();
  return Float64Array.from(
    { length: count },
    () => Math.sqrt(-2 * Math.log(next())) * Math.cos(2 * Math.PI * next()),
  );
}

export const noiseColours = ['white', 'pink', 'brown', 'blue'] as const;
export type NoiseColour = (typeof noiseColours)[number];

/** Noise whose power goes with 1, 1/f, 1/f² or f. */
export function colouredNoise(colour: NoiseColour, count: number, seed: number): Float64Array {
  const white = whiteNoise(count, seed);
  if (colour === 'white') return white;
  if (colour === 'blue') return halfDerivative(white);
  const out = new Float64Array(count);
  if (colour === 'brown') {
    // A leak keeps the walk near zero; its corner lies far below a tenth of any speed tested.
    let sum = 0;
    for (let i = 0; i < count; i += 1) out[i] = sum = 0.9995 * sum + (white[i] ?? 0);
    return out;
  }
  // Seven first-order sections an octave and a half apart add up to 1/f within half a decibel.
  const poles = [0.9999, 0.9996, 0.9985, 0.994, 0.976, 0.905, 0.62];
  const states = poles.map(() => 0);
  for (let i = 0; i < count; i += 1) {
    let sum = 0;
    poles.forEach((pole, k) => {
      states[k] = pole * (states[k] ?? 0) + Math.sqrt(1 - pole * pole) * (white[i] ?? 0);
      sum += states[k] ?? 0;
    });
    out[i] = sum;
  }
  return out;
}

/** Binomial series of (1 − z⁻¹)^½: power rises with f. */
function halfDerivative(white: Float64Array): Float64Array {
  const taps = 200;
  const weights = new Float64Array(taps);
  weights[0] = 1;
  for (let k = 1; k < taps; k += 1) weights[k] = ((weights[k - 1] ?? 0) * (k - 1.5)) / k;
  return white.map((_, i) => {
    let sum = 0;
    for (let k = 0; k < Math.min(taps, i + 1); k += 1) {
      sum += (weights[k] ?? 0) * (white[i - k] ?? 0);
    }
    return sum;
  });
}

/** A sine of peak 1 held at `level` on one side or both. */
export function clippedSine(
  cycles: number,
  count: number,
  level: number,
  side: 'upper' | 'both',
): Float64Array {
  return Float64Array.from({ length: count }, (_, i) => {
    const value = Math.min(level, Math.sin((2 * Math.PI * cycles * i) / count));
    return side === 'both' ? Math.max(-level, value) : value;
  });
}

/** Fourier amplitude of order n of a sine clipped symmetrically at `level`: integrals of its pieces. */
export function clippedSineHarmonic(n: number, level: number): number {
  if (n % 2 === 0) return 0;
  const edge = Math.asin(level);
  const below =
    n === 1
      ? edge / 2 - Math.sin(2 * edge) / 4
      : Math.sin((n - 1) * edge) / (2 * (n - 1)) - Math.sin((n + 1) * edge) / (2 * (n + 1));
  return Math.abs((4 / Math.PI) * (below + (level * Math.cos(n * edge)) / n));
}

/** Peak of line k by the sum that defines the transform. */
export function directLine(samples: Float64Array, k: number): [number, number] {
  let [re, im] = [0, 0];
  const n = samples.length;
  for (let i = 0; i < n; i += 1) {
    const angle = (-2 * Math.PI * ((k * i) % n)) / n;
    re += (samples[i] ?? 0) * Math.cos(angle);
    im += (samples[i] ?? 0) * Math.sin(angle);
  }
  return [re, im];
}

export function rms(values: Float64Array): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

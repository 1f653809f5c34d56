import FFT from 'fft.js';

/** Plans by length; a route's records have a few lengths only. */
const plans = new Map<number, FFT>();
const plansMax = 12;

function planOf(length: number): FFT {
  const known = plans.get(length);
  if (known !== undefined) return known;
  if (plans.size >= plansMax) plans.clear();
  const plan = new FFT(length);
  plans.set(length, plan);
  return plan;
}

const isPowerOfTwo = (n: number) => n > 1 && (n & (n - 1)) === 0;
const nextPowerOfTwo = (n: number) => 2 ** Math.ceil(Math.log2(Math.max(2, n)));

/**
 * Discrete Fourier transform of real samples of any length: fft.js for powers of two, Bluestein's
 * chirp transform on top of it for the rest (Bluestein 1970), so that a record of 10,000 samples has
 * its lines where its duration puts them.
 *
 * @param samples - finite; not changed
 * @returns lines 0 … ⌊n/2⌋ as interleaved real and imaginary parts, not normalised
 */
export function realFft(samples: Float64Array): Float64Array {
  const n = samples.length;
  if (n < 2) return Float64Array.of(samples[0] ?? 0, 0);
  const half = Math.floor(n / 2) + 1;
  if (isPowerOfTwo(n)) {
    const plan = planOf(n);
    const out = plan.createComplexArray();
    plan.realTransform(out, samples);
    return Float64Array.from(out.slice(0, 2 * half));
  }
  return bluestein(samples, half);
}

function bluestein(samples: Float64Array, half: number): Float64Array {
  const n = samples.length;
  const m = nextPowerOfTwo(2 * n);
  const plan = planOf(m);
  const cos = new Float64Array(n);
  const sin = new Float64Array(n);
  for (let k = 0; k < n; k += 1) {
    // k² modulo 2n keeps the angle small and exact for long records.
    const angle = (Math.PI * ((k * k) % (2 * n))) / n;
    cos[k] = Math.cos(angle);
    sin[k] = Math.sin(angle);
  }
  const a = new Float64Array(2 * m);
  const b = new Float64Array(2 * m);
  for (let k = 0; k < n; k += 1) {
    const x = samples[k] ?? 0;
    a[2 * k] = x * (cos[k] ?? 0);
    a[2 * k + 1] = -x * (sin[k] ?? 0);
    for (const at of k === 0 ? [0] : [k, m - k]) {
      b[2 * at] = cos[k] ?? 0;
      b[2 * at + 1] = sin[k] ?? 0;
    }
  }
  const fa = plan.createComplexArray();
  const fb = plan.createComplexArray();
  plan.transform(fa, a as unknown as number[]);
  plan.transform(fb, b as unknown as number[]);
  for (let k = 0; k < 2 * m; k += 2) {
    const re = (fa[k] ?? 0) * (fb[k] ?? 0) - (fa[k + 1] ?? 0) * (fb[k + 1] ?? 0);
    const im = (fa[k] ?? 0) * (fb[k + 1] ?? 0) + (fa[k + 1] ?? 0) * (fb[k] ?? 0);
    fa[k] = re;
    fa[k + 1] = im;
  }
  const product = plan.createComplexArray();
  plan.inverseTransform(product, fa);
  const out = new Float64Array(2 * half);
  for (let k = 0; k < half; k += 1) {
    const [re, im, c, s] = [product[2 * k] ?? 0, product[2 * k + 1] ?? 0, cos[k] ?? 0, sin[k] ?? 0];
    out[2 * k] = re * c + im * s;
    out[2 * k + 1] = im * c - re * s;
  }
  return out;
}

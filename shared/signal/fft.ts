import FFT from 'fft.js';

/** Plans by length; a route's records have a few lengths only. */
const plans = new Map<number, FFT>();
const chirps = new Map<number, Chirp>();
const turnsOfUnity = new Map<number, Pick<Chirp, 'cos' | 'sin'>>();
const plansMax = 12;
const chirpsMax = 4;

/** Bluestein's chirp of a length and the transform of its convolution kernel. */
interface Chirp {
  cos: Float64Array;
  sin: Float64Array;
  kernel: ArrayLike<number>;
  convolutionLength: number;
}

function kept<T>(store: Map<number, T>, most: number, length: number, make: () => T): T {
  const known = store.get(length);
  if (known !== undefined) return known;
  if (store.size >= most) store.clear();
  const made = make();
  store.set(length, made);
  return made;
}

const planOf = (length: number) => kept(plans, plansMax, length, () => new FFT(length));
const isPowerOfTwo = (n: number) => n > 1 && (n & (n - 1)) === 0;

/** The smallest power of two that is at least `n`, and at least 2. */
export const nextPowerOfTwo = (n: number) => 2 ** Math.ceil(Math.log2(Math.max(2, n)));

/** fft.js takes any indexed numbers; its types only know plain arrays. */
const asNumbers = (values: Float64Array) => values as unknown as number[];

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
  if (n % 2 === 1) return oddTransform(samples, (n + 1) / 2);
  if (!isPowerOfTwo(n)) return unpack(bluestein(samples, n / 2), n / 2);
  if (n === 2) {
    const [a, b] = [samples[0] ?? 0, samples[1] ?? 0];
    return Float64Array.of(a + b, 0, a - b, 0);
  }
  // Read as complex numbers of neighbours the samples are half as many: faster than fft.js's own
  // transform of real ones.
  const packed = new Float64Array(n);
  planOf(n / 2).transform(asNumbers(packed), asNumbers(samples));
  return unpack(packed, n / 2);
}

/**
 * Lines of real samples from the transform of their neighbours as complex numbers: those of even and
 * odd samples are told apart by their symmetry.
 *
 * @param z - transform, `n` interleaved complex numbers
 * @returns lines 0 … n, interleaved
 */
function unpack(z: Float64Array, n: number): Float64Array {
  const out = new Float64Array(2 * (n + 1));
  const { cos, sin } = kept(turnsOfUnity, plansMax, 2 * n, () => unityOf(2 * n));
  out[0] = (z[0] as number) + (z[1] as number);
  out[2 * n] = (z[0] as number) - (z[1] as number);
  for (let k = 1; k < n; k += 1) {
    const mirror = 2 * (n - k);
    const at = 2 * k;
    const evenRe = 0.5 * ((z[at] as number) + (z[mirror] as number));
    const evenIm = 0.5 * ((z[at + 1] as number) - (z[mirror + 1] as number));
    const oddRe = 0.5 * ((z[at + 1] as number) + (z[mirror + 1] as number));
    const oddIm = 0.5 * ((z[mirror] as number) - (z[at] as number));
    const c = cos[k] as number;
    const s = sin[k] as number;
    out[at] = evenRe + oddRe * c + oddIm * s;
    out[at + 1] = evenIm + oddIm * c - oddRe * s;
  }
  return out;
}

/**
 * Real signal of `length` points from its lower lines: the sum over k of 2 Re(line[k] e^{2πi jk/length}),
 * line 0 left out. Any duration can so be sampled anew on a power of two, band-limited by the lines
 * that are given.
 *
 * @param lines - interleaved, lines 0 … K with K < length / 2
 * @param length - a power of two, at least 4
 * @throws {RangeError} for another length
 */
export function realFromLines(lines: Float64Array, length: number): Float64Array {
  if (!isPowerOfTwo(length) || length < 4)
    throw new RangeError('The length must be a power of two.');
  const half = length >> 1;
  const count = Math.min(lines.length >> 1, half);
  // Even samples become real, odd ones imaginary parts of half as many complex numbers. Line k meets
  // line k and half - k of the wanted signal. fft.js divides its inverse by the number of points.
  const packed = new Float64Array(length);
  const { cos, sin } = kept(turnsOfUnity, plansMax, length, () => unityOf(length));
  for (let k = 1; k < count; k += 1) {
    const re = half * (lines[2 * k] as number);
    const im = half * (lines[2 * k + 1] as number);
    const [c, s] = [cos[k] as number, sin[k] as number];
    const mirror = 2 * (half - k);
    const at = 2 * k;
    packed[at] = (packed[at] as number) + re - (re * s + im * c);
    packed[at + 1] = (packed[at + 1] as number) + im + (re * c - im * s);
    // conj(X[k]) stands half a circle on: with the turn of half − k, which is −conj of that of k.
    packed[mirror] = (packed[mirror] as number) + re + (re * s + im * c);
    packed[mirror + 1] = (packed[mirror + 1] as number) - im + (re * c - im * s);
  }
  const out = new Float64Array(length);
  planOf(half).inverseTransform(asNumbers(out), asNumbers(packed));
  return out;
}

/** Cosine and sine of k turns over `length`, k below half of it. */
function unityOf(length: number): Pick<Chirp, 'cos' | 'sin'> {
  const half = length >> 1;
  const cos = new Float64Array(half);
  const sin = new Float64Array(half);
  for (let k = 0; k < half; k += 1) {
    cos[k] = Math.cos((2 * Math.PI * k) / length);
    sin[k] = Math.sin((2 * Math.PI * k) / length);
  }
  return { cos, sin };
}

function chirpOf(n: number): Chirp {
  // A circular convolution of 2n − 1 points holds all differences of two indices.
  const m = nextPowerOfTwo(2 * n - 1);
  const cos = new Float64Array(n);
  const sin = new Float64Array(n);
  const b = new Float64Array(2 * m);
  for (let k = 0; k < n; k += 1) {
    // k² modulo 2n keeps the angle small and exact for long records.
    const angle = (Math.PI * ((k * k) % (2 * n))) / n;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    cos[k] = c;
    sin[k] = s;
    for (const at of k === 0 ? [0] : [k, m - k]) {
      b[2 * at] = c;
      b[2 * at + 1] = s;
    }
  }
  const kernel = new Float64Array(2 * m);
  planOf(m).transform(asNumbers(kernel), asNumbers(b));
  return { cos, sin, kernel, convolutionLength: m };
}

function oddTransform(samples: Float64Array, half: number): Float64Array {
  const n = samples.length;
  const complex = new Float64Array(2 * n);
  for (let i = 0; i < n; i += 1) complex[2 * i] = samples[i] ?? 0;
  return bluestein(complex, n).slice(0, 2 * half);
}

/** Transform of `n` interleaved complex numbers by the chirp. */
function bluestein(complex: Float64Array, n: number): Float64Array {
  const { cos, sin, kernel, convolutionLength: m } = kept(chirps, chirpsMax, n, () => chirpOf(n));
  const plan = planOf(m);
  const a = new Float64Array(2 * m);
  for (let k = 0; k < n; k += 1) {
    const [re, im, c, s] = [complex[2 * k] ?? 0, complex[2 * k + 1] ?? 0, cos[k] ?? 0, sin[k] ?? 0];
    a[2 * k] = re * c + im * s;
    a[2 * k + 1] = im * c - re * s;
  }
  const fa = new Float64Array(2 * m);
  plan.transform(asNumbers(fa), asNumbers(a));
  for (let k = 0; k < 2 * m; k += 2) {
    const [aRe, aIm, bRe, bIm] = [fa[k] ?? 0, fa[k + 1] ?? 0, kernel[k] ?? 0, kernel[k + 1] ?? 0];
    fa[k] = aRe * bRe - aIm * bIm;
    fa[k + 1] = aRe * bIm + aIm * bRe;
  }
  plan.inverseTransform(asNumbers(a), asNumbers(fa));
  const out = new Float64Array(2 * n);
  for (let k = 0; k < n; k += 1) {
    const [re, im, c, s] = [a[2 * k] ?? 0, a[2 * k + 1] ?? 0, cos[k] ?? 0, sin[k] ?? 0];
    out[2 * k] = re * c + im * s;
    out[2 * k + 1] = im * c - re * s;
  }
  return out;
}

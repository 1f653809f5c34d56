/** Powers of ten that a double holds exactly. */
export const exactPowers = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));

/** 2^27 + 1: splits a double into two halves whose products are exact (Veltkamp; Dekker 1971). */
const splitter = 134_217_729;

/** Rounding error of a product, exact: `a * b = product + error`. */
function productError(a: number, b: number, product: number): number {
  const ca = splitter * a;
  const aHigh = ca - (ca - a);
  const aLow = a - aHigh;
  const cb = splitter * b;
  const bHigh = cb - (cb - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}

/**
 * The double nearest to `(high * 10^lowDigits + low) * 10^power`, reckoned in twice the precision.
 *
 * `Number` costs a text a number; programs that print 16 to 19 digits would spend most of the
 * reading there. The error of the two-fold arithmetic stays below 2^-95 of the value; where so
 * much could change the rounding (about one number in 2^40) the function declines.
 *
 * @param high - whole number below 10^15
 * @param low - whole number below 10^15
 * @param lowDigits - 1 to 15
 * @param power - power of ten
 * @returns the correctly rounded value, or NaN where it declines
 */
export function scaleWideDecimal(
  high: number,
  low: number,
  lowDigits: number,
  power: number,
): number {
  if (power > 22 || power < -44 || high === 0) return NaN;
  // high * 10^lowDigits + low as an unevaluated sum of two doubles.
  const shift = exactPowers[lowDigits]!;
  const product = high * shift;
  const rough = product + low;
  const lost = low - (rough - product) + productError(high, shift, product);
  let head = rough + lost;
  let tail = lost - (head - rough);

  if (power > 0) {
    const scale = exactPowers[power]!;
    const scaled = head * scale;
    tail = productError(head, scale, scaled) + tail * scale;
    head = scaled;
  }
  // Below 10^-22 in two divisions by exact powers.
  for (let left = -power; left > 0; left -= 22) {
    const scale = exactPowers[left > 22 ? 22 : left]!;
    const quotient = head / scale;
    const back = quotient * scale;
    tail = (head - back - productError(quotient, scale, back) + tail) / scale;
    head = quotient;
  }

  const doubt = Math.abs(head) * 2 ** -95;
  const value = head + (tail - doubt);
  return value === head + (tail + doubt) ? value : NaN;
}

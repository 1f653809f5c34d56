/**
 * The middle of some numbers, the mean of the two in the middle where their count is even.
 *
 * @param values - finite, in any order; not changed
 * @returns null without values
 *
 * @example
 * median([3, 1, 2, 10]) // => 2.5
 */
export function median(values: readonly number[]): number | null {
  const sorted = [...values].sort((a, b) => a - b);
  const upper = sorted[sorted.length >> 1];
  if (upper === undefined) return null;
  const lower = sorted[(sorted.length - 1) >> 1] ?? upper;
  return (lower + upper) / 2;
}

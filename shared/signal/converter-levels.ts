/**
 * How many different values a record has, counted up to a limit: a converter that uses a few of its
 * levels only draws stairs.
 *
 * @param samples - as recorded; non-finite ones are passed over
 * @param most - counting ends above it
 * @returns up to `most + 1`
 */
export function countLevels(samples: Float64Array, most: number): number {
  const seen = new Set<number>();
  for (const value of samples) {
    if (Number.isFinite(value)) seen.add(value);
    if (seen.size > most) break;
  }
  return seen.size;
}

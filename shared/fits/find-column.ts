/**
 * Finds the column of a size in a table of ranges that read "above the limit before, up to and
 * including this one", as ISO 286 and ISO 492 do.
 *
 * @param sizeMm - finite and > 0
 * @param upToMm - upper limits of the ranges, ascending, mm
 * @returns the index; `undefined` above the last limit
 *
 * @example
 * findColumn(50, [30, 50, 80]) // => 1
 */
export function findColumn(sizeMm: number, upToMm: readonly number[]): number | undefined {
  const index = upToMm.findIndex((limit) => sizeMm <= limit);
  return index < 0 ? undefined : index;
}

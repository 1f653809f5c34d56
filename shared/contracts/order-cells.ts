import { z } from 'zod';
import type { OrderLine } from '../signal/screening-types.ts';

/** The strip's cells alone, for lists: order, prominence in dB and whether something else explains it. */
export const orderCell = z.object({
  order: z.number(),
  prominenceDb: z.number(),
  significant: z.boolean(),
  explainedBy: z.string().nullable(),
});
export type OrderCell = z.infer<typeof orderCell>;

/**
 * A line counts as standing out where noise alone gives as much less than once in a hundred: with
 * thirty orders looked at, a stray cell in a strip is rare and a run of them is not chance.
 */
const standsOutBelowP = 0.01;

/**
 * The order strip's cells from a screening's order table.
 *
 * @param orders - the order table; `prominenceDb` in dB, `pNoise` 0–1
 * @returns one cell an order, in the same sequence
 *
 * @example
 * orderCellsOf([]) // => []
 */
export function orderCellsOf(orders: readonly OrderLine[]): OrderCell[] {
  return orders.map((line) => ({
    order: line.order,
    prominenceDb: line.prominenceDb,
    significant: line.pNoise < standsOutBelowP,
    explainedBy: line.explainedBy,
  }));
}

import { z } from 'zod';
import { standsOut } from '../signal/harmonic-run.ts';
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
 * The order strip's cells from a screening's order table. A cell counts as standing out by the same
 * rule as the harmonic run, so that strip and verdict never tell different stories.
 *
 * @param orders - the order table; `prominenceDb` in dB, `pNoise` 0–1
 * @returns one cell an order, in the same sequence
 *
 * @example
 * orderCellsOf([]) // => []
 */
export function orderCellsOf(orders: readonly OrderLine[]): OrderCell[] {
  const strongestMmPerS = Math.max(0, ...orders.map((line) => line.velocityMmPerSRms));
  return orders.map((line) => ({
    order: line.order,
    prominenceDb: line.prominenceDb,
    significant: standsOut(line, strongestMmPerS),
    explainedBy: line.explainedBy,
  }));
}

import { z } from 'zod';

export const pageSizes = [25, 50, 100, 200] as const;

/** The part of a list's query that every list has: search, sort, page. */
export function listQuery<const Columns extends readonly [string, ...string[]]>(
  sortColumns: Columns,
) {
  return z.object({
    search: z.string().trim().max(120).optional(),
    sort: z.enum(sortColumns).default(sortColumns[0]),
    direction: z.enum(['asc', 'desc']).default('asc'),
    /** From 1. */
    page: z.coerce.number().int().min(1).max(100_000).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  });
}

/** One page of a list; `total` counts what the filters let through. */
export function listResponse<Item extends z.ZodType>(item: Item) {
  return z.object({
    items: z.array(item),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  });
}

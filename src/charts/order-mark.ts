/** What is known of one order, as the marks need it; a subset of the screening's order table. */
export interface OrderMark {
  order: number;
  /** How far the line stands out of its local floor, dB. */
  prominenceDb: number;
  /** Whether noise alone is too unlikely to explain the line. */
  significant: boolean;
  /** What else explains the line, or null. */
  explainedBy: string | null;
}

const fractionNames: Readonly<Record<string, string>> = {
  '0.333': '1/3',
  '0.500': '1/2',
  '0.667': '2/3',
};

/** "1/3", "1/2", "4", "2.5": as an order is said. */
export function orderName(order: number): string {
  const fraction = fractionNames[order.toFixed(3)];
  if (fraction !== undefined) return fraction;
  return String(Math.round(order * 100) / 100);
}

export function isWholeOrder(order: number): boolean {
  return Math.abs(order - Math.round(order)) < 1e-6 && order > 0.5;
}

/** "1–7, 9, 1/2": runs of whole orders drawn together, the others one by one behind them. */
export function orderListText(orders: readonly number[]): string {
  const sorted = [...orders].sort((a, b) => a - b);
  const runs: { from: number; to: number }[] = [];
  for (const order of sorted.filter(isWholeOrder).map((whole) => Math.round(whole))) {
    const last = runs[runs.length - 1];
    if (last !== undefined && order === last.to + 1) last.to = order;
    else runs.push({ from: order, to: order });
  }
  const whole = runs.flatMap(({ from, to }) =>
    to - from >= 2 ? [`${from}–${to}`] : from === to ? [`${from}`] : [`${from}`, `${to}`],
  );
  const others = sorted.filter((order) => !isWholeOrder(order)).map(orderName);
  return [...whole, ...others].join(', ');
}

const shortestRun = 3;

/**
 * The orders that speak for looseness: unexplained standing whole orders of the run, and standing
 * fractions. Once per turn alone, which every machine shows, is none of them.
 *
 * @param run - the screening's run; without it (lists) whole orders count from three in a row, where
 *   an explained order in between does not break the row
 */
export function evidenceOrders(
  marks: readonly OrderMark[],
  run?: { from: number; to: number; length: number } | null,
): ReadonlySet<number> {
  const standing = marks.filter((mark) => mark.significant);
  const whole = standing.filter((mark) => isWholeOrder(mark.order));
  const inRun = run
    ? whole.filter(({ order }) => run.length > 0 && order >= run.from && order <= run.to)
    : rowsOf(whole).flatMap((row) => (row.length >= shortestRun ? row : []));
  const fractions = standing.filter((mark) => !isWholeOrder(mark.order));
  return new Set(
    [...inRun, ...fractions].filter((mark) => mark.explainedBy === null).map((mark) => mark.order),
  );
}

/** Whole orders in rows without a missing one. */
function rowsOf(whole: readonly OrderMark[]): OrderMark[][] {
  const rows: OrderMark[][] = [];
  for (const mark of [...whole].sort((a, b) => a.order - b.order)) {
    const row = rows[rows.length - 1];
    const last = row?.[row.length - 1];
    if (row && last && mark.order - last.order < 1.01) row.push(mark);
    else rows.push([mark]);
  }
  return rows;
}

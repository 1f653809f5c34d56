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

const fractions: Readonly<Record<string, string>> = {
  '0.333': '1/3',
  '0.500': '1/2',
  '0.667': '2/3',
};

/** "1/3", "1/2", "4", "2.5": as an order is said. */
export function orderName(order: number): string {
  const fraction = fractions[order.toFixed(3)];
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

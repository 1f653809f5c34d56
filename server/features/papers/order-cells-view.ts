import type { OrderCell } from '#shared/contracts/order-cells.ts';

/** A line this far out of its floor fills its cell, as on the pages. */
const fullCellDb = 36;

export type CellFill = 'evidence' | 'standing' | 'explained' | 'floor';

export interface CellView {
  order: number;
  isWhole: boolean;
  /** Filled part of the cell's height, 0–1. */
  share: number;
  fill: CellFill;
}

const isWhole = (order: number) => order > 0.5 && Math.abs(order - Math.round(order)) < 1e-6;

/**
 * The cells of the order strip: unexplained whole orders of the run and unexplained fractions speak
 * for looseness; once per turn alone, which every machine shows, does not.
 */
export function cellViews(
  cells: readonly OrderCell[],
  run: { from: number; to: number; length: number },
): CellView[] {
  return cells
    .filter(({ order }) => order < 1 || Math.abs(order * 2 - Math.round(order * 2)) < 1e-3)
    .filter(({ order }) => order <= 20)
    .map((cell) => {
      const whole = isWhole(cell.order);
      const inRun = run.length > 0 && cell.order >= run.from && cell.order <= run.to;
      const fill: CellFill = !cell.significant
        ? 'floor'
        : cell.explainedBy !== null
          ? 'explained'
          : !whole || inRun
            ? 'evidence'
            : 'standing';
      return {
        order: cell.order,
        isWhole: whole,
        share: Math.min(1, Math.max(0, cell.prominenceDb / fullCellDb)),
        fill,
      };
    });
}

/** "1–7, 9": the whole orders that stand out unexplained, rows of three and more drawn together. */
export function standingOrdersText(cells: readonly OrderCell[]): string {
  const orders = cells
    .filter(({ order, significant, explainedBy }) => {
      return significant && explainedBy === null && isWhole(order);
    })
    .map(({ order }) => Math.round(order))
    .sort((a, b) => a - b);
  const rows: number[][] = [];
  for (const order of orders) {
    const row = rows.at(-1);
    if (row?.at(-1) === order - 1) row.push(order);
    else rows.push([order]);
  }
  const text = rows.flatMap((row) =>
    row.length >= 3 ? [`${row[0]}–${row.at(-1)}`] : row.map((order) => String(order)),
  );
  return text.join(', ') || 'none';
}

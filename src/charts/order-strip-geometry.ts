import {
  evidenceOrders,
  isWholeOrder,
  orderListText,
  orderName,
  type OrderMark,
} from './order-mark.ts';

/** `standing`: out of its floor, but nothing that speaks for looseness, such as once per turn alone. */
export type StripFill = 'evidence' | 'standing' | 'explained' | 'floor';

export interface StripCell {
  order: number;
  x: number;
  width: number;
  /** Filled part of the cell's height, 0–1. */
  share: number;
  fill: StripFill;
  /** False where the record says nothing of this order (outside its band). */
  known: boolean;
  mark: OrderMark | null;
}

/** A line this far out of its floor fills its cell. */
export const fullCellDb = 36;

const lastOrder = 20;

/** The strip's places: a third, a half, two thirds, then every order with the half orders between. */
export const stripOrders: readonly number[] = [
  1 / 3,
  1 / 2,
  2 / 3,
  ...Array.from({ length: lastOrder * 2 - 1 }, (_, index) => 1 + index / 2),
];

const wholeWeight = 5;
const partWeight = 2;

/** The cells of a strip `width` units wide, whole orders broad and the others slivers. */
export function evenStrip(marks: readonly OrderMark[], width: number, gap = 1): StripCell[] {
  const evidence = evidenceOrders(marks);
  const weights = stripOrders.map((order) => (isWholeOrder(order) ? wholeWeight : partWeight));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const scale = (width - gap * (stripOrders.length - 1)) / total;
  let x = 0;
  return stripOrders.map((order, index) => {
    const cellWidth = (weights[index] ?? partWeight) * scale;
    const cell = cellOf(order, marks, evidence, x, cellWidth);
    x += cellWidth + gap;
    return cell;
  });
}

/** The cells under a spectrum: each centred on its order's place, those out of view left out. */
export function alignedStrip(
  marks: readonly OrderMark[],
  view: {
    fromOrder: number;
    toOrder: number;
    width: number;
    run?: { from: number; to: number; length: number } | null;
  },
): StripCell[] {
  const evidence = evidenceOrders(marks, view.run);
  const perOrder = view.width / (view.toOrder - view.fromOrder);
  if (!Number.isFinite(perOrder) || perOrder <= 0) return [];
  return stripOrders.flatMap((order) => {
    const centre = (order - view.fromOrder) * perOrder;
    const cellWidth = Math.min(
      isWholeOrder(order) ? 34 : 10,
      Math.max(2, perOrder * (isWholeOrder(order) ? 0.6 : 0.12)),
    );
    if (centre < 0 || centre > view.width) return [];
    return [cellOf(order, marks, evidence, centre - cellWidth / 2, cellWidth)];
  });
}

function cellOf(
  order: number,
  marks: readonly OrderMark[],
  evidence: ReadonlySet<number>,
  x: number,
  width: number,
): StripCell {
  const mark = marks.find((candidate) => Math.abs(candidate.order - order) < 0.01) ?? null;
  return {
    order,
    x,
    width,
    share: mark === null ? 0 : Math.min(1, Math.max(0, mark.prominenceDb / fullCellDb)),
    fill: fillOf(mark, evidence),
    known: mark !== null,
    mark,
  };
}

function fillOf(mark: OrderMark | null, evidence: ReadonlySet<number>): StripFill {
  if (mark === null || !mark.significant) return 'floor';
  if (mark.explainedBy !== null) return 'explained';
  return evidence.has(mark.order) ? 'evidence' : 'standing';
}

/** The strip in words, for who does not see it. */
export function orderStripText(marks: readonly OrderMark[]): string {
  if (marks.length === 0) return 'Orders: not known, the record could not be judged.';
  const standing = marks.filter((mark) => mark.significant && mark.explainedBy === null);
  const explained = marks.filter((mark) => mark.significant && mark.explainedBy !== null);
  const sentences = [
    standing.length === 0
      ? 'No order stands out of the noise unexplained.'
      : `Orders that stand out: ${orderListText(standing.map((mark) => mark.order))}.`,
  ];
  if (explained.length > 0) {
    const list = explained.map((mark) => `${orderName(mark.order)} (${mark.explainedBy})`);
    sentences.push(`Explained by something else: ${list.join(', ')}.`);
  }
  return sentences.join(' ');
}

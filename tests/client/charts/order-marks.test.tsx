import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import './browser-stubs.ts';
import {
  evidenceOrders,
  orderListText,
  orderName,
  type OrderMark,
} from '#src/charts/order-mark.ts';
import {
  alignedStrip,
  evenStrip,
  fullCellDb,
  orderStripText,
  stripOrders,
} from '#src/charts/order-strip-geometry.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';

afterEach(cleanup);

function mark(order: number, overrides: Partial<OrderMark> = {}): OrderMark {
  return { order, prominenceDb: 20, significant: true, explainedBy: null, ...overrides };
}

describe('naming orders', () => {
  it('writes fractions as they are said', () => {
    expect([1 / 3, 0.5, 2 / 3, 1, 2.5].map(orderName)).toEqual(['1/3', '1/2', '2/3', '1', '2.5']);
  });

  it('draws runs of whole orders together', () => {
    expect(orderListText([3, 1, 2, 1.5, 5, 6, 9])).toBe('1–3, 5, 6, 9, 1.5');
  });
});

describe('what counts as evidence', () => {
  it('is never once per turn alone', () => {
    expect(evidenceOrders([mark(1)])).toEqual(new Set());
    expect(evidenceOrders([mark(1), mark(2)])).toEqual(new Set());
  });

  it('is three orders in a row, an explained one in between left out', () => {
    const marks = [mark(1), mark(2, { explainedBy: 'line frequency × 2' }), mark(3), mark(7)];
    expect(evidenceOrders(marks)).toEqual(new Set([1, 3]));
  });

  it('follows the run of the screening where there is one', () => {
    const marks = [mark(1), mark(2), mark(3), mark(4)];
    expect(evidenceOrders(marks, { from: 2, to: 3, length: 2 })).toEqual(new Set([2, 3]));
    expect(evidenceOrders(marks, { from: 0, to: 0, length: 0 })).toEqual(new Set());
  });
});

describe('the strip', () => {
  it('has a place for a third, a half, two thirds and each order to twenty', () => {
    const whole = stripOrders.filter((order) => Number.isInteger(order));
    expect(whole).toEqual(Array.from({ length: 20 }, (_, i) => i + 1));
    expect(stripOrders.slice(0, 3)).toEqual([1 / 3, 1 / 2, 2 / 3]);
  });

  it('lays its cells side by side over the whole width', () => {
    const cells = evenStrip([], 172);
    const last = cells[cells.length - 1];
    expect((last?.x ?? 0) + (last?.width ?? 0)).toBeCloseTo(172, 9);
    for (const [i, cell] of cells.entries()) {
      const next = cells[i + 1];
      if (next) expect(next.x).toBeGreaterThanOrEqual(cell.x + cell.width);
    }
  });

  it('fills a cell by how far the line stands out, between empty and full', () => {
    const shares = [-5, 0, fullCellDb / 2, fullCellDb, 99].map((prominenceDb) => {
      const cells = evenStrip([mark(5, { prominenceDb })], 172);
      return cells.find((cell) => cell.order === 5)?.share;
    });
    expect(shares).toEqual([0, 0, 0.5, 1, 1]);
  });

  it('tells an order that was not looked at from a quiet one', () => {
    const cells = evenStrip([mark(2, { significant: false, prominenceDb: 0 })], 172);
    expect(cells.find((cell) => cell.order === 2)?.known).toBe(true);
    expect(cells.find((cell) => cell.order === 3)?.known).toBe(false);
  });

  it('stands under the spectrum with each cell centred on its order', () => {
    const cells = alignedStrip([mark(4)], { fromOrder: 0, toOrder: 10, width: 1000 });
    const fourth = cells.find((cell) => cell.order === 4);
    expect((fourth?.x ?? 0) + (fourth?.width ?? 0) / 2).toBeCloseTo(400, 9);
    expect(cells.some((cell) => cell.order > 10)).toBe(false);
  });
});

describe('the strip in words', () => {
  it('lists what stands out and what is explained', () => {
    const marks = [
      mark(1),
      mark(2),
      mark(3),
      mark(6, { explainedBy: 'vane pass' }),
      mark(9, { significant: false }),
    ];
    render(<OrderStrip marks={marks} />);
    screen.getByRole('img', {
      name: 'Orders that stand out: 1–3. Explained by something else: 6 (vane pass).',
    });
  });

  it('says when nothing stands out and when nothing is known', () => {
    expect(orderStripText([mark(1, { significant: false })])).toMatch(/^No order stands out/u);
    expect(orderStripText([])).toMatch(/could not be judged/u);
  });
});

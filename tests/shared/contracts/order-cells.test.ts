import { describe, expect, it } from 'vitest';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import { anOrderLine } from '#tests/support/screening-result.ts';

describe('the cells of the order strip', () => {
  it('stand out where neither noise nor a mere trace explains the line', () => {
    const cells = orderCellsOf([
      anOrderLine(1),
      anOrderLine(2, { pNoise: 0.2 }),
      anOrderLine(3, { velocityMmPerSRms: 0.001 }),
      anOrderLine(4, { explainedBy: 'line frequency' }),
    ]);
    expect(
      cells.map(({ order, significant, explainedBy }) => [order, significant, explainedBy]),
    ).toEqual([
      [1, true, null],
      [2, false, null],
      [3, false, null],
      [4, true, 'line frequency'],
    ]);
  });
});

import type { OrderCell } from '#shared/contracts/order-cells.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { cellViews, type CellFill } from './order-cells-view.ts';
import { decadesOf, highestPath, placeOn, tickText, ticksOf, type Axis } from './plot-geometry.ts';
import { contentWidth, ink, margin, type Ink, type Sheet } from './sheet.ts';

export interface SpectrumData {
  stepHz: number;
  /** mm/s rms, line by line. */
  velocityMmPerSRms: Float64Array;
  speedHz: number | null;
  orders: readonly OrderCell[];
  run: { from: number; to: number; length: number };
}

const plotHeight = 118;
const stripHeight = 20;
const leftRoom = 34;
const shownOrders = 20.6;
const fillInk: Readonly<Record<CellFill, Ink>> = {
  evidence: ink.evidence,
  standing: ink.full,
  explained: ink.explained,
  floor: ink.hairline,
};

/** "0.001", "10": plain as long as it fits before the axis. */
const decadeText = (decade: number): string =>
  decade < -5 ? `10^−${-decade}` : formatFixed(10 ** decade, Math.max(0, -decade));

/** The spectrum with a logarithmic height, and under it the order strip in line with the orders. */
export function drawSpectrum(sheet: Sheet, data: SpectrumData): void {
  const { doc } = sheet;
  const lastHz = (data.velocityMmPerSRms.length - 1) * data.stepHz;
  const toHz = data.speedHz === null ? lastHz : Math.min(lastHz, shownOrders * data.speedHz);
  const heights = data.velocityMmPerSRms.map((value) =>
    value > 0 ? Math.log10(value) : -Infinity,
  );
  const within = data.velocityMmPerSRms.subarray(0, Math.ceil(toHz / data.stepHz) + 1);
  const decades = decadesOf(within.reduce((most, value) => Math.max(most, value), 0));
  const x: Axis = { from: 0, to: toHz, start: margin + leftRoom, length: contentWidth - leftRoom };
  const y: Axis = { ...decades, start: sheet.y + 15 + plotHeight, length: -plotHeight };
  const top = y.start - plotHeight;
  sheet.textAt('Velocity, mm/s rms, over frequency, Hz', margin, sheet.y, contentWidth, {
    size: 7.5,
    color: ink.soft,
  });
  for (let decade = decades.from; decade <= decades.to; decade += 1) {
    const at = placeOn(y, decade);
    sheet.rule(at, ink.hairline, x.start, x.length);
    sheet.textAt(decadeText(decade), margin, at - 5, leftRoom - 4, {
      size: 7,
      face: 'figures',
      color: ink.soft,
      align: 'right',
    });
  }
  drawPath(sheet, highestPath(heights, data.stepHz, x, y), ink.full, 0.6);
  doc.rect(x.start, top, x.length, plotHeight).lineWidth(0.6).strokeColor(ink.full).stroke();
  const ticks = ticksOf(0, toHz, 12);
  for (const tick of ticks) {
    const at = placeOn(x, tick);
    doc
      .moveTo(at, y.start)
      .lineTo(at, y.start + 2.5)
      .lineWidth(0.5)
      .strokeColor(ink.full)
      .stroke();
    sheet.textAt(tickText(tick, ticks), at - 20, y.start + 3, 40, {
      size: 7,
      face: 'figures',
      color: ink.soft,
      align: 'center',
    });
  }
  sheet.y = y.start + 15;
  if (data.speedHz !== null && data.orders.length > 0) drawStrip(sheet, data, x, data.speedHz);
}

function drawStrip(sheet: Sheet, data: SpectrumData, x: Axis, speedHz: number): void {
  const { doc } = sheet;
  const perOrder = (speedHz / (x.to - x.from)) * x.length;
  const top = sheet.y;
  for (const cell of cellViews(data.orders, data.run)) {
    const centre = placeOn(x, cell.order * speedHz);
    const width = cell.isWhole ? Math.min(14, perOrder * 0.6) : Math.min(4, perOrder * 0.16);
    if (centre + width / 2 > x.start + x.length) continue;
    const left = centre - width / 2;
    doc.rect(left, top, width, stripHeight).lineWidth(0.4).strokeColor(ink.hairline).stroke();
    const filled = stripHeight * cell.share;
    doc
      .rect(left, top + stripHeight - filled, width, filled)
      .fillColor(fillInk[cell.fill])
      .fill();
    // Told by shape too: what something else explains is crossed out.
    if (cell.fill === 'explained') {
      doc
        .moveTo(left, top)
        .lineTo(left + width, top + stripHeight)
        .lineWidth(0.6)
        .strokeColor(ink.full)
        .stroke();
    }
    if (cell.isWhole && perOrder > 9) {
      sheet.textAt(`${Math.round(cell.order)}`, centre - 10, top + stripHeight + 1, 20, {
        size: 7,
        face: cell.fill === 'evidence' ? 'strong' : 'text',
        color: cell.fill === 'evidence' ? ink.evidence : ink.soft,
        align: 'center',
      });
    }
  }
  sheet.textAt('Orders', margin, top + 5, leftRoom - 4, {
    size: 7,
    color: ink.soft,
    align: 'right',
  });
  sheet.y = top + stripHeight + 11;
  sheet.textAt(
    'Filled by how far the line stands out of its floor; vermilion with a bold number speaks for looseness, crossed out is explained by something else.',
    margin + leftRoom,
    sheet.y,
    contentWidth - leftRoom,
    { size: 6.5, color: ink.faint },
  );
  sheet.y += 10;
}

/** A line through the points. */
export function drawPath(
  sheet: Sheet,
  points: readonly (readonly [number, number])[],
  color: Ink,
  width: number,
): void {
  const [first, ...rest] = points;
  if (first === undefined) return;
  const { doc } = sheet;
  doc.moveTo(first[0], first[1]);
  for (const [x, y] of rest) doc.lineTo(x, y);
  doc.lineWidth(width).lineJoin('round').strokeColor(color).stroke();
}

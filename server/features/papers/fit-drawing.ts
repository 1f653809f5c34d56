import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { placeOn, tickText, ticksOf, type Axis } from './plot-geometry.ts';
import { ink, type Ink, type Sheet } from './sheet.ts';

const height = 62;
const leftRoom = 26;

const isKnown = (seat: SeatAssessment) =>
  seat.seatLimitsUm !== null || seat.interferenceUm !== null || seat.measuredUm !== null;

/** Zones of seat and ring against the zero line, the fit they allow, and what was measured, µm. */
export function drawFit(sheet: Sheet, seat: SeatAssessment, left: number, width: number): void {
  const { doc } = sheet;
  const top = sheet.y + 2;
  if (!isKnown(seat)) {
    sheet.textAt('No fit on record.', left, top + 20, width, { color: ink.faint, align: 'center' });
    return;
  }
  const { measuredUm } = seat;
  const spread = (measuredUm?.uncertainty ?? 0) * 2;
  const values = [
    0,
    ...(seat.seatLimitsUm ?? []),
    ...(seat.ringLimitsUm ?? []),
    ...[seat.interferenceUm, seat.runningUm].flatMap((one) =>
      one === null ? [] : [one.min, one.max],
    ),
    ...(measuredUm === null ? [] : [measuredUm.value - spread, measuredUm.value + spread]),
  ];
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const air = Math.max(2, (high - low) * 0.1);
  const y: Axis = { from: low - air, to: high + air, start: top + height, length: -height };
  const x = left + leftRoom;
  const columns = 4;
  const column = (width - leftRoom) / columns;
  const ticks = ticksOf(y.from, y.to, 4);
  for (const tick of ticks) {
    sheet.textAt(tickText(tick, ticks), left, placeOn(y, tick) - 4.5, leftRoom - 3, {
      size: 6.5,
      face: 'figures',
      color: ink.soft,
      align: 'right',
    });
    sheet.rule(placeOn(y, tick), ink.hairline, x, width - leftRoom);
  }
  sheet.rule(placeOn(y, 0), ink.full, x, width - leftRoom);
  const zone = (index: number, name: string, from: number, to: number, color: Ink, wash: Ink) => {
    const at = x + index * column + column * 0.22;
    const [above, below] = [placeOn(y, to), placeOn(y, from)];
    doc
      .rect(at, above, column * 0.56, Math.max(1, below - above))
      .lineWidth(0.8)
      .fillAndStroke(wash, color);
    label(index, name);
  };
  const label = (index: number, name: string) =>
    sheet.textAt(name, x + index * column - 6, top + height + 2, column + 12, {
      size: 6.5,
      color: ink.soft,
      align: 'center',
      maxLines: 1,
    });
  if (seat.seatLimitsUm !== null) {
    const name = seat.toleranceClass ?? (seat.seat === 'shaft' ? 'Shaft' : 'Bore');
    zone(0, name, ...seat.seatLimitsUm, ink.full, ink.wash);
  }
  if (seat.ringLimitsUm !== null) zone(1, 'Ring', ...seat.ringLimitsUm, ink.full, ink.paper);
  if (seat.interferenceUm !== null) {
    zone(2, 'Fit', seat.interferenceUm.min, seat.interferenceUm.max, ink.fit, ink.fitWash);
  }
  if (seat.runningUm !== null) {
    const { min, max } = seat.runningUm;
    zone(3, 'Running', min, max, ink.fit, ink.paper);
  }
  if (measuredUm !== null) {
    const centre = x + 2.5 * column;
    if (spread > 0) {
      doc
        .moveTo(centre, placeOn(y, measuredUm.value - spread))
        .lineTo(centre, placeOn(y, measuredUm.value + spread))
        .lineWidth(1)
        .strokeColor(ink.fit)
        .stroke();
    }
    doc.circle(centre, placeOn(y, measuredUm.value), 2.6).fillColor(ink.fit).fill();
    if (seat.interferenceUm === null) label(2, 'Measured');
  }
}

export const fitDrawingHeight = height + 14;

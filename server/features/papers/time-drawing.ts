import { placeOn, reachOf, samplePaths, tickText, ticksOf, type Axis } from './plot-geometry.ts';
import { ink, type Sheet } from './sheet.ts';
import { drawPath } from './spectrum-drawing.ts';

export interface TimeData {
  title: string;
  samples: ArrayLike<number>;
  /** What the whole width stands for, e.g. 0.3 s or 360°, and its unit. */
  span: number;
  spanUnit: string;
  /** Stretches of samples [from, to) near the extreme, drawn in vermilion. */
  truncated?: readonly (readonly [number, number])[];
}

const plotHeight = 66;
const leftRoom = 34;

/** A record or an averaged revolution in a part of the width; returns the height it took. */
export function drawTime(sheet: Sheet, data: TimeData, left: number, width: number): number {
  const { doc } = sheet;
  const top = sheet.y + 12;
  sheet.textAt(data.title, left, sheet.y, width, { size: 7.5, color: ink.soft, maxLines: 1 });
  const reach = reachOf(data.samples);
  const x: Axis = {
    from: 0,
    to: Math.max(1, data.samples.length - 1),
    start: left + leftRoom,
    length: width - leftRoom,
  };
  doc.rect(x.start, top, x.length, plotHeight).lineWidth(0.6).strokeColor(ink.full).stroke();
  if (reach === null) {
    sheet.textAt('No samples are kept.', x.start, top + plotHeight / 2 - 5, x.length, {
      align: 'center',
      color: ink.faint,
    });
    return plotHeight + 26;
  }
  const y: Axis = { ...reach, start: top + plotHeight, length: -plotHeight };
  const heights = ticksOf(reach.from, reach.to, 4);
  for (const tick of heights) {
    const at = placeOn(y, tick);
    sheet.rule(at, ink.hairline, x.start, x.length);
    sheet.textAt(tickText(tick, heights), left, at - 5, leftRoom - 4, {
      size: 7,
      face: 'figures',
      color: ink.soft,
      align: 'right',
    });
  }
  for (const path of samplePaths(data.samples, x, y)) drawPath(sheet, path, ink.full, 0.6);
  for (const [from, to] of data.truncated ?? []) {
    const part = Array.from(data.samples).slice(from, to);
    const partAxis: Axis = {
      from: 0,
      to: Math.max(1, part.length - 1),
      start: placeOn(x, from),
      length: placeOn(x, from + Math.max(1, part.length - 1)) - placeOn(x, from),
    };
    for (const path of samplePaths(part, partAxis, y)) drawPath(sheet, path, ink.evidence, 1.4);
  }
  const spanAxis: Axis = { ...x, from: 0, to: data.span };
  const ticks = data.spanUnit === '°' ? [0, 90, 180, 270, 360] : ticksOf(0, data.span, 5);
  for (const tick of ticks) {
    const isLast = tick === ticks.at(-1);
    const unit = data.spanUnit === '°' ? '°' : '\u00a0' + data.spanUnit;
    const at = placeOn(spanAxis, tick);
    // The last one stands inside the drawing where it would run over its edge.
    const right = Math.min(at + 25, x.start + x.length);
    sheet.textAt(
      tickText(tick, ticks) + (isLast ? unit : ''),
      right - 50,
      top + plotHeight + 2,
      50,
      {
        size: 7,
        face: 'figures',
        color: ink.soft,
        align: right < at + 25 ? 'right' : 'center',
      },
    );
  }
  return plotHeight + 26;
}

import type { ChartPalette } from './chart-palette.ts';
import { canvasFont } from './draw-overlay.ts';
import { labelsThatFit } from './label-lane.ts';
import type { PlotArea, PlotOverlay } from './plot-stage.ts';
import {
  cursorLines,
  draggedCursor,
  gripAt,
  type CursorLine,
  type SpectrumCursor,
} from './spectrum-cursor.ts';
import type { Store } from './store.ts';

const labelHeightPx = 13;

/**
 * The cursor of a spectrum over its plot: lines to take hold of, their numbers at their feet, where
 * the marks above leave room.
 *
 * @param lineStep - distance of two lines in the unit of the x axis: a family closer than that is none
 */
export function spectrumCursorOverlay(
  cursor: Store<SpectrumCursor>,
  lineStep: () => number,
  palette: ChartPalette,
): PlotOverlay {
  return {
    subscribe: cursor.subscribe,
    draw: (context, area) => {
      const view = { min: area.toX(0), max: area.toX(area.widthPx) };
      drawCursor(context, area, cursorLines(cursor.get(), view), palette);
    },
    grip: (x, reach) => {
      const grip = gripAt(cursor.get(), x, reach);
      if (grip === null) return null;
      return (to) => cursor.set(draggedCursor(cursor.get(), grip, to, lineStep()));
    },
    pick: (x) => {
      const before = cursor.get();
      const at = Math.max(0, Math.round(x / lineStep()) * lineStep());
      if (before.kind === 'free') cursor.set({ kind: 'free', at });
      else if (before.kind === 'harmonics') cursor.set({ ...before, of: Math.max(lineStep(), at) });
      else cursor.set({ ...before, about: at });
    },
  };
}

function drawCursor(
  context: CanvasRenderingContext2D,
  { heightPx, toPx }: PlotArea,
  lines: readonly CursorLine[],
  palette: ChartPalette,
): void {
  context.strokeStyle = palette.ink;
  for (const { x, isMain } of lines) {
    const px = Math.round(toPx(x)) + 0.5;
    context.lineWidth = isMain ? 1.5 : 1;
    context.setLineDash(isMain ? [] : [1, 3]);
    context.beginPath();
    context.moveTo(px, 0);
    context.lineTo(px, heightPx);
    context.stroke();
  }
  context.setLineDash([]);
  context.font = canvasFont(11, 1, 'figures');
  context.textAlign = 'center';
  context.textBaseline = 'middle';
  const labels = lines
    .filter(({ label }) => label !== '')
    .map((line) => ({
      ...line,
      x: toPx(line.x),
      width: context.measureText(line.label).width + 6,
    }));
  const mainFirst = [...labels].sort((a, b) => Number(b.isMain) - Number(a.isMain));
  for (const { x, width, label, isMain } of labelsThatFit(mainFirst, 2)) {
    const top = heightPx - labelHeightPx - 2;
    context.fillStyle = isMain ? palette.ink : palette.sheet;
    context.fillRect(x - width / 2, top, width, labelHeightPx);
    if (!isMain) context.strokeRect(x - width / 2, top, width, labelHeightPx);
    context.fillStyle = isMain ? palette.sheet : palette.ink;
    context.fillText(label, x, top + labelHeightPx / 2 + 0.5);
  }
}

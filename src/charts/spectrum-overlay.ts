import type uPlot from 'uplot';
import type { ChartPalette } from './chart-palette.ts';
import { canvasFont, drawOverlay } from './draw-overlay.ts';
import { labelsThatFit } from './label-lane.ts';
import { orderName } from './order-mark.ts';
import type { SpectrumMark } from './spectrum-data.ts';

/**
 * Marks lines of the spectrum: those of the run as stems from the axis with a head, their orders
 * written above the plot; standing fractions and single orders with a head alone; explained ones with a broken
 * grey line and what explains them.
 */
export function drawSpectrumMarks(
  plot: uPlot,
  marks: readonly SpectrumMark[],
  { unitsPerHz, heightOf }: { unitsPerHz: number; heightOf: (amplitude: number) => number },
  palette: ChartPalette,
): void {
  const yOf = (amplitude: number) => plot.valToPos(heightOf(amplitude), 'y', true);
  drawOverlay(plot, (context, pxRatio) => {
    const { left, top, width, height } = plot.bbox;
    const bottom = top + height;
    const placed = marks
      .map((mark) => ({
        mark,
        x: plot.valToPos(mark.frequencyHz * unitsPerHz, 'x', true),
        y: Math.min(bottom, Math.max(top, yOf(mark.amplitude))),
      }))
      .filter(({ x }) => x >= left && x <= left + width);

    for (const { mark, x, y } of placed) {
      if (mark.kind === 'explained') drawExplained(context, x, top, bottom, palette, pxRatio);
      else drawStanding(context, x, y, bottom, mark.kind, palette, pxRatio);
    }

    for (const { mark, x } of placed) {
      if (mark.previousAmplitude === null || mark.kind === 'explained') continue;
      const y = yOf(mark.previousAmplitude);
      if (y >= top && y <= bottom) drawPrevious(context, x, y, palette, pxRatio);
    }

    context.font = canvasFont(11, pxRatio, 'figures');
    context.textAlign = 'center';
    const labels = placed.map(({ mark, x }) => {
      const text = `${orderName(mark.order)}×`;
      return { mark, x, text, width: context.measureText(text).width };
    });
    // The run's labels come first: they are what one looks for.
    const byWeight = [...labels].sort((a, b) => weightOf(a.mark) - weightOf(b.mark));
    for (const { mark, x, text } of labelsThatFit(byWeight, 5 * pxRatio)) {
      const isEvidence = mark.kind === 'run' || mark.kind === 'fraction';
      context.fillStyle = isEvidence ? palette.evidence : palette.inkFaint;
      context.fillText(text, x, top - 5 * pxRatio);
    }

    context.font = canvasFont(11, pxRatio, 'text');
    context.textAlign = 'right';
    context.fillStyle = palette.inkSoft;
    for (const { mark, x } of placed) {
      if (mark.explainedBy === null) continue;
      context.save();
      context.translate(x + 4 * pxRatio, top + 5 * pxRatio);
      context.rotate(-Math.PI / 2);
      context.textBaseline = 'top';
      context.lineWidth = 3 * pxRatio;
      context.strokeStyle = palette.sheet;
      context.strokeText(mark.explainedBy, 0, 0, height * 0.8);
      context.fillText(mark.explainedBy, 0, 0, height * 0.8);
      context.restore();
    }
  });
}

const labelWeights = { run: 0, standing: 100, fraction: 200, explained: 300 } as const;

function weightOf(mark: SpectrumMark): number {
  return labelWeights[mark.kind] + mark.order;
}

function drawStanding(
  context: CanvasRenderingContext2D,
  x: number,
  y: number,
  bottom: number,
  kind: SpectrumMark['kind'],
  palette: ChartPalette,
  pxRatio: number,
): void {
  const colour = kind === 'standing' ? palette.inkSoft : palette.evidence;
  context.strokeStyle = colour;
  context.fillStyle = colour;
  if (kind === 'run') {
    context.lineWidth = 2 * pxRatio;
    context.beginPath();
    context.moveTo(x, bottom);
    context.lineTo(x, y);
    context.stroke();
  }
  const half = 3 * pxRatio;
  context.fillRect(x - half, y - half, 2 * half, 2 * half);
}

/** A bar across the stem where the line stood before: the line itself is hidden behind the stem. */
function drawPrevious(
  context: CanvasRenderingContext2D,
  x: number,
  y: number,
  palette: ChartPalette,
  pxRatio: number,
): void {
  const half = 5 * pxRatio;
  context.lineWidth = 4 * pxRatio;
  context.strokeStyle = palette.sheet;
  context.beginPath();
  context.moveTo(x - half, y);
  context.lineTo(x + half, y);
  context.stroke();
  context.lineWidth = 2 * pxRatio;
  context.strokeStyle = palette.inkSoft;
  context.stroke();
}

function drawExplained(
  context: CanvasRenderingContext2D,
  x: number,
  top: number,
  bottom: number,
  palette: ChartPalette,
  pxRatio: number,
): void {
  context.strokeStyle = palette.explained;
  context.lineWidth = 1.2 * pxRatio;
  context.setLineDash([5 * pxRatio, 3 * pxRatio]);
  context.beginPath();
  context.moveTo(x, top);
  context.lineTo(x, bottom);
  context.stroke();
  context.setLineDash([]);
}

import type uPlot from 'uplot';
import type { ChartPalette } from './chart-palette.ts';
import { drawOverlay } from './draw-overlay.ts';
import { mergedSpans, revolutionTimes } from './waveform-geometry.ts';

export interface TruncationMarks {
  /** Stretches spent near an extreme, s. */
  rangesS: readonly (readonly [number, number])[];
  /** Flattened by the instrument: no evidence of anything in the machine, so not in its colour. */
  instrument: boolean;
}

const closestRulesPx = 7;
const barPx = 5;

/** Rules off the turns and marks the truncated stretches, beneath the waveform itself. */
export function drawWaveformMarks(
  plot: uPlot,
  revolutionS: number | null,
  truncation: TruncationMarks | null,
  palette: ChartPalette,
): void {
  const { min, max } = plot.scales['x'] ?? {};
  if (min == null || max == null) return;
  drawOverlay(plot, (context, pxRatio) => {
    const { left, top, width, height } = plot.bbox;
    context.beginPath();
    context.rect(left, top, width, height);
    context.clip();

    if (revolutionS !== null) {
      context.strokeStyle = palette.rule;
      context.lineWidth = pxRatio;
      context.setLineDash([2 * pxRatio, 3 * pxRatio]);
      const minStepS = ((max - min) * closestRulesPx * pxRatio) / width;
      for (const atS of revolutionTimes(revolutionS, min, max, minStepS)) {
        const x = Math.round(plot.valToPos(atS, 'x', true)) + 0.5;
        context.beginPath();
        context.moveTo(x, top);
        context.lineTo(x, top + height);
        context.stroke();
      }
      context.setLineDash([]);
    }

    if (truncation === null) return;
    const spans = mergedSpans(
      truncation.rangesS.map(
        ([fromS, toS]) => [plot.valToPos(fromS, 'x', true), plot.valToPos(toS, 'x', true)] as const,
      ),
      pxRatio,
    );
    for (const [from, to] of spans) {
      const spanWidth = Math.max(pxRatio, to - from);
      context.fillStyle = truncation.instrument ? palette.hairline : palette.evidenceWash;
      context.fillRect(from, top, spanWidth, height);
      context.fillStyle = truncation.instrument ? palette.explained : palette.evidence;
      context.fillRect(from, top, spanWidth, barPx * pxRatio);
    }
  });
}

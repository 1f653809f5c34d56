import type uPlot from 'uplot';
import { formatFixed } from '#src/lib/numbers.ts';
import { figuresFont, textFont, type ChartPalette } from './chart-palette.ts';

/** Room left of the plot for the numbers, the same in every chart so that plots stand in line. */
export const leftAxisPx = 64;
export const rightMarginPx = 12;

/** Tick texts with as many decimals as the step needs, all alike. */
export function tickTexts(ticks: readonly (number | null)[], stepOrNull: number | null): string[] {
  const step = stepOrNull === null || stepOrNull === 0 ? 1 : stepOrNull;
  const digits = decimalsOf(step);
  return ticks.map((tick) => (tick === null ? '' : formatFixed(tick, digits)));
}

/** A step of 2.5 needs one decimal as one of 0.1 does: the fewest that write it exactly. */
function decimalsOf(step: number): number {
  for (let digits = 0; digits < 8; digits += 1) {
    const scaled = Math.abs(step) * 10 ** digits;
    if (scaled > 0.5 && Math.abs(scaled - Math.round(scaled)) < 1e-6 * scaled) return digits;
  }
  return 8;
}

/** On a logarithmic axis the powers of ten alone are written. */
export function decadeTexts(ticks: readonly (number | null)[]): string[] {
  return ticks.map((tick) => {
    if (tick === null || tick <= 0) return '';
    const power = Math.log10(tick);
    if (Math.abs(power - Math.round(power)) > 1e-6) return '';
    return formatFixed(tick, Math.max(0, -Math.round(power)));
  });
}

export function xAxis(palette: ChartPalette, label: string): uPlot.Axis {
  return {
    ...common(palette),
    label,
    labelSize: 20,
    size: 28,
    gap: 3,
    values: (_plot, ticks, _index, _space, step) => tickTexts(ticks, step),
  };
}

export function yAxis(palette: ChartPalette, label: string, logarithmic = false): uPlot.Axis {
  return {
    ...common(palette),
    label,
    labelSize: 20,
    size: leftAxisPx - 20,
    gap: 5,
    values: (_plot, ticks, _index, _space, step) =>
      logarithmic ? decadeTexts(ticks) : tickTexts(ticks, step),
  };
}

function common(palette: ChartPalette): uPlot.Axis {
  return {
    stroke: palette.inkFaint,
    font: figuresFont,
    labelFont: textFont,
    grid: { stroke: palette.hairline, width: 0.6 },
    ticks: { stroke: palette.rule, width: 1, size: 4 },
    border: { show: true, stroke: palette.rule, width: 1 },
  };
}

/** Drag to zoom along x, double click for the whole; no points, no legend. */
export function chartBase(): Pick<uPlot.Options, 'legend' | 'cursor' | 'padding'> {
  return {
    legend: { show: false },
    padding: [18, rightMarginPx, 0, 0],
    cursor: { y: false, drag: { x: true, y: false }, points: { show: false } },
  };
}

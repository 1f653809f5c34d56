import uPlot from 'uplot';
import { chartBase, xAxis, yAxis } from './chart-axes.ts';
import type { ChartPalette } from './chart-palette.ts';
import { frequencyUnitWords, type FrequencyUnit } from './frequency-axis.ts';
import { drawSpectrumMarks } from './spectrum-overlay.ts';
import type { SpectrumMark } from './spectrum-data.ts';
import type { ChartOptions } from './uplot-chart.tsx';

export type AmplitudeScale = 'linear' | 'log';

export interface SpectrumOptionsInput {
  palette: ChartPalette;
  frequencyUnit: FrequencyUnit;
  unitsPerHz: number;
  amplitudeScale: AmplitudeScale;
  /** Written at the axis, e.g. "mm/s peak". */
  amplitudeLabel: string;
  marks: readonly SpectrumMark[];
  hasPrevious: boolean;
  onCursor: (x: number | null) => void;
  /** The part of the x axis in sight and where it lies, in CSS pixels. */
  onView: (view: PlotView) => void;
}

export interface PlotView {
  min: number;
  max: number;
  leftPx: number;
  widthPx: number;
}

/** uPlot options of a spectrum; a pure function of what is shown. */
export function spectrumOptions(input: SpectrumOptionsInput): ChartOptions {
  const { palette, frequencyUnit, amplitudeScale, amplitudeLabel } = input;
  const logarithmic = amplitudeScale === 'log';
  const words = frequencyUnitWords[frequencyUnit];
  const previous: uPlot.Series = {
    label: 'Previous survey',
    stroke: palette.rule,
    width: 1,
    dash: [3, 2],
    points: { show: false },
  };
  return {
    ...chartBase(),
    scales: {
      x: { time: false },
      y: logarithmic
        ? { distr: 3 }
        : { range: (_plot, _min, max) => [0, max > 0 ? max * 1.06 : 1] },
    },
    axes: [
      xAxis(palette, `${words.label}, ${words.unit}`),
      yAxis(palette, amplitudeLabel, logarithmic),
    ],
    series: [
      { label: words.label },
      ...(input.hasPrevious ? [previous] : []),
      { label: 'Amplitude', stroke: palette.ink, width: 1, points: { show: false } },
    ],
    hooks: {
      draw: [(plot) => drawSpectrumMarks(plot, input.marks, input.unitsPerHz, palette)],
      setCursor: [
        (plot) => {
          const left = plot.cursor.left ?? -1;
          input.onCursor(left < 0 ? null : plot.posToVal(left, 'x'));
        },
      ],
      setScale: [(plot, key) => key === 'x' && input.onView(viewOf(plot))],
      setSize: [(plot) => input.onView(viewOf(plot))],
      ready: [(plot) => input.onView(viewOf(plot))],
    },
  };
}

function viewOf(plot: uPlot): PlotView {
  const { min, max } = plot.scales['x'] ?? {};
  return {
    min: min ?? 0,
    max: max ?? 1,
    leftPx: plot.bbox.left / uPlot.pxRatio,
    widthPx: plot.bbox.width / uPlot.pxRatio,
  };
}

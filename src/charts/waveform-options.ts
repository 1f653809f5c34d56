import { chartBase, xAxis, yAxis } from './chart-axes.ts';
import type { ChartPalette } from './chart-palette.ts';
import type { ChartOptions } from './plot-stage.ts';

export interface WaveformOptionsInput {
  palette: ChartPalette;
  /** Unit of the samples. */
  unit: string;
  onCursor: (atS: number | null) => void;
}

/** uPlot options of a time record in seconds from 0. */
export function waveformOptions(input: WaveformOptionsInput): ChartOptions {
  const { palette, unit } = input;
  return {
    ...chartBase(),
    // The x scale is told its ends: with thinned data the last point is seldom the record's end.
    scales: { x: { time: false, auto: false }, y: {} },
    axes: [xAxis(palette, 'Time, s'), yAxis(palette, unit)],
    series: [
      { label: 'Time' },
      { label: 'Waveform', stroke: palette.ink, width: 1, points: { show: false } },
    ],
    hooks: {
      setCursor: [
        (plot) => {
          const left = plot.cursor.left ?? -1;
          input.onCursor(left < 0 ? null : plot.posToVal(left, 'x'));
        },
      ],
    },
  };
}

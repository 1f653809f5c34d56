import uPlot from 'uplot';
import type { AmplitudeScale } from './amplitude-scale.ts';
import { chartBase, xAxis, yAxis } from './chart-axes.ts';
import type { ChartPalette } from './chart-palette.ts';
import { frequencyUnitWords, type FrequencyUnit } from './frequency-axis.ts';
import type { ChartOptions } from './plot-stage.ts';

export interface SpectrumOptionsInput {
  palette: ChartPalette;
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
  /** Written at the axis, e.g. "mm/s peak". */
  amplitudeLabel: string;
  onCursor: (x: number | null) => void;
  /** Where the x axis lies, in CSS pixels. */
  onPlace: (place: PlotPlace) => void;
}

export interface PlotPlace {
  leftPx: number;
  widthPx: number;
}

/** uPlot options of a spectrum; a pure function of what is shown. */
export function spectrumOptions(input: SpectrumOptionsInput): ChartOptions {
  const { palette, frequencyUnit, amplitudeScale, amplitudeLabel } = input;
  const logarithmic = amplitudeScale === 'log';
  const words = frequencyUnitWords[frequencyUnit];
  const floor: uPlot.Series = {
    label: 'Noise floor',
    stroke: palette.explained,
    width: 2,
    points: { show: false },
  };
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
      x: { time: false, auto: false },
      y: yScales[amplitudeScale],
    },
    axes: [
      xAxis(palette, `${words.label}, ${words.unit}`),
      yAxis(palette, amplitudeLabel, logarithmic),
    ],
    series: [
      { label: words.label },
      previous,
      { label: 'Amplitude', stroke: palette.ink, width: 1, points: { show: false } },
      // On top: the noise itself would hide it.
      floor,
    ],
    hooks: {
      setCursor: [
        (plot) => {
          const left = plot.cursor.left ?? -1;
          input.onCursor(left < 0 ? null : plot.posToVal(left, 'x'));
        },
      ],
      setSize: [(plot) => input.onPlace(placeOf(plot))],
      ready: [(plot) => input.onPlace(placeOf(plot))],
    },
  };
}

const yScales: Readonly<Record<AmplitudeScale, uPlot.Scale>> = {
  linear: { range: (_plot, _min, max) => [0, max > 0 ? max * 1.06 : 1] },
  log: { distr: 3 },
  db: { range: (_plot, min, max) => (max > min ? [min, max + 3] : [max - 60, max + 3]) },
};

function placeOf(plot: uPlot): PlotPlace {
  return {
    leftPx: plot.bbox.left / uPlot.pxRatio,
    widthPx: plot.bbox.width / uPlot.pxRatio,
  };
}

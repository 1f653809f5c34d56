import { useId, useMemo, useState } from 'react';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { useChartPalette } from './chart-palette.ts';
import { perHz, usableUnit, type FrequencyUnit } from './frequency-axis.ts';
import type { OrderMark } from './order-mark.ts';
import { AlignedOrderStrip } from './order-strip.tsx';
import { PlotFrame } from './plot-frame.tsx';
import { logFloor, spectrumMarks, spectrumSeries, type Spectrum } from './spectrum-data.ts';
import { spectrumOptions, type AmplitudeScale, type PlotView } from './spectrum-options.ts';
import { SpectrumTable } from './spectrum-table.tsx';
import { alignedData } from './aligned-data.ts';
import { UplotChart } from './uplot-chart.tsx';

export interface SpectrumPlotProps {
  spectrum: Spectrum;
  /** Unit of the amplitude, e.g. "mm/s". */
  unit: string;
  /** How it is measured: "peak" or "rms". */
  detector?: string;
  /** Speed of the position's shaft; without one there are no orders. */
  speedHz: number | null;
  orders: readonly OrderMark[];
  run: { from: number; to: number; length: number } | null;
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
  /** The same point at the survey before, drawn behind. */
  previous?: Spectrum | null;
  heightPx?: number;
  title?: string;
}

/** A spectrum with its run of harmonics marked and the order strip beneath it. */
export function SpectrumPlot({
  spectrum,
  unit,
  detector = 'peak',
  speedHz,
  orders,
  run,
  frequencyUnit,
  amplitudeScale,
  previous = null,
  heightPx = 300,
  title = 'Spectrum',
}: SpectrumPlotProps) {
  const palette = useChartPalette();
  const keysHintId = useId();
  const [cursorX, setCursorX] = useState<number | null>(null);
  const [view, setView] = useState<PlotView | null>(null);
  const xUnit = usableUnit(frequencyUnit, speedHz);
  const unitsPerHz = perHz(xUnit, speedHz);

  const marks = useMemo(
    () => spectrumMarks(spectrum, speedHz, orders, run, previous),
    [spectrum, speedHz, orders, run, previous],
  );
  const floor = useMemo(
    () => (amplitudeScale === 'log' ? logFloor(spectrum.amplitude) : null),
    [amplitudeScale, spectrum],
  );
  const series = useMemo(
    () => spectrumSeries(spectrum, unitsPerHz, floor),
    [spectrum, unitsPerHz, floor],
  );
  const data = useMemo(
    () =>
      alignedData(series, previous === null ? null : spectrumSeries(previous, unitsPerHz, floor)),
    [series, previous, unitsPerHz, floor],
  );
  const amplitudeLabel = `${unit} ${detector}`;
  const hasPrevious = previous !== null;
  const options = useMemo(
    () =>
      spectrumOptions({
        palette,
        frequencyUnit: xUnit,
        unitsPerHz,
        amplitudeScale,
        amplitudeLabel,
        marks,
        hasPrevious,
        onCursor: setCursorX,
        onView: (next) => setView((old) => (sameView(old, next) ? old : next)),
      }),
    [palette, xUnit, unitsPerHz, amplitudeScale, amplitudeLabel, marks, hasPrevious],
  );

  return (
    <PlotFrame
      title={title}
      keysHintId={keysHintId}
      reading={
        cursorX === null ? '' : readingAt(spectrum, cursorX / unitsPerHz, speedHz, amplitudeLabel)
      }
      caption={
        <>
          {hasPrevious && 'Broken line and cross bars: the survey before. '}
          {series.linesPerPoint > 1 &&
            `Drawn from ${spectrum.amplitude.length} lines, least and greatest of each ${(series.linesPerPoint * 2).toFixed(0)}: no peak is lost.`}
        </>
      }
      table={
        <SpectrumTable
          spectrum={spectrum}
          marks={marks}
          orders={orders}
          speedHz={speedHz}
          amplitudeLabel={amplitudeLabel}
        />
      }
    >
      <UplotChart
        options={options}
        data={data}
        heightPx={heightPx}
        label={`${title}, ${amplitudeLabel}. ${marksText(marks)}`}
        describedBy={keysHintId}
      />
      {view !== null && speedHz !== null && orders.length > 0 && (
        <div style={{ paddingLeft: `${view.leftPx}px` }}>
          <AlignedOrderStrip
            marks={orders}
            fromOrder={view.min / unitsPerHz / speedHz}
            toOrder={view.max / unitsPerHz / speedHz}
            widthPx={view.widthPx}
            run={run}
          />
        </div>
      )}
    </PlotFrame>
  );
}

function sameView(a: PlotView | null, b: PlotView): boolean {
  return (
    a !== null &&
    a.min === b.min &&
    a.max === b.max &&
    a.leftPx === b.leftPx &&
    a.widthPx === b.widthPx
  );
}

/** Frequency, order and amplitude of the line under the cursor. */
function readingAt(
  { stepHz, amplitude }: Spectrum,
  frequencyHz: number,
  speedHz: number | null,
  amplitudeLabel: string,
): string {
  const line = Math.min(amplitude.length - 1, Math.max(0, Math.round(frequencyHz / stepHz)));
  const atHz = line * stepHz;
  const parts = [
    `${formatFixed(atHz, 2)} Hz`,
    `${formatFixed(atHz * 60, 0)} 1/min`,
    ...(speedHz === null ? [] : [`${formatFixed(atHz / speedHz, 2)}×`]),
    `${formatSignificant(amplitude[line] ?? 0)} ${amplitudeLabel}`,
  ];
  return parts.join('  ');
}

function marksText(marks: ReturnType<typeof spectrumMarks>): string {
  const run = marks.filter((mark) => mark.kind === 'run').length;
  return run === 0 ? 'No run of harmonics is marked.' : `${run} lines of a run are marked.`;
}

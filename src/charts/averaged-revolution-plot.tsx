import { useId, useMemo, useState } from 'react';
import type uPlot from 'uplot';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { firstOrderSine } from './averaged-revolution.ts';
import { chartBase, xAxis, yAxis } from './chart-axes.ts';
import { useChartPalette, type ChartPalette } from './chart-palette.ts';
import { ChartTable } from './chart-table.tsx';
import { PlotFrame } from './plot-frame.tsx';
import { PointerReading } from './plot-reading.tsx';
import type { ChartOptions, PlotSource } from './plot-stage.ts';
import type { Window } from './plot-window.ts';
import { createStore } from './store.ts';
import { UplotChart } from './uplot-chart.tsx';

export interface AveragedRevolutionPlotProps {
  /** Averaged over the revolutions, one turn in equal steps. */
  turn: Float32Array;
  unit?: string;
  heightPx?: number;
  title?: string;
}

const tableRows = 36;
const wholeTurn: Window = { min: 0, max: 360 };
const nothing: Window = { min: 0, max: 0 };

/** One averaged turn against the sine that an unbalance alone would give. */
export function AveragedRevolutionPlot({
  turn,
  unit = 'mm/s',
  heightPx = 220,
  title = 'One averaged revolution',
}: AveragedRevolutionPlotProps) {
  const palette = useChartPalette();
  const keysHintId = useId();
  const [cursorDeg] = useState(() => createStore<number | null>(null));
  const [view] = useState(() => createStore<Window | null>(null));
  const sine = useMemo(() => firstOrderSine(turn), [turn]);
  const source = useMemo<PlotSource>(() => {
    const data = closedTurn(turn, sine);
    return { whole: turn.length > 0 ? wholeTurn : nothing, dataFor: () => data };
  }, [turn, sine]);
  const options = useMemo(
    () => averagedRevolutionOptions(palette, unit, cursorDeg.set),
    [palette, unit, cursorDeg],
  );
  const at = (degrees: number) => Math.round((degrees / 360) * turn.length) % turn.length;
  return (
    <PlotFrame
      title={title}
      keysHintId={keysHintId}
      reading={
        <PointerReading
          at={cursorDeg}
          read={(deg) =>
            `${formatFixed(deg, 0)}°  ${formatSignificant(turn[at(deg)] ?? 0)} ${unit}`
          }
        />
      }
      caption="Broken line: the once-per-turn part alone."
      table={
        <ChartTable
          summary="Averaged revolution as a table"
          caption={`Every ${360 / tableRows}° of ${turn.length} steps.`}
          columns={[
            { header: 'Degrees', align: 'end' },
            { header: unit, align: 'end' },
            { header: 'Once-per-turn part', align: 'end' },
          ]}
          rows={Array.from({ length: tableRows }, (_, row) => {
            const degrees = (row * 360) / tableRows;
            return [
              formatFixed(degrees, 0),
              formatSignificant(turn[at(degrees)] ?? 0),
              formatSignificant(sine[at(degrees)] ?? 0),
            ];
          })}
        />
      }
    >
      <UplotChart
        options={options}
        source={source}
        view={view}
        heightPx={heightPx}
        label={`${title}, ${unit}`}
        describedBy={keysHintId}
      />
    </PlotFrame>
  );
}

export function averagedRevolutionOptions(
  palette: ChartPalette,
  unit: string,
  onCursor: (degrees: number | null) => void,
): ChartOptions {
  return {
    ...chartBase(),
    scales: { x: { time: false, auto: false }, y: {} },
    axes: [{ ...xAxis(palette, 'Angle, °'), incrs: [15, 30, 45, 90] }, yAxis(palette, unit)],
    series: [
      { label: 'Angle' },
      {
        label: 'Once per turn',
        stroke: palette.rule,
        width: 1.2,
        dash: [5, 3],
        points: { show: false },
      },
      { label: 'Averaged', stroke: palette.ink, width: 1.5, points: { show: false } },
    ],
    hooks: {
      setCursor: [
        (plot: uPlot) => {
          const left = plot.cursor.left ?? -1;
          onCursor(left < 0 ? null : plot.posToVal(left, 'x'));
        },
      ],
    },
  };
}

/** The first step once more at 360°, so that the turn closes. */
function closedTurn(turn: Float32Array, sine: Float64Array): uPlot.AlignedData {
  if (turn.length === 0) return [[], [], []];
  const places = Array.from({ length: turn.length + 1 }, (_, i) => i);
  return [
    places.map((i) => (i * 360) / turn.length),
    places.map((i) => sine[i % turn.length] ?? 0),
    places.map((i) => turn[i % turn.length] ?? 0),
  ];
}

import { memo, useId, useMemo, useState } from 'react';
import type { Truncation } from '#shared/signal/screening-types.ts';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { useChartPalette } from './chart-palette.ts';
import { ChartTable } from './chart-table.tsx';
import { decimateMinMax } from './decimate-min-max.ts';
import { PlotFrame } from './plot-frame.tsx';
import { PointerReading } from './plot-reading.tsx';
import type { PlotSource } from './plot-stage.ts';
import { windowWithin, type Window } from './plot-window.ts';
import { plotMaxPoints } from './spectrum-data.ts';
import { createStore, useStore, type Store } from './store.ts';
import { UplotChart } from './uplot-chart.tsx';
import { stretchesOf } from './waveform-geometry.ts';
import { waveformOptions } from './waveform-options.ts';
import { drawWaveformMarks, type TruncationMarks } from './waveform-overlay.ts';

export interface WaveformPlotProps {
  samples: Float32Array;
  sampleRateHz: number;
  unit: string;
  /** Speed of the position's shaft, for ruling off the turns. */
  speedHz: number | null;
  truncation: Truncation | null;
  /** The stretch in sight, s, where the page keeps it; null for the whole. */
  view?: Store<Window | null>;
  heightPx?: number;
  title?: string;
}

const tableParts = 40;

/** The time record with its turns ruled off and its truncated stretches marked. */
export function WaveformPlot({
  samples,
  sampleRateHz,
  unit,
  speedHz,
  truncation,
  view,
  heightPx = 220,
  title = 'Waveform',
}: WaveformPlotProps) {
  const palette = useChartPalette();
  const keysHintId = useId();
  const durationS = samples.length / sampleRateHz;
  const whole = useMemo<Window>(() => ({ min: 0, max: durationS }), [durationS]);
  const [cursorS] = useState(() => createStore<number | null>(null));
  const [ownView] = useState(() => createStore<Window | null>(null));
  const viewS = view ?? ownView;
  const source = useMemo<PlotSource>(() => {
    const revolutionS = speedHz !== null && speedHz > 0 ? 1 / speedHz : null;
    const marks = truncationMarks(truncation, sampleRateHz);
    return {
      whole,
      dataFor: (stretch) => {
        const thinned = thinnedStretch(samples, sampleRateHz, stretch);
        return [
          thinned.index.map((index) => index / sampleRateHz),
          // A gap: NaN would leave the y scale without an end.
          Array.from(thinned.value, (value) => (Number.isNaN(value) ? null : value)),
        ];
      },
      drawUnder: (plot) => drawWaveformMarks(plot, revolutionS, marks, palette),
    };
  }, [whole, samples, sampleRateHz, speedHz, truncation, palette]);
  const options = useMemo(
    () => waveformOptions({ palette, unit, onCursor: cursorS.set }),
    [palette, unit, cursorS],
  );

  return (
    <PlotFrame
      title={title}
      keysHintId={keysHintId}
      reading={
        <PointerReading
          at={cursorS}
          read={(atS) => readingAt(samples, sampleRateHz, atS, speedHz, unit)}
        />
      }
      caption={
        <>
          {captionOf(truncation, speedHz)}{' '}
          <ThinningRemark
            samples={samples}
            sampleRateHz={sampleRateHz}
            whole={whole}
            view={viewS}
          />
        </>
      }
      table={<WaveformTable samples={samples} sampleRateHz={sampleRateHz} unit={unit} />}
    >
      <UplotChart
        options={options}
        source={source}
        view={viewS}
        heightPx={heightPx}
        label={`${title}, ${unit}, ${formatSignificant(durationS)} s`}
        describedBy={keysHintId}
      />
    </PlotFrame>
  );
}

function readingAt(
  samples: Float32Array,
  sampleRateHz: number,
  atS: number,
  speedHz: number | null,
  unit: string,
): string {
  const index = Math.min(samples.length - 1, Math.max(0, Math.round(atS * sampleRateHz)));
  const value = samples[index] ?? Number.NaN;
  const parts = [
    `${formatFixed(index / sampleRateHz, 4)} s`,
    ...(speedHz === null ? [] : [`turn ${Math.floor((index / sampleRateHz) * speedHz) + 1}`]),
    Number.isNaN(value) ? 'gap' : `${formatSignificant(value)} ${unit}`,
  ];
  return parts.join('  ');
}

function truncationMarks(
  truncation: Truncation | null,
  sampleRateHz: number,
): TruncationMarks | null {
  if (truncation === null || truncation.side === 'none') return null;
  return {
    rangesS: truncation.ranges.map(
      ([from, to]) => [from / sampleRateHz, to / sampleRateHz] as const,
    ),
    instrument: truncation.instrument,
  };
}

/** With one sample beyond either end, so that the line goes on to the edge. */
function thinnedStretch(samples: Float32Array, sampleRateHz: number, { min, max }: Window) {
  return decimateMinMax(
    samples,
    Math.floor(min * sampleRateHz) - 1,
    Math.ceil(max * sampleRateHz) + 2,
    plotMaxPoints,
  );
}

function ThinningRemark({
  samples,
  sampleRateHz,
  whole,
  view,
}: {
  samples: Float32Array;
  sampleRateHz: number;
  whole: Window;
  view: Store<Window | null>;
}) {
  const { min, max } = windowWithin(useStore(view), whole);
  const inSight = Math.min(samples.length, Math.round((max - min) * sampleRateHz));
  if (inSight <= plotMaxPoints) return null;
  return `${samples.length} samples; of those too close to tell apart the least and the greatest are drawn, so no peak is lost.`;
}

function captionOf(truncation: Truncation | null, speedHz: number | null): string {
  const sentences: string[] = [];
  if (speedHz !== null) sentences.push('Broken rules: turns of the shaft.');
  if (truncation !== null && truncation.side !== 'none') {
    const side = truncation.side === 'both' ? 'both sides' : `the ${truncation.side} side`;
    sentences.push(
      truncation.instrument
        ? `Bars: flattened by the instrument on ${side}.`
        : `Bars: truncated on ${side}.`,
    );
  }
  return sentences.join(' ');
}

const WaveformTable = memo(function WaveformTable({
  samples,
  sampleRateHz,
  unit,
}: Pick<WaveformPlotProps, 'samples' | 'sampleRateHz' | 'unit'>) {
  const stretches = useMemo(
    () => stretchesOf(samples, sampleRateHz, tableParts),
    [samples, sampleRateHz],
  );
  return (
    <ChartTable
      summary="Waveform as a table"
      caption={`${samples.length} samples in ${stretches.length} equal parts.`}
      columns={[
        { header: 'From, s', align: 'end' },
        { header: 'To, s', align: 'end' },
        { header: `Least, ${unit}`, align: 'end' },
        { header: `Greatest, ${unit}`, align: 'end' },
        { header: `rms, ${unit}`, align: 'end' },
      ]}
      rows={stretches.map((part) => [
        formatFixed(part.fromS, 3),
        formatFixed(part.toS, 3),
        formatSignificant(part.min),
        formatSignificant(part.max),
        formatSignificant(part.rms),
      ])}
    />
  );
});

import { useId, useMemo, useState } from 'react';
import type uPlot from 'uplot';
import type { Truncation } from '#shared/signal/screening-types.ts';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { useChartPalette } from './chart-palette.ts';
import { ChartTable } from './chart-table.tsx';
import { decimateMinMax } from './decimate-min-max.ts';
import { PlotFrame } from './plot-frame.tsx';
import { UplotChart } from './uplot-chart.tsx';
import { stretchesOf } from './waveform-geometry.ts';
import { waveformOptions } from './waveform-options.ts';

export interface WaveformPlotProps {
  samples: Float32Array;
  sampleRateHz: number;
  unit: string;
  /** Speed of the position's shaft, for ruling off the turns. */
  speedHz: number | null;
  truncation: Truncation | null;
  heightPx?: number;
  title?: string;
}

const maxPoints = 8000;
const tableParts = 40;

/** The time record with its turns ruled off and its truncated stretches marked. */
export function WaveformPlot({
  samples,
  sampleRateHz,
  unit,
  speedHz,
  truncation,
  heightPx = 220,
  title = 'Waveform',
}: WaveformPlotProps) {
  const palette = useChartPalette();
  const keysHintId = useId();
  const durationS = samples.length / sampleRateHz;
  const [cursorS, setCursorS] = useState<number | null>(null);
  const [stretch, setStretch] = useState({ of: samples, fromS: 0, toS: durationS });
  // Another record starts as a whole, whatever part of the last one was in sight.
  const { fromS, toS } = stretch.of === samples ? stretch : { fromS: 0, toS: durationS };

  const thinned = useMemo(
    () =>
      decimateMinMax(
        samples,
        Math.floor(fromS * sampleRateHz) - 1,
        Math.ceil(toS * sampleRateHz) + 2,
        maxPoints,
      ),
    [samples, sampleRateHz, fromS, toS],
  );
  const data = useMemo<uPlot.AlignedData>(
    () => [thinned.index.map((index) => index / sampleRateHz), thinned.value],
    [thinned, sampleRateHz],
  );
  const options = useMemo(
    () =>
      waveformOptions({
        palette,
        unit,
        durationS,
        revolutionS: speedHz !== null && speedHz > 0 ? 1 / speedHz : null,
        truncation:
          truncation === null || truncation.side === 'none'
            ? null
            : {
                rangesS: truncation.ranges.map(
                  ([from, to]) => [from / sampleRateHz, to / sampleRateHz] as const,
                ),
                instrument: truncation.instrument,
              },
        onCursor: setCursorS,
        onWindow: (from, to) =>
          setStretch((old) =>
            old.of === samples && old.fromS === from && old.toS === to
              ? old
              : { of: samples, fromS: from, toS: to },
          ),
      }),
    [palette, unit, durationS, speedHz, truncation, sampleRateHz, samples],
  );

  return (
    <PlotFrame
      title={title}
      keysHintId={keysHintId}
      reading={cursorS === null ? '' : readingAt(samples, sampleRateHz, cursorS, speedHz, unit)}
      caption={captionOf(samples.length, thinned.samplesPerPoint, truncation, speedHz)}
      table={<WaveformTable samples={samples} sampleRateHz={sampleRateHz} unit={unit} />}
    >
      <UplotChart
        options={options}
        data={data}
        heightPx={heightPx}
        wholeX={{ min: 0, max: durationS }}
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

function captionOf(
  sampleCount: number,
  samplesPerPoint: number,
  truncation: Truncation | null,
  speedHz: number | null,
): string {
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
  if (samplesPerPoint > 1) {
    const per = (samplesPerPoint * 2).toFixed(0);
    sentences.push(
      `${sampleCount} samples; of each ${per} in sight the least and the greatest are drawn, so no peak is lost.`,
    );
  }
  return sentences.join(' ');
}

function WaveformTable({
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
}

import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import type { FrequencyUnit } from '#src/charts/frequency-axis.ts';
import type { Spectrum } from '#src/charts/spectrum-data.ts';
import type { AmplitudeScale } from '#src/charts/spectrum-options.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';
import { WaveformPlot } from '#src/charts/waveform-plot.tsx';
import { ErrorState } from '#src/components/error-state.tsx';
import { PlotSkeleton } from '#src/components/skeleton.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { samplesQuery, spectrumQuery, waveformQuery } from '../api/recordings.ts';

const spectrumHeightPx = 300;
const waveformHeightPx = 200;

/** A single-sided spectrum ends at half the sampling rate. */
const asSpectrum = (
  amplitude: Float32Array | undefined,
  sampleRateHz: number | undefined,
): Spectrum | null =>
  amplitude === undefined || sampleRateHz === undefined || amplitude.length < 2
    ? null
    : { stepHz: sampleRateHz / 2 / (amplitude.length - 1), amplitude };

/** The point's spectrum at the survey before, where it was recorded in the same unit. */
function usePreviousSpectrum(siteId: number, waveform: WaveformResponse): Spectrum | null {
  const { previous } = waveform;
  const before = useQuery({
    ...waveformQuery(siteId, previous?.waveformId ?? 0),
    enabled: previous !== null,
  });
  const amplitude = useQuery({
    ...spectrumQuery(siteId, previous?.screeningId ?? 0),
    enabled: previous !== null,
  });
  return useMemo(
    () =>
      before.data?.unit === waveform.unit
        ? asSpectrum(amplitude.data, before.data.sampleRateHz)
        : null,
    [amplitude.data, before.data, waveform.unit],
  );
}

/** Spectrum with its strip, and the waveform, of one screening. */
export function ScreeningPlots({
  siteId,
  screening,
  waveform,
  frequencyUnit,
  amplitudeScale,
}: {
  siteId: number;
  screening: ScreeningResponse;
  waveform: WaveformResponse;
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
}) {
  const { result } = screening;
  const samples = useQuery(samplesQuery(siteId, waveform.id));
  const amplitude = useQuery(spectrumQuery(siteId, screening.id));
  const previous = usePreviousSpectrum(siteId, waveform);
  const spectrum = useMemo(
    () => asSpectrum(amplitude.data, waveform.sampleRateHz),
    [amplitude.data, waveform.sampleRateHz],
  );
  const orders = useMemo(() => orderCellsOf(result.orders), [result.orders]);
  const failed = samples.error ?? amplitude.error;
  if (failed !== null) {
    const error = toApiError(failed);
    return (
      <ErrorState
        title={error.message}
        safe="The verdict and its evidence below do not need the plots."
        advice="Go to another flag and back, or reload the page."
        errorId={error.id}
      />
    );
  }
  return (
    <div className="flex flex-col gap-5">
      {spectrum === null ? (
        <PlotSkeleton heightPx={spectrumHeightPx} label="Loading the spectrum…" />
      ) : (
        <SpectrumPlot
          spectrum={spectrum}
          unit={waveform.unit}
          speedHz={result.speed.speedHz}
          orders={orders}
          run={result.harmonicRun}
          frequencyUnit={frequencyUnit}
          amplitudeScale={amplitudeScale}
          previous={previous}
          heightPx={spectrumHeightPx}
        />
      )}
      {samples.data === undefined ? (
        <PlotSkeleton heightPx={waveformHeightPx} label="Loading the waveform…" />
      ) : (
        <WaveformPlot
          samples={samples.data}
          sampleRateHz={waveform.sampleRateHz}
          unit={waveform.unit}
          speedHz={result.speed.speedHz}
          truncation={result.truncation}
          heightPx={waveformHeightPx}
        />
      )}
    </div>
  );
}

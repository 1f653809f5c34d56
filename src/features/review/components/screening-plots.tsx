import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import { AveragedRevolutionPlot } from '#src/charts/averaged-revolution-plot.tsx';
import type { FrequencyUnit } from '#src/charts/frequency-axis.ts';
import type { Spectrum } from '#src/charts/spectrum-data.ts';
import type { AmplitudeScale } from '#src/charts/spectrum-options.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';
import { WaveformPlot } from '#src/charts/waveform-plot.tsx';
import { ErrorState } from '#src/components/error-state.tsx';
import { PlotSkeleton } from '#src/components/skeleton.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import {
  averagedRevolutionQuery,
  samplesQuery,
  spectrumQuery,
  waveformQuery,
} from '../api/recordings.ts';

const spectrumHeightPx = 300;
const waveformHeightPx = 200;

/** The point's spectrum at the survey before, where it was recorded in the same unit. */
function usePreviousSpectrum(siteId: number, waveform: WaveformResponse): Spectrum | null {
  const { previous } = waveform;
  const isThere = previous !== null;
  const before = useQuery({
    ...waveformQuery(siteId, previous?.waveformId ?? 0),
    enabled: isThere,
  });
  const spectrum = useQuery({
    ...spectrumQuery(siteId, previous?.screeningId ?? 0),
    enabled: isThere,
  });
  return before.data?.unit === waveform.unit ? (spectrum.data ?? null) : null;
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
  const spectrum = useQuery(spectrumQuery(siteId, screening.id));
  const turn = useQuery({
    ...averagedRevolutionQuery(siteId, screening.id),
    enabled: result.speed.speedHz !== null,
  });
  const previous = usePreviousSpectrum(siteId, waveform);
  const orders = useMemo(() => orderCellsOf(result.orders), [result.orders]);
  const failed = samples.error ?? spectrum.error;
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
      {spectrum.data === undefined ? (
        <PlotSkeleton heightPx={spectrumHeightPx} label="Loading the spectrum…" />
      ) : (
        <SpectrumPlot
          spectrum={spectrum.data}
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
      <div className="grid items-start gap-5 2xl:grid-cols-[2fr_1fr]">
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
        {turn.data !== undefined && turn.data.length > 0 && (
          <AveragedRevolutionPlot turn={turn.data} heightPx={waveformHeightPx} />
        )}
      </div>
    </div>
  );
}

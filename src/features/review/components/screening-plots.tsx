import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import { AveragedRevolutionPlot } from '#src/charts/averaged-revolution-plot.tsx';
import type { Window } from '#src/charts/plot-window.ts';
import type { Spectrum } from '#src/charts/spectrum-data.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';
import type { SpectrumView } from '#src/charts/spectrum-view.ts';
import type { Store } from '#src/charts/store.ts';
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
import type { PlotSettingsValue } from './plot-settings-value.ts';

const spectrumHeightPx = 230;
const waveformHeightPx = 190;

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

interface PlotProps {
  siteId: number;
  screening: ScreeningResponse;
  waveform: WaveformResponse;
}

function PlotFailure({ error }: { error: Error }) {
  const failure = toApiError(error);
  return (
    <ErrorState
      title={failure.message}
      safe="The verdict and its evidence do not need this plot."
      advice="Go to another flag and back, or reload the page."
      errorId={failure.id}
    />
  );
}

/** The spectrum with its run marked, the survey before behind it and the strip beneath. */
export function ScreeningSpectrum({
  siteId,
  screening,
  waveform,
  settings,
  view,
}: PlotProps & { settings: PlotSettingsValue; view: SpectrumView }) {
  const { result } = screening;
  const spectrum = useQuery(spectrumQuery(siteId, screening.id));
  const previous = usePreviousSpectrum(siteId, waveform);
  const orders = useMemo(() => orderCellsOf(result.orders), [result.orders]);
  if (spectrum.isError) return <PlotFailure error={spectrum.error} />;
  if (spectrum.data === undefined) {
    return <PlotSkeleton heightPx={spectrumHeightPx} label="Loading the spectrum…" />;
  }
  return (
    <SpectrumPlot
      spectrum={spectrum.data}
      unit={waveform.unit}
      speedHz={result.speed.speedHz}
      orders={orders}
      run={result.harmonicRun}
      {...(settings.shownUnit && { shownUnit: settings.shownUnit })}
      detector={settings.detector}
      frequencyUnit={settings.frequencyUnit}
      amplitudeScale={settings.amplitudeScale}
      view={view}
      previous={previous}
      heightPx={spectrumHeightPx}
    />
  );
}

/** The waveform, and one averaged revolution where a speed is known. */
export function ScreeningWaveform({
  siteId,
  screening,
  waveform,
  view,
}: PlotProps & { view: Store<Window | null> }) {
  const { result } = screening;
  const samples = useQuery(samplesQuery(siteId, waveform.id));
  const turn = useQuery({
    ...averagedRevolutionQuery(siteId, screening.id),
    enabled: result.speed.speedHz !== null,
  });
  if (samples.isError) return <PlotFailure error={samples.error} />;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
      {samples.data === undefined ? (
        <PlotSkeleton heightPx={waveformHeightPx} label="Loading the waveform…" />
      ) : (
        <WaveformPlot
          samples={samples.data}
          sampleRateHz={waveform.sampleRateHz}
          unit={waveform.unit}
          speedHz={result.speed.speedHz}
          truncation={result.truncation}
          view={view}
          heightPx={waveformHeightPx}
        />
      )}
      {turn.data !== undefined && turn.data.length > 0 && (
        <AveragedRevolutionPlot turn={turn.data} heightPx={waveformHeightPx} />
      )}
    </div>
  );
}

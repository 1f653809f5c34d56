import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ErrorState } from '#src/components/error-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Panel } from '#src/components/panel.tsx';
import { Skeleton } from '#src/components/skeleton.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatDay } from '#src/lib/dates.ts';
import { formatFixed } from '#src/lib/numbers.ts';
import { screeningQuery, waveformQuery } from '../api/recordings.ts';
import { CorrectSpeed } from './correct-speed.tsx';
import { Evidence } from './evidence.tsx';
import { perHz } from '#src/charts/frequency-axis.ts';
import { OtherDirections } from './other-directions.tsx';
import { PlotSettings } from './plot-settings.tsx';
import type { PlotSettingsValue } from './plot-settings-value.ts';
import { ScreeningFacts } from './screening-facts.tsx';
import { ScreeningSpectrum, ScreeningWaveform } from './screening-plots.tsx';
import { rescalePlaces, type PlotPlacesState } from './use-plot-places.ts';

/** One screening whole: verdict and decision on top, plots, figures, evidence. */
export function ScreeningView({
  siteId,
  screeningId,
  waveformId,
  plotSettings,
  places,
  onPlotSettings,
  decision,
}: {
  siteId: number;
  screeningId: number;
  /** Where the queue knows it, the waveform is fetched at once and not after the screening. */
  waveformId: number | undefined;
  plotSettings: PlotSettingsValue;
  places: PlotPlacesState;
  onPlotSettings: (changes: Partial<PlotSettingsValue>) => void;
  /** Buttons, or what was decided. */
  decision: ReactNode;
}) {
  const screening = useQuery(screeningQuery(siteId, screeningId));
  const knownWaveformId = waveformId ?? screening.data?.waveformId;
  const waveform = useQuery({
    ...waveformQuery(siteId, knownWaveformId ?? 0),
    enabled: knownWaveformId !== undefined,
  });
  const failed = screening.error ?? waveform.error;
  if (failed !== null) {
    const error = toApiError(failed);
    return (
      <ErrorState
        title={error.message}
        safe="No decision was lost."
        advice="Choose another flag from the queue, or reload the page."
        errorId={error.id}
      />
    );
  }
  const result = screening.data?.result;
  const changeSettings = (changes: Partial<PlotSettingsValue>) => {
    if (changes.frequencyUnit !== undefined) {
      const speedHz = result?.speed.speedHz ?? null;
      const before = perHz(plotSettings.frequencyUnit, speedHz);
      rescalePlaces(places, perHz(changes.frequencyUnit, speedHz) / before);
    }
    onPlotSettings(changes);
  };
  return (
    <div className="flex min-w-0 flex-col gap-4">
      <header className="flex flex-wrap items-center justify-between gap-x-5 gap-y-2 border-y border-ink bg-sheet px-4 py-2 phone:border-x lg:sticky lg:top-0 lg:z-20">
        <div>
          <h2 className="figures text-lg">{waveform.data?.pointLabel ?? '…'}</h2>
          <p className="text-sm text-ink-soft">
            {waveform.data &&
              `${waveform.data.machineName}, ${waveform.data.positionName}, ${formatDay(waveform.data.surveyedOn)}`}
          </p>
        </div>
        {result && (
          <div className="flex items-center gap-4">
            <VerdictMark verdict={result.verdict} />
            <span className="text-sm">
              Score <Figure value={result.score === null ? null : formatFixed(result.score, 2)} />
            </span>
          </div>
        )}
        {decision}
      </header>
      {screening.data && waveform.data ? (
        <>
          <div className="border border-hairline bg-sheet p-4">
            <div className="mb-2 flex flex-wrap items-center justify-between gap-2">
              <CorrectSpeed siteId={siteId} waveform={waveform.data} />
              <PlotSettings
                value={plotSettings}
                recordedUnit={waveform.data.unit}
                onChange={changeSettings}
              />
            </div>
            <ScreeningSpectrum
              siteId={siteId}
              screening={screening.data}
              waveform={waveform.data}
              settings={plotSettings}
              view={places.spectrum}
            />
            <OtherDirections
              siteId={siteId}
              waveform={waveform.data}
              settings={plotSettings}
              view={places.spectrum}
            />
          </div>
          <Panel title="Evidence">
            <Evidence result={screening.data.result} />
          </Panel>
          <div className="border border-hairline bg-sheet p-4">
            <ScreeningWaveform
              siteId={siteId}
              screening={screening.data}
              waveform={waveform.data}
              view={places.stretchS}
            />
          </div>
          <Panel title="Figures">
            <ScreeningFacts result={screening.data.result} waveform={waveform.data} />
          </Panel>
          <p className="text-xs text-ink-faint">
            Method {screening.data.result.methodVersion}, run {screening.data.run}. A screening is a
            hint for a qualified analyst, not a diagnosis.
          </p>
        </>
      ) : (
        <Skeleton lines={8} label="Loading the screening…" />
      )}
    </div>
  );
}

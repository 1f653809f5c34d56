import { useQuery } from '@tanstack/react-query';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import { SpectrumPlot } from '#src/charts/spectrum-plot.tsx';
import type { SpectrumView } from '#src/charts/spectrum-view.ts';
import { PlotSkeleton } from '#src/components/skeleton.tsx';
import { spectrumQuery } from '../api/recordings.ts';
import type { PlotSettingsValue } from './plot-settings-value.ts';

const heightPx = 130;

const directionWords: Readonly<Record<Direction, string>> = {
  horizontal: 'Horizontal',
  vertical: 'Vertical',
  axial: 'Axial',
};

interface DirectionsProps {
  siteId: number;
  waveform: WaveformResponse;
  settings: PlotSettingsValue;
  /** The same zoom and cursor as above: one looks at the same line in each direction. */
  view: SpectrumView;
}

/** The position's other directions in the same survey, small beneath the flag's spectrum. */
export function OtherDirections(props: DirectionsProps) {
  const { alongside } = props.waveform;
  if (alongside.length === 0) return null;
  return (
    <section aria-label="Other directions" className="mt-4 grid gap-4 lg:grid-cols-2">
      {alongside.map((other) => (
        <OtherDirection key={other.screeningId} {...props} other={other} />
      ))}
    </section>
  );
}

const noOrders: readonly [] = [];

function OtherDirection({
  siteId,
  settings,
  view,
  other,
}: DirectionsProps & { other: WaveformResponse['alongside'][number] }) {
  const spectrum = useQuery(spectrumQuery(siteId, other.screeningId));
  const title = `${directionWords[other.direction]}, same survey`;
  // Beside the flag's own it is a help; what can't be had is not worth an alarm.
  if (spectrum.isError) return <p className="text-sm text-ink-soft">{title}: could not be read.</p>;
  if (spectrum.data === undefined) {
    return <PlotSkeleton heightPx={heightPx} label={`${title}: loading…`} />;
  }
  return (
    <SpectrumPlot
      spectrum={spectrum.data}
      unit={other.unit}
      {...(settings.shownUnit && { shownUnit: settings.shownUnit })}
      detector={settings.detector}
      speedHz={other.speedHz}
      orders={noOrders}
      run={null}
      frequencyUnit={settings.frequencyUnit}
      amplitudeScale={settings.amplitudeScale}
      view={view}
      heightPx={heightPx}
      title={title}
      isCompanion
    />
  );
}

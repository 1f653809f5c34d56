import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { Button } from '#src/components/button.tsx';
import { StateMark } from '#src/components/state-mark.tsx';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useScreenAgain } from '../api/surveys.ts';

/** The verdict, or how far the screening is. */
export function ScreeningState({
  siteId,
  waveform,
  pointLabel,
}: {
  siteId: number;
  waveform: WaveformListItem;
  pointLabel: string;
}) {
  const { screeningState, verdict } = waveform;
  if (screeningState === 'queued') {
    return (
      <StateMark shape="box-empty" tone="faint">
        Waits to be screened
      </StateMark>
    );
  }
  if (screeningState === 'running') {
    return (
      <StateMark shape="box-half" tone="faint">
        Being screened
      </StateMark>
    );
  }
  if (screeningState === 'failed') {
    return <FailedScreening siteId={siteId} waveform={waveform} pointLabel={pointLabel} />;
  }
  return verdict === null ? null : <VerdictMark verdict={verdict} />;
}

function FailedScreening({
  siteId,
  waveform,
  pointLabel,
}: {
  siteId: number;
  waveform: WaveformListItem;
  pointLabel: string;
}) {
  const again = useScreenAgain(siteId);
  return (
    <div className="flex max-w-xs flex-col items-start gap-1">
      <StateMark shape="box-struck">Screening failed</StateMark>
      <p className="text-xs text-ink-soft">{waveform.screeningFailure}</p>
      <Button
        size="small"
        icon="retry"
        busy={again.isPending}
        aria-label={`Screen ${pointLabel} again`}
        onClick={() => again.mutate({ waveformId: waveform.id })}
      >
        Screen again
      </Button>
      {again.isError && (
        <p role="alert" className="text-xs">
          {toApiError(again.error).message}
        </p>
      )}
    </div>
  );
}

import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import type { SurveyResponse } from '#shared/contracts/survey.ts';
import { IconButton } from '#src/components/icon-button.tsx';
import { Panel } from '#src/components/panel.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useDismissRejectedFile } from '../api/surveys.ts';

/** The points nobody has a waveform of yet, machine by machine. */
export function MissingPoints({ points }: { points: SurveyResponse['missingPoints'] }) {
  if (points.length === 0) return null;
  const title =
    points.length === 1
      ? '1 point without a waveform'
      : `${points.length} points without a waveform`;
  const machines = new Map<number, PointChoice[]>();
  for (const point of points) {
    const known = machines.get(point.machineId);
    if (known) known.push(point);
    else machines.set(point.machineId, [point]);
  }
  return (
    <Panel title={title}>
      <ul className="gap-x-8 text-sm lg:columns-2">
        {[...machines].map(([machineId, missing]) => (
          <li key={machineId} className="break-inside-avoid border-b border-hairline py-1">
            <span className="text-ink-soft">{missing[0]?.machineName}:</span>{' '}
            <span className="figures">{missing.map(({ label }) => label).join(', ')}</span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}

/** Files the server could not read, until they are mended and sent again, or put away. */
export function RejectedFiles({
  siteId,
  surveyId,
  files,
}: {
  siteId: number;
  surveyId: number;
  files: SurveyResponse['rejectedFiles'];
}) {
  const dismiss = useDismissRejectedFile(siteId, surveyId);
  if (files.length === 0) return null;
  const title =
    files.length === 1 ? '1 file could not be read' : `${files.length} files could not be read`;
  return (
    <Panel title={title}>
      <p className="mb-2 text-sm text-ink-soft">
        Mend the file and send it again under the same name, or put it away here.
      </p>
      <ul>
        {files.map((file) => (
          <li
            key={file.id}
            className="flex items-center gap-x-4 border-b border-hairline py-1 text-sm"
          >
            <span className="figures max-w-64 shrink-0 font-medium break-all">{file.fileName}</span>
            <span className="grow">
              {file.errorLine !== null && (
                <span className="figures font-medium">Line {file.errorLine}: </span>
              )}
              {file.errorMessage}
            </span>
            <IconButton
              icon="close"
              label={`Put ${file.fileName} away`}
              onClick={() => dismiss.mutate(file.id)}
            />
          </li>
        ))}
      </ul>
      {dismiss.isError && (
        <p role="alert" className="mt-2 text-sm">
          {toApiError(dismiss.error).message}
        </p>
      )}
    </Panel>
  );
}

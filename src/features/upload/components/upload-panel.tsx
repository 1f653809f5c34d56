import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { uploadLimits } from '#shared/contracts/waveform.ts';
import { Button } from '#src/components/button.tsx';
import { FileDrop } from '#src/components/file-drop.tsx';
import { Panel } from '#src/components/panel.tsx';
import { ProgressBar } from '#src/components/progress-bar.tsx';
import { formatBytes } from '#src/lib/numbers.ts';
import { uploadListOf, useUploadEntries } from '../survey-uploads.ts';
import { isDone, isUnderWay, type UploadEntry } from '../upload-entry.ts';
import { maySend, type UploadList } from '../upload-list.ts';
import { EntryRow } from './entry-row.tsx';
import { PointOptions } from './point-input.tsx';

/** Takes the files of a survey: dropped, matched to their points, looked at, sent. */
export function UploadPanel({
  userId,
  siteId,
  surveyId,
  points,
  routePointIds,
  isEmpty,
}: {
  userId: number;
  siteId: number;
  surveyId: number;
  /** Every point of the site; those of the route are preferred. */
  points: readonly PointChoice[];
  routePointIds: readonly number[];
  /** The survey has no waveform yet: the place to drop files stands open. */
  isEmpty: boolean;
}) {
  const client = useQueryClient();
  const list = uploadListOf(client, userId, siteId, surveyId);
  const entries = useUploadEntries(list);
  const onRoute = useMemo(() => new Set(routePointIds), [routePointIds]);
  useEffect(() => list.know({ points, routePointIds: onRoute }), [list, points, onRoute]);
  useWarningBeforeLeaving(entries.some(isUnderWay));
  const [opened, setOpened] = useState(false);
  const [onlyOpenWanted, setOnlyOpen] = useState(false);
  const onlyOpen = onlyOpenWanted && entries.some(needsSomebody);
  const isOpen = isEmpty || opened || entries.length > 0;

  if (!isOpen) {
    return (
      <div>
        <Button icon="upload" onClick={() => setOpened(true)}>
          Add waveforms
        </Button>
      </div>
    );
  }
  return (
    <Panel title="Add waveforms">
      <PointOptions points={points} />
      <FileDrop
        label="Waveform files of this survey"
        hint={`CSV files, one waveform or several columns each: at most ${formatBytes(uploadLimits.fileMaxBytes)} and ${uploadLimits.rowsMax.toLocaleString('en')} rows a file, ${uploadLimits.channelsMax} channels, ${uploadLimits.filesPerSurveyMax.toLocaleString('en')} waveforms a survey. Each file is shown here before anything is sent.`}
        endings={['.csv', '.txt', '.tsv']}
        onFiles={(files) => void list.add(files)}
      />
      {entries.length > 0 && (
        <>
          <UploadBar list={list} entries={entries} onlyOpen={onlyOpen} onOnlyOpen={setOnlyOpen} />
          <ul aria-label="Files" className="max-h-[36rem] overflow-y-auto border border-hairline">
            {(onlyOpen ? entries.filter(needsSomebody) : entries).map((entry) => (
              <EntryRow
                key={entry.id}
                entry={entry}
                list={list}
                points={points}
                isOnRoute={(pointId) => onRoute.has(pointId)}
              />
            ))}
          </ul>
        </>
      )}
    </Panel>
  );
}

/** The whole of the list: how many, how far, and the buttons that move it. */
function UploadBar({
  list,
  entries,
  onlyOpen,
  onOnlyOpen,
}: {
  list: UploadList;
  entries: readonly UploadEntry[];
  onlyOpen: boolean;
  onOnlyOpen: (onlyOpen: boolean) => void;
}) {
  const sendable = entries.filter((entry) => maySend(entry) && entry.state !== 'refused');
  const underWay = entries.filter(isUnderWay);
  const done = entries.filter(isDone);
  const reading = entries.filter(({ state }) => state === 'reading');
  const open = entries.filter(needsSomebody).length;
  const parts = [
    reading.length > 0 && `${reading.length} being read`,
    sendable.length > 0 && `${sendable.length} ready`,
    underWay.length > 0 && `${underWay.length} under way`,
    done.length > 0 && `${done.length} in the survey`,
    open > 0 && `${open} ${open === 1 ? 'needs' : 'need'} you`,
  ].filter(Boolean);
  const counted = entries.filter((entry) => isUnderWay(entry) || isDone(entry));
  const bytes = (all: readonly UploadEntry[], of: (entry: UploadEntry) => number) =>
    all.reduce((sum, entry) => sum + of(entry), 0);
  const sentBytes = bytes(counted, (entry) => (isDone(entry) ? entry.file.size : entry.sentBytes));
  const totalBytes = bytes(counted, (entry) => entry.file.size);
  return (
    <div className="my-3 flex flex-col gap-2">
      <div className="flex flex-wrap items-center gap-3">
        <p role="status" className="grow text-sm">
          <span className="figures">{entries.length}</span>{' '}
          {entries.length === 1 ? 'file' : 'files'}: {parts.join(', ')}.
        </p>
        {open > 0 && open < entries.length && (
          <Button variant="quiet" aria-pressed={onlyOpen} onClick={() => onOnlyOpen(!onlyOpen)}>
            {onlyOpen
              ? 'Show all files'
              : `Show ${open === 1 ? 'the one' : `the ${open}`} that ${open === 1 ? 'needs' : 'need'} you`}
          </Button>
        )}
        {done.length > 0 && (
          <Button variant="quiet" onClick={() => list.clearDone()}>
            Clear what has arrived
          </Button>
        )}
        {underWay.length > 0 && <Button onClick={() => list.stop()}>Stop</Button>}
        <Button
          variant="primary"
          icon="upload"
          disabled={sendable.length === 0}
          onClick={() => list.sendAll()}
        >
          {sendWords(sendable.length)}
        </Button>
      </div>
      {underWay.length > 0 && (
        <ProgressBar
          label="All files"
          value={sentBytes}
          max={totalBytes}
          text={`${formatBytes(sentBytes)} of ${formatBytes(totalBytes)}`}
        />
      )}
    </div>
  );
}

/** Not on its way and not to be sent as it is. */
const needsSomebody = (entry: UploadEntry) =>
  !isUnderWay(entry) &&
  !isDone(entry) &&
  entry.state !== 'reading' &&
  (entry.state === 'refused' || !maySend(entry));

const sendWords = (count: number) =>
  count === 0 ? 'Nothing to send' : count === 1 ? 'Send 1 file' : `Send ${count} files`;

/** Closing the window would break off what is on its way. */
function useWarningBeforeLeaving(active: boolean): void {
  useEffect(() => {
    if (!active) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [active]);
}

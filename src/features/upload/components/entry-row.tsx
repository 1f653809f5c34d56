import type { PointChoice } from '#shared/contracts/measuring-point.ts';
import { Button } from '#src/components/button.tsx';
import { IconButton } from '#src/components/icon-button.tsx';
import { faultsOf, isDone, isUnderWay, type UploadEntry } from '../upload-entry.ts';
import { maySend, type UploadList } from '../upload-list.ts';
import { EntryChannelRow } from './entry-channel-row.tsx';
import { EntryFacts } from './entry-facts.tsx';
import { EntryStateView } from './entry-state.tsx';
import { ToldNumber } from './told-number.tsx';

const maxRateHz = 10_000_000;
const maxSpeedRpm = 200_000;

/** One file of the list: what it holds, where it belongs, what is missing, how far it has come. */
export function EntryRow({
  entry,
  list,
  points,
  isOnRoute,
}: {
  entry: UploadEntry;
  list: UploadList;
  points: readonly PointChoice[];
  isOnRoute: (pointId: number) => boolean;
}) {
  const { head, channels } = entry;
  const csv = head?.preview.csv;
  const locked = isUnderWay(entry) || isDone(entry);
  const faults = locked ? [] : faultsOf(entry);
  return (
    <li
      aria-label={entry.path}
      className="grid gap-x-6 gap-y-2 border-b border-hairline px-4 py-3 md:grid-cols-[minmax(0,1fr)_auto]"
    >
      <div className="flex min-w-0 flex-col gap-2">
        <p className="figures text-sm font-medium break-all">{entry.path}</p>
        <EntryFacts entry={entry} />
        {channels.map((channel) => (
          <EntryChannelRow
            key={channel.channelIndex}
            channel={channel}
            fileName={entry.file.name}
            sketch={head?.sketches[channel.channelIndex]}
            points={points}
            isOnRoute={isOnRoute}
            onlyChannel={channels.length === 1}
            locked={locked}
            onChange={(changes) => list.changeChannel(entry.id, channel.channelIndex, changes)}
          />
        ))}
        {csv && !locked && (csv.sampleRateHz === null || csv.speedRpm === null) && (
          <div className="flex flex-wrap gap-4">
            {csv.sampleRateHz === null && (
              <ToldNumber
                label={`Sampling rate of ${entry.file.name}`}
                unit="Hz"
                max={maxRateHz}
                value={entry.sampleRateHz}
                onChange={(sampleRateHz) => list.change(entry.id, { sampleRateHz })}
              />
            )}
            {csv.speedRpm === null && (
              <ToldNumber
                label={`Speed of ${entry.file.name} (optional)`}
                unit="r/min"
                max={maxSpeedRpm}
                value={entry.toldSpeedRpm}
                onChange={(toldSpeedRpm) => list.change(entry.id, { toldSpeedRpm })}
              />
            )}
          </div>
        )}
        {faults.length > 0 && (
          <ul className="border-l-4 border-ink pl-3 text-sm">
            {faults.map(({ line, message }) => (
              <li key={`${line} ${message}`}>
                {line !== null && <span className="figures font-medium">Line {line}: </span>}
                {message}
              </li>
            ))}
          </ul>
        )}
        {entry.failure !== null && (
          <p role="status" className="border-l-4 border-ink pl-3 text-sm">
            {entry.failure}
          </p>
        )}
      </div>
      <div className="flex items-start gap-2 md:justify-end">
        <div className="flex min-h-9 items-center">
          <EntryStateView entry={entry} />
        </div>
        {(entry.state === 'failed' || entry.state === 'refused') && maySend(entry) && (
          <Button
            size="small"
            icon="retry"
            className="mt-1"
            onClick={() => list.sendOne(entry.id)}
            aria-label={`Send ${entry.file.name} again`}
          >
            Send again
          </Button>
        )}
        <IconButton
          icon="close"
          label={
            isUnderWay(entry) ? `Stop ${entry.file.name}` : `Take ${entry.file.name} off the list`
          }
          onClick={() => list.remove(entry.id)}
        />
      </div>
    </li>
  );
}

import type { RememberedMapping } from './mapping-memory.ts';
import { matchPoint, type MatchablePoint } from './match-point.ts';
import type { FileHead } from './read-head.ts';
import type { EntryChannel, UploadEntry } from './upload-entry.ts';

export interface KnownPoints {
  points: readonly MatchablePoint[];
  routePointIds: ReadonlySet<number>;
}

/** Names a file within the list: the same file dropped twice stands there once. */
export const entryId = (file: File, path: string) => `${path}\n${file.size}\n${file.lastModified}`;

export const newEntry = (file: File): UploadEntry => {
  const path = file.webkitRelativePath || file.name;
  return {
    id: entryId(file, path),
    file,
    path,
    state: 'reading',
    head: null,
    channels: [],
    sampleRateHz: null,
    toldSpeedRpm: null,
    sentBytes: 0,
    failure: null,
  };
};

/** What an entry becomes when its head has been read: channels with their points and units. */
export function settleEntry(
  entry: UploadEntry,
  head: FileHead,
  known: KnownPoints,
  remembered: RememberedMapping | null,
): UploadEntry {
  const { csv } = head.preview;
  const columns = csv?.columns.filter(({ role }) => role === 'samples') ?? [];
  const channels = columns.map((column, channelIndex): EntryChannel => {
    const match = matchPoint(
      {
        asset: csv?.comments.asset,
        point: csv?.comments.point,
        filePath: entry.path,
        channelName: columns.length > 1 ? column.name : undefined,
      },
      known.points,
      known.routePointIds,
    );
    return {
      channelIndex,
      name: column.name,
      unitInFile: column.unit,
      unit: column.unit === null ? (remembered?.units[channelIndex] ?? null) : null,
      pointId: match?.pointId ?? null,
      matchedBy: match?.by ?? null,
      taken: remembered?.taken[channelIndex] ?? true,
    };
  });
  return {
    ...entry,
    state: 'ready',
    head,
    channels,
    sampleRateHz: csv?.sampleRateHz === null ? (remembered?.sampleRateHz ?? null) : null,
  };
}

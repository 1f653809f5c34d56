import type { Unit } from '#shared/quantities/quantity.ts';
import { uploadMapping, type UploadMapping } from '#shared/contracts/waveform.ts';
import type { MatchedBy } from './match-point.ts';
import type { FileHead } from './read-head.ts';

export type EntryState =
  /** Its head is being read. */
  | 'reading'
  /** Waits for a person: to be sent, or for what is missing. */
  | 'ready'
  | 'waiting'
  | 'sending'
  /** All bytes are sent; the server reads it. */
  | 'checking'
  | 'sent'
  /** The survey had the same content already. */
  | 'there'
  /** The server could not read it; sending it again as it is won't help. */
  | 'refused'
  /** Something on the way failed; it may be tried again. */
  | 'failed';

/** What is settled about one channel of a file. */
export interface EntryChannel {
  channelIndex: number;
  name: string;
  /** As the header says it; null where it doesn't. */
  unitInFile: Unit | null;
  /** As a person says it; wins. */
  unit: Unit | null;
  pointId: number | null;
  matchedBy: MatchedBy | null;
  taken: boolean;
}

export interface UploadEntry {
  id: string;
  file: File;
  /** With the folders it came in. */
  path: string;
  state: EntryState;
  head: FileHead | null;
  channels: readonly EntryChannel[];
  /** What a person says of the file; null leaves it to the file. */
  sampleRateHz: number | null;
  toldSpeedRpm: number | null;
  sentBytes: number;
  /** In words fit to be shown. */
  failure: string | null;
}

/** What is missing before a file can be sent. */
export interface EntryFault {
  /** Physical line of the file, where the fault is on one. */
  line: number | null;
  message: string;
}

/** What stands between this file and being sent; empty where nothing does. */
export function faultsOf(entry: UploadEntry): EntryFault[] {
  const { head, channels } = entry;
  if (head === null) return [];
  const { fault, csv } = head.preview;
  if (fault !== null) return [{ line: fault.line, message: fault.message }];
  const faults: EntryFault[] = [];
  const say = (message: string) => faults.push({ line: null, message });
  const taken = channels.filter((channel) => channel.taken);
  const which = (channel: EntryChannel) => (channels.length > 1 ? ` for “${channel.name}”` : '');
  if (taken.length === 0) say('Take at least one of its channels.');
  if (csv?.sampleRateHz === null && entry.sampleRateHz === null) {
    say('The file doesn’t say its sampling rate: enter it.');
  }
  for (const channel of taken) {
    if (channel.pointId === null) say(`Choose the measuring point${which(channel)}.`);
    if (channel.unitInFile === null && channel.unit === null) {
      say(`The file doesn’t say its unit: choose it${which(channel)}.`);
    }
  }
  const points = taken.flatMap(({ pointId }) => (pointId === null ? [] : [pointId]));
  if (new Set(points).size < points.length) say('Two of its channels have the same point.');
  return faults;
}

/** What goes with the file to the server. @returns null while something is missing */
export function mappingOf(entry: UploadEntry): UploadMapping | null {
  if (entry.head === null || faultsOf(entry).length > 0) return null;
  const mapping = uploadMapping.safeParse({
    channels: entry.channels
      .filter((channel) => channel.taken)
      .map(({ channelIndex, pointId, unit }) => ({
        channelIndex,
        measuringPointId: pointId,
        ...(unit === null ? {} : { unit }),
      })),
    ...(entry.sampleRateHz === null ? {} : { sampleRateHz: entry.sampleRateHz }),
    ...(entry.toldSpeedRpm === null ? {} : { toldSpeedRpm: entry.toldSpeedRpm }),
  });
  return mapping.success ? mapping.data : null;
}

export const isUnderWay = ({ state }: UploadEntry) =>
  state === 'waiting' || state === 'sending' || state === 'checking';
export const isDone = ({ state }: UploadEntry) => state === 'sent' || state === 'there';

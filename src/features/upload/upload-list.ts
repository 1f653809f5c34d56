import type { UploadMapping, UploadResponse } from '#shared/contracts/waveform.ts';
import { ApiError, toApiError } from '#src/lib/api-error.ts';
import { recallMapping, rememberMapping } from './mapping-memory.ts';
import { newEntry, settleEntry, type KnownPoints } from './new-entry.ts';
import type { FileHead } from './read-head.ts';
import { isUnderWay, mappingOf, type EntryChannel, type UploadEntry } from './upload-entry.ts';

/** Files sent at the same time: enough to hide the waits between them, few enough to be fair. */
const sentAtOnce = 3;

export interface UploadListOptions {
  readHead: (file: File) => Promise<FileHead>;
  send: (
    file: File,
    mapping: UploadMapping,
    options: { signal: AbortSignal; onProgress: (sentBytes: number, totalBytes: number) => void },
  ) => Promise<UploadResponse>;
  store: Pick<Storage, 'getItem' | 'setItem'>;
  /** A file has come to its end; the survey's page has news. */
  onSettled: () => void;
}

type Changes = Partial<Pick<UploadEntry, 'sampleRateHz' | 'toldSpeedRpm'>>;

/**
 * The files of one survey on their way to the server. It lives outside the pages: going to look at
 * a verdict and coming back neither stops nor forgets an upload.
 */
export class UploadList {
  private readonly options: UploadListOptions;
  private known: KnownPoints = { points: [], routePointIds: new Set() };
  private entries: readonly UploadEntry[] = [];
  private readonly listeners = new Set<() => void>();
  private readonly sending = new Map<string, AbortController>();

  constructor(options: UploadListOptions) {
    this.options = options;
  }

  readonly snapshot = (): readonly UploadEntry[] => this.entries;
  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** The points files are matched to; files added before keep what they have. */
  know(known: KnownPoints): void {
    this.known = known;
  }

  /** Adds files; one that is in the list already is taken once. */
  async add(files: readonly File[]): Promise<void> {
    const there = new Set(this.entries.map(({ id }) => id));
    const fresh = files.map(newEntry).filter(({ id }) => !there.has(id) && there.add(id));
    this.set([...this.entries, ...fresh]);
    for (const entry of fresh) await this.read(entry);
  }

  change(id: string, changes: Changes): void {
    this.update(id, (entry) => ({ ...entry, ...changes }));
    this.remember(id);
  }

  changeChannel(id: string, channelIndex: number, changes: Partial<EntryChannel>): void {
    this.update(id, (entry) => ({
      ...entry,
      channels: entry.channels.map((channel) =>
        channel.channelIndex === channelIndex ? { ...channel, ...changes } : channel,
      ),
    }));
    if (!('pointId' in changes)) this.remember(id);
  }

  remove(id: string): void {
    this.sending.get(id)?.abort();
    this.set(this.entries.filter((entry) => entry.id !== id));
  }

  /** Takes what has arrived off the list. */
  clearDone(): void {
    this.set(this.entries.filter(({ state }) => state !== 'sent' && state !== 'there'));
  }

  /** Sends everything that can be sent: what is ready, and what failed on the way before. */
  sendAll(): void {
    // What the server could not read it can't read the second time either.
    const sendable = this.entries.filter((entry) => maySend(entry) && entry.state !== 'refused');
    for (const { id } of sendable) this.queue(id);
    this.pump();
  }

  /** Sends one file, again if need be. */
  sendOne(id: string): void {
    const entry = this.find(id);
    if (entry === undefined || !maySend(entry)) return;
    this.queue(id);
    this.pump();
  }

  /** Stops what is under way; the files stay in the list, to be taken up again. */
  stop(): void {
    this.holdWaiting();
    for (const controller of this.sending.values()) controller.abort();
  }

  private holdWaiting(): void {
    this.set(
      this.entries.map((entry) =>
        entry.state === 'waiting' ? { ...entry, state: 'ready' as const } : entry,
      ),
    );
  }

  private async read(entry: UploadEntry): Promise<void> {
    try {
      const head = await this.options.readHead(entry.file);
      const remembered = recallMapping(this.options.store, head.preview.shape);
      this.update(entry.id, (now) => settleEntry(now, head, this.known, remembered));
    } catch {
      this.update(entry.id, (now) => ({
        ...now,
        state: 'failed',
        failure:
          'The browser could not read this file. Was it moved or opened elsewhere? Add it again.',
      }));
    }
  }

  private queue(id: string): void {
    this.update(id, (entry) => ({ ...entry, state: 'waiting', sentBytes: 0, failure: null }));
  }

  private pump(): void {
    while (this.sending.size < sentAtOnce) {
      const next = this.entries.find(({ state }) => state === 'waiting');
      const mapping = next === undefined ? null : mappingOf(next);
      if (next === undefined) return;
      if (mapping === null) {
        this.update(next.id, (entry) => ({ ...entry, state: 'ready' }));
        continue;
      }
      void this.send(next, mapping);
    }
  }

  private async send({ id, file }: UploadEntry, mapping: UploadMapping): Promise<void> {
    const controller = new AbortController();
    this.sending.set(id, controller);
    this.update(id, (entry) => ({ ...entry, state: 'sending' }));
    try {
      const answer = await this.options.send(file, mapping, {
        signal: controller.signal,
        onProgress: (sentBytes, totalBytes) =>
          this.update(id, (entry) => ({
            ...entry,
            // The form around the file counts too: the share is what is shown.
            sentBytes: Math.min(file.size, (sentBytes / totalBytes) * file.size),
            state: sentBytes >= totalBytes ? 'checking' : 'sending',
          })),
      });
      this.update(id, (entry) => ({
        ...entry,
        state: answer.alreadyThere ? 'there' : 'sent',
        sentBytes: file.size,
      }));
    } catch (error) {
      this.update(id, (entry) => ({ ...entry, ...failedWith(error, controller.signal) }));
      // Without a connection each of the others would only fail the same way.
      if (error instanceof ApiError && error.code === 'unreachable') this.holdWaiting();
    } finally {
      this.sending.delete(id);
      this.options.onSettled();
      this.pump();
    }
  }

  /** Keeps what was said of a file, and gives it to the others of its shape that lack it. */
  private remember(id: string): void {
    const entry = this.find(id);
    if (!entry?.head) return;
    const { shape } = entry.head.preview;
    rememberMapping(this.options.store, shape, entry);
    for (const other of this.entries) {
      if (other.id === id || other.state !== 'ready' || other.head?.preview.shape !== shape)
        continue;
      this.update(other.id, (now) => lentFrom(entry, now));
    }
  }

  private find = (id: string) => this.entries.find((entry) => entry.id === id);

  private update(id: string, change: (entry: UploadEntry) => UploadEntry): void {
    this.set(this.entries.map((entry) => (entry.id === id ? change(entry) : entry)));
  }

  private set(entries: readonly UploadEntry[]): void {
    this.entries = entries;
    for (const listener of this.listeners) listener();
  }
}

/** Fills what neither the file nor a person has said from another file of the same shape. */
function lentFrom(source: UploadEntry, entry: UploadEntry): UploadEntry {
  const saysRate = entry.head?.preview.csv?.sampleRateHz != null;
  return {
    ...entry,
    sampleRateHz: entry.sampleRateHz ?? (saysRate ? null : source.sampleRateHz),
    channels: entry.channels.map((channel, index) => ({
      ...channel,
      unit:
        channel.unit ??
        (channel.unitInFile === null ? (source.channels[index]?.unit ?? null) : null),
    })),
  };
}

/** Whether a press on "Send" takes this file along. */
export const maySend = (entry: UploadEntry): boolean =>
  !isUnderWay(entry) &&
  (entry.state === 'ready' || entry.state === 'failed' || entry.state === 'refused') &&
  mappingOf(entry) !== null;

function failedWith(error: unknown, signal: AbortSignal): Partial<UploadEntry> {
  if (signal.aborted) return { state: 'ready', sentBytes: 0, failure: null };
  const { code, message } = toApiError(error);
  const refused = code === 'unreadable_file' || code === 'validation' || code === 'too_large';
  return { state: refused ? 'refused' : 'failed', sentBytes: 0, failure: message };
}

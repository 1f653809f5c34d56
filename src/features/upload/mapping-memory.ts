import { z } from 'zod';
import { unit } from '#shared/contracts/waveform.ts';
import type { EntryChannel } from './upload-entry.ts';

/** What a person settled for files of one shape. Points are left out: they differ from file to file. */
const remembered = z.object({
  sampleRateHz: z.number().positive().nullable(),
  units: z.array(unit.nullable()),
  taken: z.array(z.boolean()),
});
export type RememberedMapping = z.infer<typeof remembered>;

const memory = z.record(z.string(), remembered);
const storageKey = 'fretline.upload-mappings';
const shapesMax = 50;

type Store = Pick<Storage, 'getItem' | 'setItem'>;

/** The mapping given to the last file of this shape; null where there was none. */
export function recallMapping(store: Store, shape: string): RememberedMapping | null {
  return readAll(store)[shape] ?? null;
}

/** Keeps what was said of a file for the next one of its shape. Only what the file left open counts. */
export function rememberMapping(
  store: Store,
  shape: string,
  settled: { sampleRateHz: number | null; channels: readonly EntryChannel[] },
): void {
  const mapping: RememberedMapping = {
    sampleRateHz: settled.sampleRateHz,
    units: settled.channels.map((channel) => channel.unit),
    taken: settled.channels.map((channel) => channel.taken),
  };
  const { [shape]: _before, ...others } = readAll(store);
  const kept = Object.entries(others).slice(-(shapesMax - 1));
  try {
    store.setItem(storageKey, JSON.stringify(Object.fromEntries([...kept, [shape, mapping]])));
  } catch {
    // A full or forbidden store costs the convenience, not the upload.
  }
}

function readAll(store: Store): Record<string, RememberedMapping> {
  try {
    return memory.parse(JSON.parse(store.getItem(storageKey) ?? '{}'));
  } catch {
    return {};
  }
}

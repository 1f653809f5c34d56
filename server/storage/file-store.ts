import { randomUUID } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { mkdir, open, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';

/**
 * The files of the data directory. Originals and samples lie under the hash of the original, so the
 * same content is kept once; plots lie under the waveform and the run of its screening. Every file
 * is written under another name and moved into place whole: a crash leaves no half file behind.
 */
export class FileStore {
  private readonly directory: string;

  constructor(directory: string) {
    this.directory = directory;
  }

  /** Where uploads arrive before they are known to be readable; made if missing. */
  incomingDirectory(): string {
    const path = join(this.directory, 'incoming');
    mkdirSync(path, { recursive: true, mode: 0o700 });
    return path;
  }

  /** Uploads that were under way when a process died belong to nobody. */
  async clearIncoming(): Promise<void> {
    const incoming = this.incomingDirectory();
    for (const name of await readdir(incoming)) await rm(join(incoming, name), { force: true });
  }

  originalPath(contentHash: string): string {
    return join(this.directory, 'originals', contentHash.slice(0, 2), contentHash);
  }

  samplesPath(contentHash: string, channelIndex: number): string {
    const name = `${contentHash}-${channelIndex}.f64`;
    return join(this.directory, 'samples', contentHash.slice(0, 2), name);
  }

  plotPath(waveformId: number, run: number, plot: 'spectrum' | 'averaged-revolution'): string {
    return join(this.directory, 'plots', `${waveformId}-${run}-${plot}.f32`);
  }

  photoPath(inspectionId: number, contentHash: string, size: 'small' | 'full'): string {
    return join(this.directory, 'photos', String(inspectionId), `${contentHash}-${size}.jpg`);
  }

  /** Moves an arrived upload to its place; a file that is there already stays. */
  async keepOriginal(incomingPath: string, contentHash: string): Promise<void> {
    const path = this.originalPath(contentHash);
    await mkdir(dirname(path), { recursive: true });
    const file = await open(incomingPath, 'r');
    await file.sync();
    await file.close();
    await rename(incomingPath, path);
    await syncFolder(dirname(path));
  }

  async remove(path: string): Promise<void> {
    await rm(path, { force: true });
  }

  async write(path: string, bytes: Uint8Array): Promise<void> {
    await mkdir(dirname(path), { recursive: true });
    const unfinished = `${path}.${randomUUID()}.part`;
    await writeFile(unfinished, bytes, { flush: true });
    await rename(unfinished, path);
    await syncFolder(dirname(path));
  }

  /** Samples of a channel in the recorded unit; NaN marks a gap. */
  async readSamples(contentHash: string, channelIndex: number): Promise<Float64Array<ArrayBuffer>> {
    const file = await open(this.samplesPath(contentHash, channelIndex), 'r');
    try {
      const { size } = await file.stat();
      // Read into its own memory, which a worker can then be given without a copy.
      const samples = new Float64Array(size / 8);
      const { bytesRead } = await file.read(new Uint8Array(samples.buffer));
      if (bytesRead !== size) throw new Error(`The samples of ${contentHash} end early.`);
      return samples;
    } finally {
      await file.close();
    }
  }

  async readBytes(path: string): Promise<Buffer | null> {
    try {
      return await readFile(path);
    } catch (error) {
      if ((error as { code?: string }).code === 'ENOENT') return null;
      throw error;
    }
  }

  async exists(path: string): Promise<boolean> {
    return stat(path).then(
      () => true,
      () => false,
    );
  }
}

/** A name in a folder outlives a power cut only once the folder itself is on the disk. */
async function syncFolder(path: string): Promise<void> {
  const folder = await open(path, 'r');
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

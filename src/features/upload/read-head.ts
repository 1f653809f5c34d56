import { CsvError } from '#shared/signal/csv/csv-error.ts';
import {
  previewWaveformCsv,
  type WaveformCsvPreview,
} from '#shared/signal/csv/preview-waveform-csv.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { sketchOf, type Sketch } from './sketch.ts';

/** The whole of most recordings (16,384 rows), in a few milliseconds; the server reads the rest of longer ones. */
const headBytes = 256 * 1024;

/** Some turns of a machine; more would be a solid bar at this size. */
const sketchedSamples = 600;

export interface FileHead {
  preview: WaveformCsvPreview;
  /** Outline of each channel's beginning, in the order of the channels. */
  sketches: readonly Sketch[];
  /** Whether the preview saw the whole file. */
  isWhole: boolean;
}

/** Reads what a file says of itself from its first bytes. @throws what the browser throws for an unreadable file */
export async function readHead(file: File): Promise<FileHead> {
  const head = new Uint8Array(await file.slice(0, headBytes).arrayBuffer());
  const preview = previewWaveformCsv(head, file.size);
  return {
    preview,
    sketches: preview.csv === null ? [] : sketches(head),
    isWhole: head.length >= file.size,
  };
}

function sketches(head: Uint8Array): Sketch[] {
  const end = Math.max(head.lastIndexOf(10), head.lastIndexOf(13));
  try {
    const whole = end < 0 ? head : head.subarray(0, end + 1);
    return readWaveformCsv(whole).channels.map(({ samples }) =>
      sketchOf(samples.subarray(0, sketchedSamples)),
    );
  } catch (error) {
    // The picture is a help; a file that reads otherwise without its last row is not worth a fault.
    if (error instanceof CsvError) return [];
    throw error;
  }
}

import { CsvError } from '#shared/signal/csv/csv-error.ts';
import {
  previewWaveformCsv,
  type WaveformCsvPreview,
} from '#shared/signal/csv/preview-waveform-csv.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { sketchOf, type Sketch } from './sketch.ts';

/** Enough for some thousand rows; a longer file is read to its end by the server. */
const headBytes = 64 * 1024;

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
    return readWaveformCsv(whole).channels.map(({ samples }) => sketchOf(samples));
  } catch (error) {
    // The picture is a help; a file that reads otherwise without its last row is not worth a fault.
    if (error instanceof CsvError) return [];
    throw error;
  }
}

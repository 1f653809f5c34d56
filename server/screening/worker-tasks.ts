import type { CsvErrorCode } from '#shared/signal/csv/csv-error.ts';
import type {
  ReadWaveformCsvOptions,
  WaveformChannel,
  WaveformCsv,
} from '#shared/signal/csv/waveform-csv.ts';
import type {
  ScreeningInput,
  ScreeningLimits,
  ScreeningResult,
} from '#shared/signal/screening-types.ts';

/** Reads the CSV at a path. */
export interface ReadTask {
  task: 'read';
  path: string;
  options: ReadWaveformCsvOptions;
}

export type ReadChannel = Omit<WaveformChannel, 'samples'> & { samples: Float64Array<ArrayBuffer> };
export type ReadAnswer =
  | { read: Omit<WaveformCsv, 'channels'> & { channels: ReadChannel[] } }
  | { error: { code: CsvErrorCode; line: number | null; message: string } };

/** Screens one waveform; its samples are transferred, not copied. */
export interface ScreenTask {
  task: 'screen';
  input: ScreeningInput;
  /** In force for the machine; the method's own fill in what is absent. */
  limits: Partial<ScreeningLimits>;
}

export interface ScreenAnswer {
  result: ScreeningResult;
  spectrum: { stepHz: number; amplitudePeak: Float32Array<ArrayBuffer> };
  averagedRevolution: Float32Array<ArrayBuffer> | null;
}

export type WorkerTask = ReadTask | ScreenTask;

import {
  amplitudeSpectrum,
  windowNames,
  type WindowName,
} from '#shared/signal/amplitude-spectrum.ts';
import { maxSampleRateHz } from '#shared/signal/csv/csv-limits.ts';
import type { WaveformChannel } from '#shared/signal/csv/waveform-csv.ts';
import { ArgumentFault, readArguments, tellArgumentFaults } from './command-arguments.ts';
import { missingRate, readWaveformFile, type FileFault } from './waveform-files.ts';

/** A transform of any length needs some ten times the record's memory. */
const samplesMax = 2 ** 21;

/**
 * `spectrum FILE`: prints the amplitude spectrum of the whole record for checking by hand, in the
 * unit of the record, its mean as line 0; one JSON object a line for each channel.
 *
 * @returns exit status: 1 where the file or a channel could not be transformed, 2 for wrong arguments
 */
export function run(args: string[]): Promise<number> {
  return tellArgumentFaults('spectrum', () => printSpectra(args));
}

async function printSpectra(args: string[]): Promise<number> {
  const names = ['unit', 'window', 'sample-rate-hz', 'decimal-mark'];
  const { values, positionals } = readArguments(args, names);
  const window = windowNamed(values.text('window') ?? 'hann');
  const options = {
    unit: values.unit('unit'),
    sampleRateHz: values.positive('sample-rate-hz', maxSampleRateHz),
    decimalMark: values.decimalMark('decimal-mark'),
  };
  const [file, ...more] = positionals;
  if (file === undefined || more.length > 0) throw new ArgumentFault('Name one file.');

  const csv = await readWaveformFile(file, options);
  if ('fault' in csv) return fail(file, csv.fault);
  const { sampleRateHz } = csv;
  if (sampleRateHz === null) return fail(file, missingRate);
  let status = 0;
  for (const channel of csv.channels) {
    const fault = faultOf(channel);
    if (fault === null) printSpectrum(file, channel, sampleRateHz, window);
    else status = fail(file, fault, channel.name);
  }
  return status;
}

function windowNamed(name: string): WindowName {
  const window = windowNames.find((known) => known === name);
  if (window !== undefined) return window;
  throw new ArgumentFault(`--window is "${name}"; expected one of ${windowNames.join(', ')}.`);
}

function faultOf({ gapCount, samples }: WaveformChannel): FileFault | null {
  if (gapCount > 0) {
    const message = `The record has ${gapCount} gaps; expected none. Take another recording.`;
    return { code: 'gaps', line: null, message };
  }
  if (samples.length <= samplesMax) return null;
  const message =
    `The record has ${samples.length} samples; expected at most ${samplesMax}. ` +
    'Cut the recording.';
  return { code: 'too-many-samples', line: null, message };
}

function printSpectrum(
  file: string,
  { name, unit, samples }: WaveformChannel,
  sampleRateHz: number,
  window: WindowName,
): void {
  const { amplitudePeak } = amplitudeSpectrum(samples, sampleRateHz, window);
  // Not a sum of steps: the last line stands at half the rate to the last digit.
  const frequencyHz = Array.from(amplitudePeak, (_, i) => (i * sampleRateHz) / samples.length);
  const line = {
    frequencyHz,
    amplitudePeak: Array.from(amplitudePeak),
    file,
    channel: name,
    unit,
    sampleRateHz,
    window,
  };
  process.stdout.write(`${JSON.stringify(line)}\n`);
}

function fail(file: string, error: FileFault, channel?: string): number {
  const line = channel === undefined ? { file, error } : { file, channel, error };
  process.stdout.write(`${JSON.stringify(line)}\n`);
  return 1;
}

import { maxSampleRateHz, maxSpeedRpm } from '#shared/signal/csv/csv-limits.ts';
import type { WaveformChannel, WaveformCsv } from '#shared/signal/csv/waveform-csv.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import type { MachineFacts } from '#shared/signal/screening-types.ts';
import { ArgumentFault, readArguments, tellArgumentFaults } from './command-arguments.ts';
import { screeningLine } from './screening-line.ts';
import {
  findWaveformFiles,
  missingRate,
  readWaveformFile,
  type FileFault,
} from './waveform-files.ts';

const optionNames = [
  'speed-rpm',
  'sample-rate-hz',
  'unit',
  'decimal-mark',
  'line-frequency-hz',
  'machine',
];

/**
 * `screen FILE_OR_FOLDER…`: screens waveforms without a database, one JSON object a line for each
 * channel in the order given.
 *
 * @returns exit status: 1 where any file or channel could not be screened, 2 for wrong arguments
 */
export function run(args: string[]): Promise<number> {
  return tellArgumentFaults('screen', () => screenFiles(args));
}

async function screenFiles(args: string[]): Promise<number> {
  const { values, positionals } = readArguments(args, optionNames);
  const readOptions = {
    speedRpm: values.positive('speed-rpm', maxSpeedRpm),
    sampleRateHz: values.positive('sample-rate-hz', maxSampleRateHz),
    unit: values.unit('unit'),
    decimalMark: values.decimalMark('decimal-mark'),
  };
  const lineFrequencyHz = values.positive('line-frequency-hz', 1000);
  const machineFile = values.text('machine');
  if (positionals.length === 0) throw new ArgumentFault('Name a file or a folder of waveforms.');
  const warn = (message: string) => process.stderr.write(`fretline screen: ${message}\n`);
  const machine = machineFile === undefined ? {} : await readMachine(machineFile, warn);

  let status = 0;
  const fail = (file: string, error: FileFault, channel?: string) => {
    status = 1;
    print(channel === undefined ? { file, error } : { file, channel, error });
  };
  for (const found of await findWaveformFiles(positionals)) {
    const { file } = found;
    const read = 'fault' in found ? found : await readWaveformFile(file, readOptions);
    if ('fault' in read) {
      fail(file, read.fault);
    } else if (read.sampleRateHz === null) {
      fail(file, missingRate);
    } else {
      const facts = machineFacts(machine, read, lineFrequencyHz);
      for (const channel of read.channels) {
        const fault = screenChannel(file, read, read.sampleRateHz, channel, facts);
        if (fault !== null) fail(file, fault, channel.name);
      }
    }
  }
  return status;
}

/** Prints the line of one channel. @returns why it can't be screened, or null */
function screenChannel(
  file: string,
  csv: WaveformCsv,
  sampleRateHz: number,
  channel: WaveformChannel,
  machine: MachineFacts,
): FileFault | null {
  const { samples, unit } = channel;
  if (unit === null) return missingUnit(channel);
  const input = {
    samples,
    sampleRateHz,
    unit,
    toldSpeedRpm: csv.speedRpm ?? undefined,
    fullScale: csv.comments.fullScale,
    machine,
  };
  try {
    print(screeningLine(file, csv, channel, screenWaveform(input).result));
    return null;
  } catch (error) {
    // A fault of the method must not keep the other waveforms from being screened.
    const message = error instanceof Error ? error.message : String(error);
    return { code: 'screening-failed', line: null, message };
  }
}

/** The schema is loaded where it is needed only: it would make every start a little slower. */
async function readMachine(path: string, warn: (message: string) => void): Promise<MachineFacts> {
  const { readMachineFile } = await import('./machine-file.ts');
  return readMachineFile(path, warn);
}

/** A told value before the file's own, the file's own before the machine's: it is the closer one. */
function machineFacts(
  machine: MachineFacts,
  csv: WaveformCsv,
  lineFrequencyHz: number | undefined,
): MachineFacts {
  return {
    ...machine,
    lineFrequencyHz: lineFrequencyHz ?? csv.comments.lineFrequencyHz ?? machine.lineFrequencyHz,
    assetKind: csv.comments.assetKind ?? machine.assetKind,
  };
}

function missingUnit({ unitText, columnIndex }: WaveformChannel): FileFault {
  const found =
    unitText === null ? 'names no unit' : `names the unit "${unitText}", which is none of ours`;
  return {
    code: 'unit-missing',
    line: null,
    message:
      `The header of column ${columnIndex + 1} ${found}; expected g, m/s², mm/s, in/s, µm or mil ` +
      'in brackets. Add it to the header, or tell it with --unit.',
  };
}

function print(line: object): void {
  process.stdout.write(`${JSON.stringify(line)}\n`);
}

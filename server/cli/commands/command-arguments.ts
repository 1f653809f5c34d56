import { parseArgs, type ParseArgsConfig } from 'node:util';
import { parseUnit } from '#shared/quantities/parse-unit.ts';
import { units, type Unit } from '#shared/quantities/quantity.ts';
import { decimalMarks, type DecimalMark } from '#shared/signal/csv/waveform-csv.ts';

/** A fault of the command line itself: told on standard error, exit status 2. */
export class ArgumentFault extends Error {}

/** Parses options and positional arguments. @throws {ArgumentFault} where an option is unknown */
export function readArguments(args: string[], names: readonly string[]) {
  const options: ParseArgsConfig['options'] = {};
  for (const name of names) options[name] = { type: 'string', multiple: true };
  try {
    const { values, positionals } = parseArgs({ args, options, allowPositionals: true });
    return { values: new CommandOptions(values), positionals };
  } catch (error) {
    throw new ArgumentFault((error as Error).message);
  }
}

/** The options given, each checked where it is asked for. */
export class CommandOptions {
  constructor(private readonly values: Readonly<Record<string, unknown>>) {}

  text(name: string): string | undefined {
    const given = this.values[name] as string[] | undefined;
    if (given === undefined) return undefined;
    if (new Set(given).size > 1) {
      throw new ArgumentFault(`--${name} is given twice: ${given.join(' and ')}.`);
    }
    return given[0];
  }

  /** @returns a number above 0 and at most `max` */
  positive(name: string, max: number): number | undefined {
    const text = this.text(name);
    if (text === undefined) return undefined;
    const value = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/iu.test(text) ? Number(text) : NaN;
    if (!(value > 0 && value <= max)) {
      throw new ArgumentFault(
        `--${name} is "${text}"; expected a number above 0 and at most ${max}, with a decimal point.`,
      );
    }
    return value;
  }

  decimalMark(name: string): DecimalMark | undefined {
    const text = this.text(name);
    if (text === undefined) return undefined;
    const mark = decimalMarks.find((known) => known === text);
    if (mark === undefined) throw new ArgumentFault(`--${name} is "${text}"; expected . or ,`);
    return mark;
  }

  unit(name: string): Unit | undefined {
    const text = this.text(name);
    if (text === undefined) return undefined;
    const unit = parseUnit(text);
    if (unit === null) {
      throw new ArgumentFault(`--${name} is "${text}"; expected one of ${units.join(', ')}.`);
    }
    return unit;
  }
}

/**
 * Runs a command and tells faults of its arguments.
 *
 * @returns the command's exit status; 2 for wrong arguments
 */
export async function tellArgumentFaults(
  command: string,
  work: () => Promise<number>,
): Promise<number> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof ArgumentFault)) throw error;
    process.stderr.write(`fretline ${command}: ${error.message}\nSee: fretline help\n`);
    return 2;
  }
}

import { createReadStream } from 'node:fs';
import { createInterface } from 'node:readline';
import type { Readable } from 'node:stream';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { readPositionFit } from '#shared/fits/read-position-fit.ts';
import { faultLine } from './fit-fault.ts';

/** Finished limits are exact (halves, quarters of IT1); everything else is a calculation. */
const exactKeys = new Set(['seatLimitsUm', 'ringLimitsUm']);
const decimalsOf = (key: string) => (key === 'chanceOfClearance' ? 4 : 1);

function rounded(value: unknown, key: string): unknown {
  if (typeof value === 'number') {
    const scale = 10 ** decimalsOf(key);
    return Math.round(value * scale) / scale + 0;
  }
  if (exactKeys.has(key) || typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) return value.map((item) => rounded(item, key));
  return Object.fromEntries(
    Object.entries(value).map(([name, item]) => [
      name,
      // min, mean and max take the decimals of what they belong to.
      rounded(item, name === 'min' || name === 'mean' || name === 'max' ? key : name),
    ]),
  );
}

function parseLine(line: string): unknown {
  try {
    return JSON.parse(line) as unknown;
  } catch (error) {
    // Scripts of other languages write NaN and Infinity, which JSON does not have.
    const loose = /"([^"]+)"\s*:\s*-?(?:NaN|Infinity)\b/i.exec(line);
    if (loose?.[1]) {
      throw new FitInputError('not_finite', loose[1], `${loose[1]} must be a finite number.`);
    }
    throw new FitInputError('not_json', '', `Not JSON: ${(error as Error).message}`);
  }
}

function answer(line: string): { text: string; isFault: boolean } {
  try {
    const assessment = assessSeats(readPositionFit(parseLine(line)));
    return { text: JSON.stringify(rounded(assessment, '')), isFault: false };
  } catch (error) {
    return { text: JSON.stringify(faultLine(error)), isFault: true };
  }
}

async function answerAll(input: Readable): Promise<number> {
  let status = 0;
  for await (const line of createInterface({ input, crlfDelay: Infinity })) {
    // A byte order mark and blank lines carry no question.
    const text = line.replace(/^\uFEFF/, '').trim();
    if (text === '') continue;
    const { text: output, isFault } = answer(text);
    if (isFault) status = 1;
    process.stdout.write(`${output}\n`);
  }
  return status;
}

/**
 * `fit [FILE]`: one JSON object a line in (standard input without FILE), one out.
 *
 * @returns exit status: 1 where any line could not be answered
 */
export async function run(args: string[]): Promise<number> {
  const [file, ...more] = args;
  if (more.length > 0) {
    process.stderr.write('Usage: fretline fit [FILE]\n');
    return 1;
  }
  if (file === undefined || file === '-') return answerAll(process.stdin);
  try {
    return await answerAll(createReadStream(file, 'utf8'));
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    if (code === undefined) throw error;
    const fault = { error: { code: 'unreadable_file', field: 'FILE', message } };
    process.stdout.write(`${JSON.stringify(fault)}\n`);
    return 1;
  }
}

import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { run } from '#server/cli/commands/fit.ts';

interface Answer {
  shaftSeat?: { interferenceUm?: unknown; probableUm?: { min: number }; seatLimitsUm?: unknown };
  housingSeat?: unknown;
  mounting?: { neededC: number };
  error?: { code: string; field: string; message: string };
}

let folder = '';
let output = '';

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'fretline-fit-'));
  output = '';
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    output += String(text);
    return true;
  });
});

afterEach(() => {
  vi.restoreAllMocks();
  rmSync(folder, { recursive: true });
});

function parse(text: string): Answer[] {
  return text
    .trim()
    .split('\n')
    .map((line) => JSON.parse(line) as Answer);
}

async function fit(lines: string): Promise<{ status: number; answers: Answer[] }> {
  const file = join(folder, 'positions.jsonl');
  writeFileSync(file, lines);
  const status = await run([file]);
  return { status, answers: parse(output) };
}

describe('fretline fit', () => {
  it('answers each line with one line, in the order given', async () => {
    const { status, answers } = await fit(
      '{"designation": "6312", "shaftClass": "k5"}\n\n{"d": 40, "shaftClass": "m6"}\r\n',
    );
    expect(status).toBe(0);
    expect(answers).toHaveLength(2);
    expect(answers[0]?.shaftSeat?.interferenceUm).toEqual({ min: 2, mean: 16, max: 30 });
    expect(answers[1]?.shaftSeat?.interferenceUm).toEqual({ min: 9, mean: 23, max: 37 });
    expect(answers[1]).not.toHaveProperty('housingSeat');
  });

  it('rounds to a tenth and keeps the halves of the limits', async () => {
    const { answers } = await fit('{"d": 25, "shaftClass": "js7"}');
    expect(answers[0]?.shaftSeat?.seatLimitsUm).toEqual([-10.5, 10.5]);
    // 5 − √(10.5² + 5²) = −6.63
    expect(answers[0]?.shaftSeat?.probableUm?.min).toBe(-6.6);
  });

  it('names code and field of a bad line, answers the others and ends with status 1', async () => {
    const { status, answers } = await fit(
      [
        '{"d": 60, "shaftClass": "q5"}',
        '{"d": 60, "colour": "red"}',
        '{"d": NaN}',
        'not json',
        '{"d": 60, "shaftMeasuredMm": 2.3622}',
        '{"d": 60, "shaftClass": "k5"}',
      ].join('\n'),
    );
    expect(status).toBe(1);
    expect(answers.map((a) => a.error && [a.error.code, a.error.field])).toEqual([
      ['unknown_class', 'shaftClass'],
      ['unknown_key', 'colour'],
      ['not_finite', 'd'],
      ['not_json', ''],
      ['measured_in_inches', 'shaftMeasuredMm'],
      undefined,
    ]);
  });

  it('says so where the file can’t be read', async () => {
    expect(await run([join(folder, 'absent.jsonl')])).toBe(1);
    expect(parse(output)[0]?.error?.code).toBe('unreadable_file');
  });

  it('reads standard input without a file', () => {
    const script =
      "import('./server/cli/commands/fit.ts').then(async (m) => { process.exitCode = await m.run([]); });";
    const child = spawnSync(
      process.execPath,
      ['--import', 'tsx', '--input-type=module', '-e', script],
      {
        input: '{"designation": "6312", "shaftClass": "k5"}\n{"d": -1}\n',
        encoding: 'utf8',
      },
    );
    expect(child.stderr).toBe('');
    expect(parse(child.stdout)[0]?.mounting?.neededC).toBe(60);
    expect(parse(child.stdout)[1]?.error?.code).toBe('size_out_of_range');
    expect(child.status).toBe(1);
  });
});

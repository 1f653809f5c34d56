import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { run } from '#server/cli/commands/limits.ts';

let output = '';

beforeEach(() => {
  output = '';
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    output += String(text);
    return true;
  });
});

afterEach(() => {
  vi.restoreAllMocks();
});

const lines = () =>
  output
    .trim()
    .split('\n')
    .map((line) => JSON.parse(line) as unknown);

describe('fretline limits', () => {
  it('prints size, class and both deviations, one line each', async () => {
    expect(await run(['40 k5', '80 H7', '25 js7'])).toBe(0);
    expect(lines()).toEqual([
      { size: 40, class: 'k5', lowerUm: 2, upperUm: 13 },
      { size: 80, class: 'H7', lowerUm: 0, upperUm: 30 },
      { size: 25, class: 'js7', lowerUm: -10.5, upperUm: 10.5 },
    ]);
  });

  it('names the fault of a bad argument and still answers the others', async () => {
    expect(await run(['40 q5', '600 H7', 'forty k5', '40', '40 k5'])).toBe(1);
    expect(lines()).toMatchObject([
      { error: { code: 'unknown_class', field: 'class' } },
      { error: { code: 'size_out_of_range', field: 'size' } },
      { error: { code: 'not_finite', field: 'size' } },
      { error: { code: 'unknown_class', field: 'class' } },
      { size: 40, class: 'k5' },
    ]);
  });
});

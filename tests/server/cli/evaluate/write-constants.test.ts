import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { withConstants } from '#server/cli/evaluate/write-constants.ts';
import { scoreConstants } from '#shared/signal/score-constants.ts';

const path = new URL('../../../../shared/signal/score-constants.ts', import.meta.url);
const text = readFileSync(path, 'utf8');

describe('withConstants', () => {
  it('changes the numbers and leaves every other word of the file', () => {
    const changed = withConstants(text, { ...scoreConstants, base: -1.25 });
    expect(changed).toContain('base: -1.25,');
    expect(changed.replace(/-?\d[\d.e-]*/g, '#')).toBe(text.replace(/-?\d[\d.e-]*/g, '#'));
  });

  it('refuses a file that lacks a constant', () => {
    expect(() => withConstants('export const none = {};', scoreConstants)).toThrow(/no line for/);
  });
});

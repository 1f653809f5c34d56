import { describe, expect, it } from 'vitest';
import { parseToleranceClass } from '#shared/fits/tolerance-class.ts';

describe('parseToleranceClass', () => {
  it('tells shafts from holes by the letter', () => {
    expect(parseToleranceClass('js6')).toEqual({ seat: 'shaft', letter: 'js', grade: 6 });
    expect(parseToleranceClass('JS6')).toEqual({ seat: 'housing', letter: 'JS', grade: 6 });
    expect(parseToleranceClass(' H 7 ')).toEqual({ seat: 'housing', letter: 'H', grade: 7 });
  });

  it.each([
    '',
    'k',
    '5',
    'x5',
    'Js6',
    'jS6',
    'c9',
    't6',
    'S7',
    'k0',
    'k15',
    'j4',
    'j8',
    'J5',
    'J9',
    'K9',
    'k5.5',
    'H7/k6',
    'h-6',
  ])('refuses "%s" and names the field', (text) => {
    expect(() => parseToleranceClass(text, 'shaftClass')).toThrow(
      expect.objectContaining({ code: 'unknown_class', field: 'shaftClass' }),
    );
  });
});

import { describe, expect, it } from 'vitest';
import { canShow } from '#server/features/papers/paper-fonts.ts';
import {
  cutLines,
  linesOf,
  runsOf,
  withoutRaisedMinus,
  type Typesetter,
} from '#server/features/papers/text-lines.ts';

/** Every sign one wide, so that a width is a count of signs. */
const setter: Typesetter = { canShow, widthOf: ({ text }) => [...text].length };
const lines = (text: string, width: number) => linesOf(text, width, 'text', setter);

describe('text on paper', () => {
  it('has every sign that the product writes in its own faces', () => {
    for (const sign of 'µ²×–½°±≤≥→Ø−’“”…ŁőŞąΔΩπ\u00a0') {
      expect({ sign, shown: canShow('text', sign) }).toEqual({ sign, shown: true });
    }
    for (const sign of '0123456789.,−+µ°/\u00a0') expect(canShow('figures', sign)).toBe(true);
  });

  it('borrows what a face lacks, and shows a box for what no font has', () => {
    expect(runsOf('a α 機', 'text', setter)).toEqual([
      { text: 'a ', face: 'text' },
      { text: 'α', face: 'signs' },
      { text: ' ', face: 'text' },
      { text: '□', face: 'signs' },
    ]);
  });

  it('writes a power of ten without the raised minus that no font has', () => {
    expect(canShow('text', '⁻') || canShow('signs', '⁻')).toBe(false);
    expect(withoutRaisedMinus('1.2 × 10⁻¹⁶ m²')).toBe('1.2 × 10^−16 m²');
  });

  it('breaks at spaces and at line ends, never at a no-break space', () => {
    expect(lines('one two three\nfour', 7)).toEqual(['one two', 'three', 'four']);
    expect(lines('at 20\u00a0mm', 6)).toEqual(['at', '20\u00a0mm']);
  });

  it('breaks a word that alone is too wide, and ends for a width of nothing', () => {
    expect(lines('abcdefgh ij', 3)).toEqual(['abc', 'def', 'gh', 'ij']);
    expect(lines('abc', 0)).toEqual(['a', 'b', 'c']);
  });

  it('tells by an ellipsis that something was cut off', () => {
    expect(cutLines(['one', 'two', 'three'], 2, 3, 'text', setter)).toEqual(['one', 'tw…']);
    expect(cutLines(['one'], 2, 3, 'text', setter)).toEqual(['one']);
  });
});

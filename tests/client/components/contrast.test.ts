import { describe, expect, it } from 'vitest';
import { palettes, type PaletteToken } from '../../../tailwind.config.ts';

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * (r ?? 0) + 0.7152 * (g ?? 0) + 0.0722 * (b ?? 0);
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return ((light ?? 0) + 0.05) / ((dark ?? 0) + 0.05);
}

const grounds: PaletteToken[] = ['paper', 'sheet', 'well'];
const texts: PaletteToken[] = ['ink', 'ink-soft', 'ink-faint', 'evidence', 'fit'];
/** Text on a coloured ground, and the reversed text of buttons and messages. */
const otherTexts: [PaletteToken, PaletteToken][] = [
  ['paper', 'ink'],
  ['paper', 'ink-soft'],
  ['ink', 'evidence-wash'],
  ['evidence', 'evidence-wash'],
  ['ink', 'fit-wash'],
  ['fit', 'fit-wash'],
];
/** Edges of inputs, strokes and marks that carry meaning: WCAG 1.4.11. */
const strokes: PaletteToken[] = ['rule', 'evidence', 'fit', 'explained'];

describe.each(Object.entries(palettes))('the %s paper', (_theme, palette) => {
  it.each(texts.flatMap((text) => grounds.map((ground) => [text, ground] as const)))(
    'lets %s be read on %s (WCAG 2.2, 1.4.3: 4.5 to 1)',
    (text, ground) => {
      expect(contrast(palette[text], palette[ground])).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(otherTexts)('lets %s be read on %s', (text, ground) => {
    expect(contrast(palette[text], palette[ground])).toBeGreaterThanOrEqual(4.5);
  });

  it.each(
    strokes.flatMap((stroke) => (['paper', 'sheet'] as const).map((g) => [stroke, g] as const)),
  )('lets a stroke in %s be seen on %s (WCAG 2.2, 1.4.11: 3 to 1)', (stroke, ground) => {
    expect(contrast(palette[stroke], palette[ground])).toBeGreaterThanOrEqual(3);
  });
});

describe('the contrast formula', () => {
  it('gives 21 for black on white and 4.54 for #767676 on white', () => {
    // Both are the examples everybody checks WCAG calculators with; the second from memory.
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
  });
});

import { describe, expect, it } from 'vitest';
import {
  cursorLines,
  cursorOfKind,
  draggedCursor,
  gripAt,
  scaledCursor,
  steppedCursor,
  type SpectrumCursor,
} from '#src/charts/spectrum-cursor.ts';
import { amplitudeTextOf, cursorReading, readingAt } from '#src/charts/spectrum-reading.ts';

const whole = { min: 0, max: 200 };
const family: SpectrumCursor = { kind: 'harmonics', of: 24 };
const sides: SpectrumCursor = { kind: 'sidebands', about: 100, spacing: 10 };
const key = (overrides: object = {}) => ({ along: 0, spacing: 0, isFast: false, ...overrides });

describe('the lines of a cursor', () => {
  it('are the multiples in sight', () => {
    expect(cursorLines(family, { min: 40, max: 100 }).map(({ x, label }) => [x, label])).toEqual([
      [48, '2'],
      [72, '3'],
      [96, '4'],
    ]);
  });

  it('are ten on either side of a centre, none below zero', () => {
    const lines = cursorLines({ kind: 'sidebands', about: 15, spacing: 10 }, whole);
    expect(lines.map(({ label }) => label).slice(0, 3)).toEqual(['−1', '0', '+1']);
    expect(lines).toHaveLength(12);
  });

  it('are none where no cursor is set', () => {
    expect(cursorLines({ kind: 'free', at: null }, whole)).toEqual([]);
  });
});

describe('dragging a cursor', () => {
  it('moves the fundamental by the held multiple’s share', () => {
    const grip = gripAt(family, 73, 2);
    expect(grip).toEqual({ line: 3 });
    expect(grip && draggedCursor(family, grip, 75, 0.5)).toEqual({ kind: 'harmonics', of: 25 });
  });

  it('moves a centre, or the spacing by a sideband on either side', () => {
    expect(draggedCursor(sides, { line: 0 }, 90, 0.5)).toEqual({ ...sides, about: 90 });
    expect(draggedCursor(sides, { line: -2 }, 76, 0.5)).toEqual({ ...sides, spacing: 12 });
  });

  it('never lets a family fall into one line', () => {
    expect(draggedCursor(sides, { line: 1 }, 60, 0.5)).toEqual({ ...sides, spacing: 0.5 });
  });

  it('takes hold of nothing between the lines', () => {
    expect(gripAt(family, 60, 2)).toBeNull();
    expect(gripAt(family, 1, 2)).toBeNull();
    expect(gripAt({ kind: 'free', at: null }, 1, 2)).toBeNull();
  });
});

describe('moving a cursor by keys', () => {
  const stepped = (cursor: SpectrumCursor, overrides: object) =>
    steppedCursor(cursor, key(overrides), 0.5, { min: 40, max: 60 }, whole);

  it('begins in the middle of what is in sight and goes from line to line', () => {
    const first = stepped({ kind: 'free', at: null }, { along: 1 });
    expect(first).toEqual({ kind: 'free', at: 50 });
    expect(stepped(first, { along: 1 })).toEqual({ kind: 'free', at: 50.5 });
    expect(stepped(first, { along: -1, isFast: true })).toEqual({ kind: 'free', at: 45 });
  });

  it('stays on the spectrum', () => {
    expect(stepped({ kind: 'free', at: 200 }, { along: 1 })).toEqual({ kind: 'free', at: 200 });
  });

  it('tunes a fundamental and a spacing finer than the lines lie', () => {
    expect(stepped(family, { along: 1 })).toEqual({ kind: 'harmonics', of: 24.05 });
    expect(stepped(sides, { spacing: -1, isFast: true })).toEqual({ ...sides, spacing: 9.5 });
  });
});

describe('choosing another cursor', () => {
  it('begins where the one before was, one order apart', () => {
    const free: SpectrumCursor = { kind: 'free', at: 48 };
    expect(cursorOfKind('harmonics', free, 25, whole)).toEqual({ kind: 'harmonics', of: 48 });
    expect(cursorOfKind('sidebands', free, 25, whole)).toEqual({
      kind: 'sidebands',
      about: 48,
      spacing: 25,
    });
    expect(cursorOfKind('harmonics', { kind: 'free', at: null }, 25, whole)).toEqual({
      kind: 'harmonics',
      of: 25,
    });
  });

  it('keeps its place on an axis of another unit', () => {
    expect(scaledCursor(sides, 60)).toEqual({ kind: 'sidebands', about: 6000, spacing: 600 });
    expect(scaledCursor({ kind: 'free', at: null }, 60)).toEqual({ kind: 'free', at: null });
  });
});

describe('what a cursor reads', () => {
  const amplitude = new Float32Array(400).fill(0.01);
  for (const order of [1, 2, 3]) amplitude[order * 50] = 3 / order;
  const readable = {
    spectrum: { stepHz: 0.5, amplitude },
    speedHz: 25,
    unitsPerHz: 1 / 25,
    amplitudeText: { figure: (value: number) => value.toFixed(2), unit: 'mm/s peak' },
  };

  it('is frequency, order and amplitude of the line', () => {
    expect(readingAt(readable, 2)).toBe('50.00 Hz  3000 1/min  2.00×  1.50 mm/s peak');
  });

  it('is the greatest line near each multiple', () => {
    const text = cursorReading(readable, { kind: 'harmonics', of: 0.99 });
    expect(text).toBe(
      'Harmonics of 24.75 Hz (0.990×)  1× 3.00  2× 1.50  3× 1.00  4× 0.01  5× 0.01 mm/s peak',
    );
  });

  it('gives levels in dB, and none of nothing', () => {
    const { figure, unit } = amplitudeTextOf('dB re 1 nm/s, rms', () => 120.04);
    expect([figure(1), figure(0), unit]).toEqual(['120.0', 'no level', 'dB']);
  });

  it('is the centre, its neighbours and how far they are apart', () => {
    const text = cursorReading(readable, { kind: 'sidebands', about: 2, spacing: 1 });
    expect(text).toBe(
      'Sidebands of 50.00 Hz (2.000×) at 25.00 Hz (1.000×)  −1 3.00  0 1.50  +1 1.00 mm/s peak',
    );
  });
});

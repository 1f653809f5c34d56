import type { Window } from './plot-window.ts';

/** What is set into a spectrum to read it by; places in the unit of the x axis. */
export type SpectrumCursor =
  | { kind: 'free'; at: number | null }
  | { kind: 'harmonics'; of: number }
  | { kind: 'sidebands'; about: number; spacing: number };

export interface CursorLine {
  x: number;
  label: string;
  /** The line the others hang on. */
  isMain: boolean;
}

/** Further ones say nothing and fill the plot. */
const harmonicsMax = 40;
const sidebandsMax = 10;

/** The cursor's lines in a window. */
export function cursorLines(cursor: SpectrumCursor, { min, max }: Window): CursorLine[] {
  const lines: CursorLine[] = [];
  if (cursor.kind === 'free') {
    if (cursor.at !== null) lines.push({ x: cursor.at, label: '', isMain: true });
  } else if (cursor.kind === 'harmonics') {
    for (let k = 1; k <= harmonicsMax; k += 1) {
      lines.push({ x: k * cursor.of, label: `${k}`, isMain: k === 1 });
    }
  } else {
    for (let k = -sidebandsMax; k <= sidebandsMax; k += 1) {
      const label = k === 0 ? '0' : k > 0 ? `+${k}` : `−${-k}`;
      lines.push({ x: cursor.about + k * cursor.spacing, label, isMain: k === 0 });
    }
  }
  return lines.filter(({ x }) => x >= Math.max(0, min) && x <= max);
}

/** The line one has hold of: its number in the family, 0 for a free cursor or the centre. */
export interface Grip {
  line: number;
}

/** What the pointer can take hold of within `reach` of it. */
export function gripAt(cursor: SpectrumCursor, x: number, reach: number): Grip | null {
  if (cursor.kind === 'free') {
    return cursor.at !== null && Math.abs(x - cursor.at) <= reach ? { line: 0 } : null;
  }
  if (cursor.kind === 'harmonics') {
    const line = Math.round(x / cursor.of);
    const isThere = line >= 1 && line <= harmonicsMax;
    return isThere && Math.abs(x - line * cursor.of) <= reach ? { line } : null;
  }
  const line = Math.round((x - cursor.about) / cursor.spacing);
  const isThere = Math.abs(line) <= sidebandsMax;
  return isThere && Math.abs(x - cursor.about - line * cursor.spacing) <= reach ? { line } : null;
}

/** The cursor with the held line moved to `x`; `least` keeps a family from falling into one line. */
export function draggedCursor(
  cursor: SpectrumCursor,
  { line }: Grip,
  x: number,
  least: number,
): SpectrumCursor {
  if (cursor.kind === 'free') return { kind: 'free', at: Math.max(0, x) };
  if (cursor.kind === 'harmonics') return { ...cursor, of: Math.max(least, x / line) };
  if (line === 0) return { ...cursor, about: Math.max(0, x) };
  return { ...cursor, spacing: Math.max(least, (x - cursor.about) / line) };
}

/** How the arrow keys move a cursor. */
export interface CursorKey {
  /** −1, 0 or 1 along the axis, and −1, 0 or 1 of the spacing. */
  along: number;
  spacing: number;
  isFast: boolean;
}

/**
 * The cursor after an arrow key: a free one or a centre goes by lines (ten when fast), a
 * fundamental or a spacing by tenths of a line (whole ones when fast), since its twentieth multiple
 * goes twenty times as far.
 *
 * @param lineStep - distance of two lines in the unit of the axis
 * @param view - in sight: a free cursor that is nowhere begins in its middle
 */
export function steppedCursor(
  cursor: SpectrumCursor,
  key: CursorKey,
  lineStep: number,
  view: Window,
  whole: Window,
): SpectrumCursor {
  const lines = key.along * (key.isFast ? 10 : 1);
  const fine = lineStep * (key.isFast ? 1 : 0.1);
  const onLine = (from: number, by: number) =>
    Math.min(whole.max, Math.max(whole.min, (Math.round(from / lineStep) + by) * lineStep));
  if (cursor.kind === 'free') {
    const from = cursor.at ?? (view.min + view.max) / 2;
    return { kind: 'free', at: onLine(from, cursor.at === null ? 0 : lines) };
  }
  if (cursor.kind === 'harmonics') {
    const of = cursor.of + key.along * fine;
    return { ...cursor, of: Math.min(whole.max, Math.max(lineStep, of)) };
  }
  return {
    ...cursor,
    about: key.along === 0 ? cursor.about : onLine(cursor.about, lines),
    spacing: Math.max(lineStep, cursor.spacing + key.spacing * fine),
  };
}

/** Where a cursor of another kind begins: on what was read before, one turn of the shaft apart. */
export function cursorOfKind(
  kind: SpectrumCursor['kind'],
  cursor: SpectrumCursor,
  turn: number | null,
  view: Window,
): SpectrumCursor {
  if (kind === cursor.kind) return cursor;
  const at = placeOf(cursor);
  const spacing = turn ?? (view.max - view.min) / 20;
  if (kind === 'free') return { kind, at };
  if (kind === 'harmonics') return { kind, of: at !== null && at > 0 ? at : spacing };
  return { kind, about: at ?? (view.min + view.max) / 2, spacing };
}

/** The place the arrow keys move. */
export function placeOf(cursor: SpectrumCursor): number | null {
  if (cursor.kind === 'free') return cursor.at;
  return cursor.kind === 'harmonics' ? cursor.of : cursor.about;
}

/** The same cursor on an axis of another unit. */
export function scaledCursor(cursor: SpectrumCursor, factor: number): SpectrumCursor {
  if (cursor.kind === 'free') return { ...cursor, at: cursor.at && cursor.at * factor };
  if (cursor.kind === 'harmonics') return { ...cursor, of: cursor.of * factor };
  return { ...cursor, about: cursor.about * factor, spacing: cursor.spacing * factor };
}

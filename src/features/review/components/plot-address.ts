import type { SpectrumCursor } from '#src/charts/spectrum-cursor.ts';
import type { Window } from '#src/charts/plot-window.ts';

/** Zoom and cursor as the address keeps them; places in the unit of the frequency axis, and s. */
export interface PlotPlaces {
  window: Window | null;
  cursor: SpectrumCursor;
  /** Stretch of the waveform, s. */
  stretchS: Window | null;
}

export const placeNames = { window: 'zoom', cursor: 'cursor', stretchS: 'time' } as const;

const noCursor: SpectrumCursor = { kind: 'free', at: null };

/** Six figures: more than a pixel can tell. */
const numberText = (value: number) => String(Number(value.toPrecision(6)));

/** "0.5_6.2"; nothing for the whole. */
export const windowText = (window: Window | null): string | undefined =>
  window === null ? undefined : `${numberText(window.min)}_${numberText(window.max)}`;

/** "4.98", "harmonics_1", "sidebands_44.1_1"; nothing where none is set. */
export function cursorText(cursor: SpectrumCursor): string | undefined {
  if (cursor.kind === 'free') return cursor.at === null ? undefined : numberText(cursor.at);
  if (cursor.kind === 'harmonics') return `harmonics_${numberText(cursor.of)}`;
  return `sidebands_${numberText(cursor.about)}_${numberText(cursor.spacing)}`;
}

/** @returns the places, and what of the address could not be understood, in sentences */
export function readPlotPlaces(search: URLSearchParams): PlotPlaces & { problems: string[] } {
  const problems: string[] = [];
  const read = <Value>(
    name: string,
    what: string,
    otherwise: Value,
    parse: (text: string) => Value | null,
  ): Value => {
    const text = search.get(name);
    if (text === null) return otherwise;
    const value = parse(text);
    if (value === null) problems.push(`“${text}” is no ${what}.`);
    return value ?? otherwise;
  };
  return {
    window: read<Window | null>(placeNames.window, 'stretch of a spectrum', null, readWindow),
    cursor: read(placeNames.cursor, 'cursor', noCursor, readCursor),
    stretchS: read<Window | null>(placeNames.stretchS, 'stretch of a waveform', null, readWindow),
    problems,
  };
}

function readNumbers(texts: readonly string[], count: number): number[] | null {
  const values = texts.map((text) => (text.trim() === '' ? Number.NaN : Number(text)));
  return values.length === count && values.every((value) => value >= 0 && value < Infinity)
    ? values
    : null;
}

function readWindow(text: string): Window | null {
  const [min, max] = readNumbers(text.split('_'), 2) ?? [];
  return min !== undefined && max !== undefined && max > min ? { min, max } : null;
}

function readCursor(text: string): SpectrumCursor | null {
  const [kind, ...rest] = text.split('_');
  if (kind === 'harmonics') {
    const [of] = readNumbers(rest, 1) ?? [];
    return of !== undefined && of > 0 ? { kind, of } : null;
  }
  if (kind === 'sidebands') {
    const [about, spacing] = readNumbers(rest, 2) ?? [];
    const isThere = about !== undefined && spacing !== undefined && spacing > 0;
    return isThere ? { kind, about, spacing } : null;
  }
  const [at] = readNumbers(text.split('_'), 1) ?? [];
  return at === undefined ? null : { kind: 'free', at };
}

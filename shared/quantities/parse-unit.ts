import type { Unit } from './quantity.ts';

/**
 * Spellings seen in headers of exported waveforms, after folding (see `fold`). Peak, peak-to-peak
 * and rms are no units: a waveform is recorded in plain units, so `g rms` is not in the list.
 */
const spellings: ReadonlyMap<string, Unit> = new Map([
  ...spell('g', 'g', 'gs', "g's", 'gn', 'g_n', 'g0'),
  ...spell(
    'm/s²',
    'm/s2',
    'm/s^2',
    'm/s**2',
    'm/s/s',
    'm/sec2',
    'm/sec^2',
    'ms-2',
    'm*s-2',
    'm.s-2',
    'ms^-2',
    'm*s^-2',
    'm/(s^2)',
  ),
  ...spell('mm/s', 'mm/s', 'mm/sec', 'mms-1', 'mm*s-1', 'mm.s-1', 'mms^-1', 'mm*s^-1', 'mmps'),
  ...spell('in/s', 'in/s', 'in/sec', 'inch/s', 'inch/sec', 'inches/s', 'inches/sec', 'ips'),
  ...spell(
    'µm',
    'um',
    'micron',
    'microns',
    'micrometer',
    'micrometers',
    'micrometre',
    'micrometres',
  ),
  ...spell('mil', 'mil', 'mils', 'thou', 'thous'),
]);

function spell(unit: Unit, ...texts: string[]): [string, Unit][] {
  return texts.map((text) => [text, unit]);
}

/**
 * Brings the ways of writing one unit together: blanks out, both micro signs (U+00B5 and U+03BC) to
 * `u`, superscripts to digits, the multiplication dots to `*`, U+2212 to `-`.
 *
 * Case is folded too, for `G` and `MM/S`; no unit of ours differs from another one by case alone.
 */
function fold(text: string): string {
  return text
    .replace(/[\s\u00a0\u2009\u202f]+/gu, '')
    .replace(/[µμ]/gu, 'u')
    .replace(/²/gu, '2')
    .replace(/¹/gu, '1')
    .replace(/[⁻−]/gu, '-')
    .replace(/[·⋅∙]/gu, '*')
    .replace(/[∕⁄]/gu, '/')
    .toLowerCase();
}

/**
 * Reads a unit as people and recorders write it: `um`, `µm`, `μm`, `m/s2`, `m/s^2`, `ips`, `mils` …
 *
 * @returns the one spelling used everywhere in the program, or null where the text is none of the
 *   six units a waveform may be recorded in (another unit, or one with `rms`, `pk`, `p-p` behind)
 *
 * @example
 * parseUnit('m/s^2') // => 'm/s²'
 */
export function parseUnit(text: string): Unit | null {
  return spellings.get(fold(text)) ?? null;
}

import type { ScoreConstants } from '#shared/signal/score-constants.ts';

/**
 * Puts fitted numbers into the text of the constants' file, where each stands behind its name; the
 * explanations between them stay.
 *
 * @throws {Error} where a constant is not in the text
 */
export function withConstants(text: string, constants: ScoreConstants): string {
  let changed = text;
  for (const [name, value] of Object.entries(constants)) {
    const place = new RegExp(`(\\b${name}: )-?[\\d.]+(?:e-?\\d+)?,`);
    if (!place.test(changed)) throw new Error(`The constants' file has no line for ${name}.`);
    changed = changed.replace(place, `$1${Number(value.toPrecision(5))},`);
  }
  return changed;
}

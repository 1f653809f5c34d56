/** What spreadsheets take for the beginning of a formula, the full-width signs among it. */
const formulaStart = /^'*[=+\-@\t\r\n＝＋－＠]/;
const guarded = /^'+[=+\-@\t\r\n＝＋－＠]/;

/**
 * Makes a text harmless for a spreadsheet: what begins with = + - @, tab or a line break gets an
 * apostrophe in front, and so does what begins with apostrophes and then one of these. `unguard`
 * takes exactly one apostrophe away from every text of that form, so each text comes back
 * unchanged: `=A1` → `'=A1`, `'=A1` → `''=A1`, while `'s` stays `'s`. Numbers are never guarded:
 * they are written by number columns alone, and no number is a formula. The guard holds where the
 * file is opened with the separator it was written with.
 */
export const guard = (text: string): string => (formulaStart.test(text) ? `'${text}` : text);

/** Takes back what `guard` did. */
export const unguard = (text: string): string => (guarded.test(text) ? text.slice(1) : text);

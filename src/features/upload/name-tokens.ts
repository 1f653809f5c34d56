/** Words for a direction, as files and column names write them. */
const directionWords: Readonly<Record<string, 'H' | 'V' | 'A'>> = {
  H: 'H',
  HOR: 'H',
  HORIZ: 'H',
  HORIZONTAL: 'H',
  V: 'V',
  VER: 'V',
  VERT: 'V',
  VERTICAL: 'V',
  A: 'A',
  AX: 'A',
  AXIAL: 'A',
};

/**
 * A name cut into upper-case pieces of letters or digits: "P-101/M-DE_h" and "P101 M-DE Hor" give
 * the same, whatever stands between the pieces.
 */
export const tokensOf = (text: string): string[] =>
  text
    .normalize('NFKC')
    .toUpperCase()
    .match(/\p{L}+|\p{N}+/gu) ?? [];

/** The letter of a direction a piece stands for. */
export const directionOf = (token: string): 'H' | 'V' | 'A' | undefined => directionWords[token];

/** Whether two runs of pieces say the same; the directions' words count as their letters. */
export function sameTokens(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((token, index) => alike(token, b[index] ?? ''));
}

/** Index at which `part` stands in `whole`, or -1. */
export function indexOfTokens(whole: readonly string[], part: readonly string[]): number {
  for (let from = 0; part.length > 0 && from + part.length <= whole.length; from += 1) {
    if (sameTokens(whole.slice(from, from + part.length), part)) return from;
  }
  return -1;
}

const alike = (a: string, b: string): boolean =>
  a === b || (directionOf(a) !== undefined && directionOf(a) === directionOf(b));

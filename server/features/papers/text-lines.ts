import type { Face } from './paper-fonts.ts';

/** A stretch of text in one face. */
export interface TextRun {
  text: string;
  face: Face;
}

/** What a text is set with: which face can show a sign, and how wide a stretch comes out. */
export interface Typesetter {
  canShow: (face: Face, sign: string) => boolean;
  widthOf: (run: TextRun) => number;
}

/** Shown for a sign that none of the fonts has. */
const unknownSign = '□';

const raisedFigures = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** "10⁻⁶" as "10^−6": none of the fonts has a raised minus. */
export const withoutRaisedMinus = (text: string): string =>
  text.replace(/⁻([⁰¹²³⁴⁵⁶⁷⁸⁹]*)/gu, (_, figures: string) => {
    return `^−${[...figures].map((figure) => raisedFigures.indexOf(figure)).join('')}`;
  });

/** Cuts a text into stretches, each in a face that has its signs. */
export function runsOf(text: string, face: Face, { canShow }: Typesetter): TextRun[] {
  const runs: TextRun[] = [];
  for (const sign of text) {
    const own = canShow(face, sign);
    const shown = own || canShow('signs', sign) ? sign : unknownSign;
    const shownIn = own ? face : 'signs';
    const last = runs.at(-1);
    if (last?.face === shownIn) last.text += shown;
    else runs.push({ text: shown, face: shownIn });
  }
  return runs;
}

const widthOfText = (text: string, face: Face, setter: Typesetter): number =>
  runsOf(text, face, setter).reduce((sum, run) => sum + setter.widthOf(run), 0);

/** The longest beginning that fits, at least one sign. */
function headThatFits(word: string, width: number, face: Face, setter: Typesetter): string {
  let head = '';
  for (const sign of word) {
    if (head !== '' && widthOfText(head + sign, face, setter) > width) break;
    head += sign;
  }
  return head;
}

/**
 * Breaks a text into lines no wider than `width`: at spaces and line ends, and inside a word only
 * where it alone is wider. No-break spaces hold.
 */
export function linesOf(text: string, width: number, face: Face, setter: Typesetter): string[] {
  return text.split(/\r\n|\r|\n/).flatMap((paragraph) => {
    const lines: string[] = [];
    let line = '';
    for (const word of paragraph.split(/[ \t]+/).filter((one) => one !== '')) {
      const longer = line === '' ? word : `${line} ${word}`;
      if (widthOfText(longer, face, setter) <= width) {
        line = longer;
        continue;
      }
      if (line !== '') lines.push(line);
      let rest = word;
      while (widthOfText(rest, face, setter) > width && [...rest].length > 1) {
        const head = headThatFits(rest, width, face, setter);
        if (head === rest) break;
        lines.push(head);
        rest = rest.slice(head.length);
      }
      line = rest;
    }
    lines.push(line);
    return lines;
  });
}

/** At most so many lines; what is cut off is told by an ellipsis that fits too. */
export function cutLines(
  lines: readonly string[],
  maxLines: number,
  width: number,
  face: Face,
  setter: Typesetter,
): string[] {
  if (lines.length <= maxLines) return [...lines];
  const kept = lines.slice(0, maxLines);
  let last = kept.pop() ?? '';
  while (last !== '' && widthOfText(`${last}…`, face, setter) > width) {
    last = [...last].slice(0, -1).join('');
  }
  return [...kept, `${last.trimEnd()}…`];
}

import type { Separator } from './waveform-csv.ts';

/**
 * Splits one line into cells the way RFC 4180 quotes them (`""` inside quotes is a quote), blanks
 * around a cell taken off. A run of blanks is one separator where blanks separate.
 *
 * @param separator - null: the line is one cell
 * @returns the cells, or null where a quote is not closed on the line or text follows a closing one
 */
export function splitLine(line: string, separator: Separator | null): string[] | null {
  if (!line.includes('"')) {
    if (separator === null) return [line.trim()];
    if (separator === ' ') return line.trim().split(/[ \t]+/u);
    return line.split(separator).map((cell) => cell.trim());
  }
  const cells: string[] = [];
  let at = 0;
  const isBlank = (char: string | undefined) =>
    char === ' ' || (char === '\t' && separator !== '\t');
  for (;;) {
    while (isBlank(line[at])) at += 1;
    if (separator === ' ' && at >= line.length) break;
    let cell = '';
    if (line[at] === '"') {
      const closed = readQuoted(line, at);
      if (closed === null) return null;
      cell = closed.text.trim();
      at = closed.next;
      const blankFrom = at;
      while (isBlank(line[at])) at += 1;
      const more = separator === ' ' && at > blankFrom;
      if (at < line.length && line[at] !== separator && !more) return null;
    } else {
      const from = at;
      while (at < line.length && line[at] !== separator) at += 1;
      cell = line.slice(from, at).trim();
    }
    cells.push(cell);
    if (at >= line.length) break;
    if (separator !== ' ') {
      at += 1;
      if (at >= line.length) {
        cells.push('');
        break;
      }
    }
  }
  return cells;
}

function readQuoted(line: string, from: number): { text: string; next: number } | null {
  let text = '';
  for (let at = from + 1; at < line.length; at += 1) {
    if (line[at] !== '"') {
      text += line[at];
    } else if (line[at + 1] === '"') {
      text += '"';
      at += 1;
    } else {
      return { text, next: at + 1 };
    }
  }
  return null;
}

/**
 * Splits a header row. Where blanks separate, a name may hold blanks itself: then each bracketed
 * unit ends a cell (`Time [s] Acc X [g]`), or runs of two blanks separate.
 *
 * @param columnCount - cells of the first row of numbers
 */
export function splitHeader(
  line: string,
  separator: Separator | null,
  columnCount: number,
): string[] | null {
  const plain = splitLine(line, separator);
  if (separator !== ' ' || plain === null || line.includes('"')) return plain;
  const ways = [
    plain,
    (line.match(/[^[\]()]+(?:\[[^\]]*\]|\([^)]*\))/gu) ?? []).map((cell) => cell.trim()),
    joinUnits(plain),
    line.trim().split(/[ \t]{2,}|\t/u),
  ];
  return ways.find((cells) => cells.length === columnCount) ?? plain;
}

function joinUnits(cells: readonly string[]): string[] {
  const joined: string[] = [];
  for (const cell of cells) {
    if (/^[[(]/u.test(cell) && joined.length > 0) joined.push(`${joined.pop()!} ${cell}`);
    else joined.push(cell);
  }
  return joined;
}

import { decodeUtf8 } from './utf8.ts';
import type { DecimalMark, Separator } from './waveform-csv.ts';

export interface Dialect {
  separator: Separator | null;
  /** Null: not seen yet, the first one settles it. */
  decimalMark: DecimalMark | null;
}

/** What occurs outside quotes in the rows of the head. */
interface Marks {
  tab: boolean;
  semicolon: boolean;
  comma: boolean;
  point: boolean;
  /** A blank between two cells' characters, not beside a separator. */
  blankBetween: boolean;
  /** A comma that can't be a decimal mark: before or behind a blank, another comma or a sign. */
  separatingComma: boolean;
}

/**
 * Settles separator and decimal mark from the rows of numbers.
 *
 * A tab or a semicolon separates wherever it occurs; a comma beside it is a decimal mark. Without
 * them a comma separates if it stands where no decimal mark can stand or if points occur as well;
 * with blanks between numbers the blanks separate and the comma is a decimal mark. What is left,
 * rows like `1,234` alone, is settled by `commaSeparates`.
 *
 * @param bytes - the head; rows run from `from` to `to`
 * @param told - the decimal mark where a person has told it
 */
export function guessDialect(
  bytes: Uint8Array,
  from: number,
  to: number,
  told?: DecimalMark,
): Dialect {
  // Native searches first: most files are settled by what doesn't occur in them at all.
  const rows = bytes.subarray(from, to);
  const occurs = (byte: number) => rows.includes(byte);
  const hasQuote = occurs(34);
  if (!hasQuote && occurs(59)) return { separator: ';', decimalMark: null };
  if (!hasQuote && occurs(9)) return { separator: '\t', decimalMark: null };
  const hasComma = occurs(44);
  if (!hasQuote && !occurs(32)) {
    if (!hasComma) return { separator: null, decimalMark: null };
    if (told === undefined && occurs(46)) return { separator: ',', decimalMark: '.' };
  }

  const marks = collectMarks(bytes, from, to);
  if (marks.semicolon) return { separator: ';', decimalMark: null };
  if (marks.tab) return { separator: '\t', decimalMark: null };
  if (marks.comma && told !== ',') {
    if (told === '.') return { separator: ',', decimalMark: '.' };
    if (marks.separatingComma) return { separator: ',', decimalMark: '.' };
    if (marks.blankBetween && !marks.point) return { separator: ' ', decimalMark: ',' };
    if (marks.point || marks.blankBetween) return { separator: ',', decimalMark: '.' };
    return commaSeparates(bytes, from, to)
      ? { separator: ',', decimalMark: '.' }
      : { separator: null, decimalMark: ',' };
  }
  return { separator: marks.blankBetween ? ' ' : null, decimalMark: null };
}

function collectMarks(bytes: Uint8Array, from: number, to: number): Marks {
  const marks: Marks = {
    tab: false,
    semicolon: false,
    comma: false,
    point: false,
    blankBetween: false,
    separatingComma: false,
  };
  let quoted = false;
  // Last byte that wasn't a blank, and whether blanks came behind it.
  let last = 10;
  let blanks = false;
  for (let at = from; at < to; at += 1) {
    const byte = bytes[at]!;
    if (byte === 34) {
      quoted = !quoted;
      if (!quoted) {
        last = 34;
        blanks = false;
        continue;
      }
    } else if (quoted) {
      if (byte === 10 || byte === 13) quoted = false;
      else continue;
    }
    if (byte === 32) {
      blanks = true;
      continue;
    }
    if (byte === 9) marks.tab = true;
    else if (byte === 59) marks.semicolon = true;
    else if (byte === 46) marks.point = true;
    else if (byte === 44) {
      marks.comma = true;
      if (blanks && last !== 10) marks.separatingComma = true;
    }
    const betweenCells = byte !== 10 && byte !== 13 && byte !== 44 && last !== 10 && last !== 44;
    if (blanks && betweenCells) marks.blankBetween = true;
    if (last === 44) {
      // Behind a comma that marks decimals comes a digit, an exponent or the end of the cell.
      const goesOn =
        (byte >= 48 && byte <= 57) || byte === 10 || byte === 13 || (byte | 32) === 101;
      if (!goesOn || (blanks && byte !== 10 && byte !== 13)) marks.separatingComma = true;
    }
    last = byte === 13 ? 10 : byte;
    blanks = false;
  }
  return marks;
}

/**
 * Tells `time,value` in whole numbers from one column with decimal commas, by all rows of the head.
 *
 * As a time column the numbers before the comma rise by the same step from row to row; as whole
 * parts of samples they bounce about. Two commas in a row, or a first row without its partner in a
 * rising column, leave no doubt either.
 */
function commaSeparates(bytes: Uint8Array, from: number, to: number): boolean {
  const text = decodeUtf8(bytes, from, to) ?? '';
  const lines = text.split(/\r\n|\n|\r/u).map((line) => line.trim());
  const steps = new Map<number, number>();
  let stepCount = 0;
  let before: number | null = null;
  for (const line of lines) {
    if (line === '') continue;
    const parts = line.split(',');
    if (parts.length > 2) return true;
    if (parts.length === 1 || !/^[+-]?\d+$/u.test(parts[0]!)) continue;
    // "-0" and a fraction's leading zeros settle nothing here: the steps do.
    const whole = Number(parts[0]);
    if (before !== null) {
      const step = whole - before;
      stepCount += 1;
      steps.set(step, (steps.get(step) ?? 0) + 1);
    }
    before = whole;
  }
  const rising = [...steps].filter(([step]) => step > 0).map(([, count]) => count);
  return stepCount > 0 && Math.max(0, ...rising) > stepCount / 2;
}

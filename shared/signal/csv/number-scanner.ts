import { asciiForMessage } from './utf8.ts';

/** Powers of ten that a double holds exactly. */
const exactPowers = Float64Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));

const zero = 48;
const point = 46;
const comma = 44;

/**
 * Reads decimal numbers from bytes, correctly rounded: the value equals `Number(text)` bit for bit.
 *
 * A number of up to 2^53 as integer digits and a power of ten up to 22 needs one exact division or
 * multiplication (W. D. Clinger, "How to read floating point numbers accurately", 1990). Numbers of
 * up to 30 digits are divided in twice the precision and taken where the error cannot matter;
 * everything else goes through `Number`.
 *
 * One object is used for a whole file, its fields are the results: a result object a number would
 * cost more than the scanning.
 */
export class NumberScanner {
  /** Byte of the decimal mark; 0 until the first one is seen, which settles it for the file. */
  mark = 0;
  /** May a comma be a decimal mark at all? Not where commas separate cells. */
  commaMayMark = true;
  value = 0;
  /** Digits before the mark, digits behind it, and the written exponent of the last number. */
  integerDigits = 0;
  fractionDigits = 0;
  exponent = 0;
  /** All digits as one whole number; inexact above 2^53. */
  mantissa = 0;

  /**
   * Scans the number that starts at `from`: sign, digits with at most one mark, exponent.
   *
   * @returns index behind the number, or -1 where no number starts here; what follows the number is
   *   for the caller to judge. Never reads at or behind `to`.
   */
  scan(bytes: Uint8Array, from: number, to: number): number {
    let at = from;
    let byte = at < to ? bytes[at]! : 0;
    const negative = byte === 45;
    if (negative || byte === 43) {
      at += 1;
      byte = at < to ? bytes[at]! : 0;
    }

    let mantissa = 0;
    const integerFrom = at;
    while (byte >= zero && byte <= 57) {
      mantissa = mantissa * 10 + (byte - zero);
      at += 1;
      byte = at < to ? bytes[at]! : 0;
    }
    const integerDigits = at - integerFrom;
    let fractionDigits = 0;
    if (byte === point || byte === comma) {
      if (this.mark === 0 && (byte === point || this.commaMayMark)) this.mark = byte;
      if (byte === this.mark) {
        at += 1;
        byte = at < to ? bytes[at]! : 0;
        const fractionFrom = at;
        while (byte >= zero && byte <= 57) {
          mantissa = mantissa * 10 + (byte - zero);
          at += 1;
          byte = at < to ? bytes[at]! : 0;
        }
        fractionDigits = at - fractionFrom;
      }
    }
    if (integerDigits + fractionDigits === 0) return -1;

    let exponent = 0;
    if (byte === 101 || byte === 69) {
      let digitAt = at + 1;
      byte = digitAt < to ? bytes[digitAt]! : 0;
      const negativeExponent = byte === 45;
      if (negativeExponent || byte === 43) {
        digitAt += 1;
        byte = digitAt < to ? bytes[digitAt]! : 0;
      }
      const exponentFrom = digitAt;
      while (byte >= zero && byte <= 57) {
        // Held at a size that is infinite or zero in any case, so that it can't run over.
        if (exponent < 100_000) exponent = exponent * 10 + (byte - zero);
        digitAt += 1;
        byte = digitAt < to ? bytes[digitAt]! : 0;
      }
      if (digitAt === exponentFrom) return -1;
      if (negativeExponent) exponent = -exponent;
      at = digitAt;
    }

    this.integerDigits = integerDigits;
    this.fractionDigits = fractionDigits;
    this.exponent = exponent;
    this.mantissa = mantissa;
    const power = exponent - fractionDigits;
    // Below 2^53 every step of the sum was exact; at or above it the sum never came back below.
    if (mantissa < 9007199254740992 && power >= -22 && power <= 22) {
      const value = power < 0 ? mantissa / exactPowers[-power]! : mantissa * exactPowers[power]!;
      this.value = negative ? -value : value;
    } else {
      this.value = toNumber(asciiForMessage(bytes, from, at));
    }
    return at;
  }
}

function toNumber(text: string): number {
  return Number(text.replace(',', '.'));
}

/** Ways recorders and languages write a number that isn't one; each is a gap. */
const nonFinite = /^[+-]?(?:nan|inf(?:inity)?|1[.,]#(?:qnan|snan|inf|ind)0*)$/iu;

/** @returns whether a cell's text is blank or says "not a number" or "infinite" */
export function isGapText(text: string): boolean {
  return text === '' || nonFinite.test(text);
}

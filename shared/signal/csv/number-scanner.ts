import { asciiForMessage, encodeUtf8 } from './utf8.ts';
import { exactPowers, scaleWideDecimal } from './wide-decimal.ts';

/**
 * Reads decimal numbers from bytes, correctly rounded: the value equals `Number(text)` bit for bit.
 *
 * A number of up to 2^53 as integer digits and a power of ten up to 22 needs one exact division or
 * multiplication (W. D. Clinger, "How to read floating point numbers accurately", 1990). Numbers of
 * up to 24 digits are reckoned in twice the precision; everything else goes through `Number`.
 *
 * One object is used for a whole file, its fields are the results: a result object a number would
 * cost more than the scanning.
 */
export class NumberScanner {
  /** Byte of the decimal mark; 0 until the first one is seen, which settles it for the file. */
  mark = 0;
  /** May a comma be a decimal mark at all? Not where commas separate cells. */
  commaMayMark = true;
  value = NaN;
  /** Digits before the mark, digits behind it, and the written exponent of the last number. */
  integerDigits = 0;
  fractionDigits = 0;
  exponent = 0;
  /** All digits as one whole number; inexact above 2^53. */
  mantissa = NaN;

  /**
   * Scans the number that starts at `from`: sign, digits with at most one mark, exponent.
   *
   * There must be a byte behind the number that belongs to no number, such as the line end: the
   * scan stops there, and checking for the end of the buffer at every digit is saved.
   *
   * @returns index behind the number, or -1 where no number starts here; what follows the number is
   *   for the caller to judge
   */
  scan(bytes: Uint8Array, from: number): number {
    let at = from;
    let byte = bytes[at]!;
    const negative = byte === 45;
    if (negative || byte === 43) byte = bytes[++at]!;

    const digitsFrom = at;
    // Right for up to nine digits, more are read again below.
    let small = 0;
    while (byte >= 48 && byte <= 57) {
      small = (Math.imul(small, 10) + byte - 48) | 0;
      byte = bytes[++at]!;
    }
    const integerDigits = at - digitsFrom;
    let digits = integerDigits;
    if (byte === 46 || byte === 44) {
      if (this.mark === 0 && (byte === 46 || this.commaMayMark)) this.mark = byte;
      if (byte === this.mark) {
        byte = bytes[++at]!;
        const fractionFrom = at;
        while (byte >= 48 && byte <= 57) {
          small = (Math.imul(small, 10) + byte - 48) | 0;
          byte = bytes[++at]!;
        }
        digits += at - fractionFrom;
      }
    }
    if (digits === 0) return -1;
    const fractionDigits = digits - integerDigits;
    const digitsTo = at;
    this.exponent = 0;
    if (byte === 101 || byte === 69) {
      at = this.scanExponent(bytes, at + 1);
      if (at < 0) return -1;
    }
    this.integerDigits = integerDigits;
    this.fractionDigits = fractionDigits;

    if (digits <= 9 && this.exponent === 0) {
      this.mantissa = small;
      const value = small / exactPowers[fractionDigits]!;
      this.value = negative ? -value : value;
    } else {
      const value = this.scanWide(bytes, digitsFrom, digitsTo, at);
      this.value = negative ? -value : value;
    }
    return at;
  }

  /** @returns index behind the exponent's digits, or -1 where there are none */
  private scanExponent(bytes: Uint8Array, from: number): number {
    let at = from;
    let byte = bytes[at]!;
    const negative = byte === 45;
    if (negative || byte === 43) byte = bytes[++at]!;
    const digitsFrom = at;
    let exponent = 0;
    while (byte >= 48 && byte <= 57) {
      // Held at a size that is infinite or zero in any case, so that it can't run over.
      if (exponent < 100_000) exponent = exponent * 10 + byte - 48;
      byte = bytes[++at]!;
    }
    this.exponent = negative ? -exponent : exponent;
    return at === digitsFrom ? -1 : at;
  }

  /** Magnitude of a number of many digits or with an exponent. */
  private scanWide(bytes: Uint8Array, from: number, to: number, end: number): number {
    let at = from;
    // Leading zeros use up no precision. A mark is the only byte below 48 here.
    while (at < to && bytes[at]! <= 48) at += 1;
    // Digits 1 to 7, 8 to 15 and 16 to 24, each part a small whole number.
    let first = 0;
    let second = 0;
    let low = 0;
    let count = 0;
    for (; at < to && count < 7; at += 1) {
      const digit = bytes[at]! - 48;
      if (digit < 0) continue;
      first = (Math.imul(first, 10) + digit) | 0;
      count += 1;
    }
    let high = first;
    if (at < to) {
      for (; at < to && count < 15; at += 1) {
        const digit = bytes[at]! - 48;
        if (digit < 0) continue;
        second = (Math.imul(second, 10) + digit) | 0;
        count += 1;
      }
      high = count > 7 ? first * exactPowers[count - 7]! + second : first;
    }
    for (; at < to && count < 24; at += 1) {
      const digit = bytes[at]! - 48;
      if (digit < 0) continue;
      low = (Math.imul(low, 10) + digit) | 0;
      count += 1;
    }
    const lowDigits = count > 15 ? count - 15 : 0;
    const all = lowDigits === 0 ? high : high * exactPowers[lowDigits]! + low;
    this.mantissa = all;
    if (at < to) return toNumber(asciiForMessage(bytes, from, end));
    if (all === 0) return 0;
    const power = this.exponent - this.fractionDigits;
    // Below 2^53 the sum is exact: so is each of its parts.
    if (all < 9007199254740992 && power >= -22 && power <= 22) {
      return power < 0 ? all / exactPowers[-power]! : all * exactPowers[power]!;
    }
    const wide = lowDigits > 0 ? scaleWideDecimal(high, low, lowDigits, power) : NaN;
    return Number.isNaN(wide) ? toNumber(asciiForMessage(bytes, from, end)) : wide;
  }

  /** @returns whether the whole text is one number; then the fields hold it */
  scanText(text: string): boolean {
    const bytes = encodeUtf8(`${text}\n`);
    return this.scan(bytes, 0) === bytes.length - 1;
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

import { decadeOf, roundToDecimals, roundToSignificant } from './round-number.ts';

/** U+202F: keeps the digits of one number together, and a number with its unit. */
const narrowNoBreakSpace = '\u202f';
/** U+2212, as wide as a digit; a hyphen is not. */
const minus = '\u2212';
/** Shown for what is not known or not finite. */
export const noNumber = '–';

/**
 * Writes a number for people with a fixed count of decimals, for columns of figures: a true minus,
 * groups of three from five digits on (ISO 80000-1), a point before the decimals. Never for files:
 * those take `String(value)`.
 *
 * @param value - null and what is not finite become an en dash
 * @param decimals - whole number, 0 to 20
 *
 * @example
 * formatFixed(-25600.04, 1) // => '−25 600.0' with narrow no-break spaces
 */
export function formatFixed(value: number | null, decimals: number): string {
  if (value === null || !Number.isFinite(value)) return noNumber;
  const rounded = roundToDecimals(value, decimals);
  return (rounded < 0 ? minus : '') + grouped(plainFixed(Math.abs(rounded), decimals));
}

/**
 * Writes a number for people with so many significant digits; whole places are never rounded off
 * (12 345 stays 12 345), and below 1e-4 or from 1e9 on it is written as a power of ten.
 *
 * @param digits - whole number, 1 to 17
 *
 * @example
 * formatSignificant(0.012345, 3) // => '0.0123'
 * formatSignificant(0.0000012, 2) // => '1.2 × 10⁻⁶'
 */
export function formatSignificant(value: number | null, digits: number): string {
  if (value === null || !Number.isFinite(value)) return noNumber;
  if (value === 0) return '0';
  const rounded = roundToSignificant(value, digits);
  const decade = decadeOf(rounded);
  if (decade < -4 || decade >= 9) {
    const [head] = Math.abs(rounded)
      .toExponential(digits - 1)
      .split('e');
    const space = narrowNoBreakSpace;
    return `${rounded < 0 ? minus : ''}${head}${space}×${space}10${superscript(decade)}`;
  }
  return formatFixed(value, Math.min(20, Math.max(0, digits - 1 - decade)));
}

/** Puts a unit behind a written number, so that no line breaks between them; none behind a dash. */
export function withUnit(written: string, unit: string): string {
  return written === noNumber || unit === '' ? written : `${written}${narrowNoBreakSpace}${unit}`;
}

/** `toFixed` writes large numbers as powers of ten from 1e21 on; those are no figures for a column. */
function plainFixed(value: number, decimals: number): string {
  return value < 1e21 ? value.toFixed(decimals) : BigInt(value).toString();
}

function grouped(digits: string): string {
  const [whole = '', fraction] = digits.split('.');
  const parts = whole.length < 5 ? whole : whole.replace(/\B(?=(?:\d{3})+$)/gu, narrowNoBreakSpace);
  return fraction === undefined ? parts : `${parts}.${fraction}`;
}

function superscript(power: number): string {
  const figures = '⁰¹²³⁴⁵⁶⁷⁸⁹';
  return String(power).replace(/./gu, (sign) => (sign === '-' ? '⁻' : figures[Number(sign)]!));
}

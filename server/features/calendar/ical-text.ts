/**
 * iCalendar as text, by RFC 5545: properties in order, values escaped, lines of at most 75 octets
 * ended by CRLF.
 */

const lineMaxOctets = 75;

/** A TEXT value (RFC 5545, 3.3.11). */
export const escapedText = (text: string): string =>
  text
    .replace(/[\\;,]/g, (sign) => `\\${sign}`)
    .replace(/\r\n|\r|\n/g, '\\n')
    // Other control characters are not allowed in content lines.
    .replace(/\p{Cc}/gu, ' ');

/** Folds a content line (3.1), never within a character: the octets of one may not be split. */
export function foldedLine(line: string): string {
  const lines: string[] = [];
  let current = '';
  let octets = 0;
  for (const character of line) {
    const size = Buffer.byteLength(character);
    if (octets + size > lineMaxOctets) {
      lines.push(current);
      current = ' ';
      octets = 1;
    }
    current += character;
    octets += size;
  }
  return [...lines, current].join('\r\n');
}

/** A DATE value: 20261204. */
export const dateValue = (day: string): string => day.replaceAll('-', '');

/** A DATE-TIME value in UTC: 20261204T081500Z. */
export const utcValue = (moment: Date): string =>
  moment.toISOString().replace(/[-:]/g, '').replace(/\.\d+/, '');

/** The whole text of content lines that are not folded yet. */
export const icalText = (lines: readonly string[]): string =>
  lines.map((line) => `${foldedLine(line)}\r\n`).join('');

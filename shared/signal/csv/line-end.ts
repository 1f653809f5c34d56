/**
 * @param at - the line feed, the carriage return or `to`
 * @returns index behind the line end (LF, CR, CRLF, or CRCRLF as some transfers make it), or -1
 *   where more bytes are needed to tell
 */
export function endOfLine(bytes: Uint8Array, at: number, to: number, final: boolean): number {
  if (at >= to) return final ? to : -1;
  if (bytes[at] === 10) return at + 1;
  if (at + 2 >= to && !final) return -1;
  if (at + 1 < to && bytes[at + 1] === 10) return at + 2;
  if (at + 2 < to && bytes[at + 1] === 13 && bytes[at + 2] === 10) return at + 3;
  return at + 1;
}

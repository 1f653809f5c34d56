/**
 * UTF-8 by hand: `shared` is compiled without the platform's TextDecoder, and only comment lines,
 * headers and cells quoted in an error are ever turned into text.
 */

/**
 * @param bytes - the whole buffer
 * @param from - first byte
 * @param to - byte behind the last
 * @returns the text, or null where the bytes are not UTF-8 (overlong forms and surrogates included)
 */
export function decodeUtf8(bytes: Uint8Array, from: number, to: number): string | null {
  let text = '';
  let at = from;
  while (at < to) {
    const lead = bytes[at]!;
    if (lead < 0x80) {
      text += String.fromCharCode(lead);
      at += 1;
      continue;
    }
    const extra = lead >= 0xf0 ? 3 : lead >= 0xe0 ? 2 : 1;
    if (lead < 0xc2 || lead > 0xf4 || at + extra >= to) return null;
    let point = lead & (0x3f >> extra);
    for (let i = 1; i <= extra; i += 1) {
      const next = bytes[at + i]!;
      if ((next & 0xc0) !== 0x80) return null;
      point = (point << 6) | (next & 0x3f);
    }
    const smallest = extra === 3 ? 0x10000 : extra === 2 ? 0x800 : 0x80;
    if (point < smallest || point > 0x10ffff || (point >= 0xd800 && point < 0xe000)) return null;
    text += String.fromCodePoint(point);
    at += extra + 1;
  }
  return text;
}

/** As `decodeUtf8`, with `?` for every byte outside ASCII: for quoting a faulty cell. */
export function asciiForMessage(bytes: Uint8Array, from: number, to: number): string {
  let text = '';
  for (let at = from; at < to; at += 1) {
    const byte = bytes[at]!;
    text += byte < 0x80 ? String.fromCharCode(byte) : '?';
  }
  return text;
}

/** @returns the bytes of a text; a lone surrogate becomes U+FFFD */
export function encodeUtf8(text: string): Uint8Array {
  const ascii = new Uint8Array(text.length);
  let at = 0;
  for (; at < text.length; at += 1) {
    const unit = text.charCodeAt(at);
    if (unit >= 0x80) break;
    ascii[at] = unit;
  }
  if (at === text.length) return ascii;

  const bytes = new Uint8Array(at + (text.length - at) * 3);
  bytes.set(ascii.subarray(0, at));
  let length = at;
  while (at < text.length) {
    let point = text.codePointAt(at)!;
    at += point > 0xffff ? 2 : 1;
    if (point >= 0xd800 && point < 0xe000) point = 0xfffd;
    if (point < 0x80) {
      bytes[length++] = point;
    } else if (point < 0x800) {
      bytes[length++] = 0xc0 | (point >> 6);
      bytes[length++] = 0x80 | (point & 0x3f);
    } else if (point < 0x10000) {
      bytes[length++] = 0xe0 | (point >> 12);
      bytes[length++] = 0x80 | ((point >> 6) & 0x3f);
      bytes[length++] = 0x80 | (point & 0x3f);
    } else {
      bytes[length++] = 0xf0 | (point >> 18);
      bytes[length++] = 0x80 | ((point >> 12) & 0x3f);
      bytes[length++] = 0x80 | ((point >> 6) & 0x3f);
      bytes[length++] = 0x80 | (point & 0x3f);
    }
  }
  return bytes.subarray(0, length);
}

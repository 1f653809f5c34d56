import { CsvError } from './csv-error.ts';

/** First bytes of files that are taken for a CSV by mistake. */
const signatures: readonly (readonly [readonly number[], string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], 'a ZIP archive or an Excel workbook'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old Excel workbook'],
  [[0x1f, 0x8b], 'a gzip archive'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF'],
  [[0x52, 0x49, 0x46, 0x46], 'a WAV recording'],
  [[0x89, 0x48, 0x44, 0x46], 'an HDF5 file'],
  [[0x4d, 0x41, 0x54, 0x4c, 0x41, 0x42], 'a MATLAB file'],
];

/** Control characters behind these bytes are met when their line is read. */
const sniffedBytes = 4096;

const saveAsUtf8 = 'Expected UTF-8 text. Save the file as "CSV UTF-8" and send it again.';

/**
 * Refuses what isn't text of one byte a digit.
 *
 * @param head - first bytes of the file
 * @returns length of the byte order mark: 3 or 0
 * @throws {CsvError} `utf-16`, `binary`
 */
export function checkEncoding(head: Uint8Array): 0 | 3 {
  const [a, b, c] = head;
  if ((a === 0xff && b === 0xfe) || (a === 0xfe && b === 0xff)) {
    throw new CsvError('utf-16', 1, `The file begins with a UTF-16 mark. ${saveAsUtf8}`);
  }
  for (const [bytes, what] of signatures) {
    if (bytes.every((byte, i) => head[i] === byte)) {
      throw new CsvError('binary', 1, `The file is ${what}. Export the samples as CSV text.`);
    }
  }
  refuseNul(head);
  let line = 1;
  const length = Math.min(head.length, sniffedBytes);
  for (let at = 0; at < length; at += 1) {
    const byte = head[at]!;
    if (byte === 10) line += 1;
    else if (isControl(byte)) refuseControl(byte, line);
  }
  return a === 0xef && b === 0xbb && c === 0xbf ? 3 : 0;
}

/** Control characters no text of ours holds; tab, line feed and carriage return are not among them. */
export function isControl(byte: number): boolean {
  return byte === 127 || (byte < 32 && byte !== 9 && byte !== 10 && byte !== 13);
}

export function refuseControl(byte: number, line: number): never {
  const code = byte.toString(16).padStart(2, '0').toUpperCase();
  throw new CsvError(
    'binary',
    line,
    `The file holds the control character ${code} (hexadecimal), so it is not text. ` +
      'Export the samples as CSV text.',
  );
}

/** UTF-16 without a mark shows as NUL in every second byte: ASCII text has its NULs on one side. */
function refuseNul(head: Uint8Array): void {
  const length = Math.min(head.length, 512);
  const nuls = [0, 0];
  for (let at = 0; at < length; at += 1) if (head[at] === 0) nuls[at & 1]! += 1;
  const most = Math.max(nuls[0]!, nuls[1]!);
  const least = Math.min(nuls[0]!, nuls[1]!);
  if (most > 0 && most >= length * 0.4 && least <= length * 0.05) {
    throw new CsvError('utf-16', 1, `Every second byte is zero, as in UTF-16. ${saveAsUtf8}`);
  }
}

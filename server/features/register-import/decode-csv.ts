import { AppError } from '#server/http/app-error.ts';
import type { CsvEncoding } from '#shared/contracts/register-import.ts';

const sampledBytes = 4096;

const unreadable = (message: string, cause?: unknown) =>
  new AppError('unreadable_file', message, { cause, fields: [{ path: 'file', message }] });

/**
 * Reads the bytes of a CSV as text: UTF-8 or UTF-16 with or without byte order mark, and what is no
 * UTF-8 as Windows-1252, which Latin-1 is a part of.
 *
 * @throws {AppError} `unreadable_file`, naming what the file is or what is wrong with its encoding
 */
export function decodeCsv(bytes: Buffer): { text: string; encoding: CsvEncoding } {
  if (bytes.length === 0) throw unreadable('The file is empty.');
  if (bytes.subarray(0, 4).equals(Buffer.from([0x50, 0x4b, 3, 4]))) {
    throw unreadable(
      'This is a workbook or another packed file, not a CSV. Save the sheet as "CSV UTF-8" and send that.',
    );
  }
  const label = encodingOf(bytes);
  const encoding: CsvEncoding = label === 'utf-8' ? 'UTF-8' : 'UTF-16';
  let text = decode(bytes, label);
  if (text === null && label !== 'utf-8') {
    throw unreadable('The file begins as UTF-16 but is broken further on. Save it as UTF-8.');
  }
  const known = text !== null;
  text ??= decode(bytes, 'windows-1252');
  // Neither a spreadsheet nor a person writes these: it is some other file.
  if (text === null || text.includes('\0')) {
    throw unreadable('The file is not text. Save the sheet as "CSV UTF-8" and send that.');
  }
  return { text, encoding: known ? encoding : 'Windows-1252' };
}

function decode(bytes: Buffer, label: string): string | null {
  try {
    // Takes the byte order mark away where there is one.
    return new TextDecoder(label, { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

/** By the byte order mark; without one by where the zero bytes of Latin letters stand. */
function encodingOf(bytes: Buffer): 'utf-8' | 'utf-16le' | 'utf-16be' {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  const sample = bytes.subarray(0, sampledBytes);
  const zeros = [0, 0];
  for (const [index, byte] of sample.entries()) if (byte === 0) zeros[index % 2]! += 1;
  const [even = 0, odd = 0] = zeros;
  if (odd > sample.length / 4 && even === 0) return 'utf-16le';
  if (even > sample.length / 4 && odd === 0) return 'utf-16be';
  return 'utf-8';
}

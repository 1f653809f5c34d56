import { open } from 'node:fs/promises';
import sharp from 'sharp';
import { AppError } from '#server/http/app-error.ts';
import { photoLimits } from '#shared/contracts/inspection-photo.ts';

/** A photograph as it is kept: JPEG without a word of where, when and with what it was taken. */
export interface CleanPhoto {
  full: Buffer;
  small: Buffer;
  widthPx: number;
  heightPx: number;
}

/** A small file can unfold into gigabytes of pixels; no camera of a plant takes more than this. */
const maxPixels = 100_000_000;
const fullQuality = 86;
const smallQuality = 78;
const headBytes = 16;

// The file read is removed right after: keeping it open in a cache would keep its disk space.
sharp.cache(false);

const refuse = (message: string, cause?: unknown): AppError =>
  new AppError('unreadable_file', message, {
    ...(cause === undefined ? {} : { cause }),
    fields: [{ path: 'file', message }],
  });

/**
 * Reads a photograph by its content, whatever its name says, and makes it anew: turned upright,
 * without metadata, with a small copy.
 *
 * @throws {AppError} `unreadable_file` with what to do instead
 */
export async function readPhoto(path: string): Promise<CleanPhoto> {
  const kind = kindOf(await headOf(path));
  if (kind === 'heif') {
    throw refuse(
      'This is a HEIC picture, which not every browser can show. Set the camera to its most compatible format, or send a copy as JPEG.',
    );
  }
  if (kind === null) {
    throw refuse('This file is no photograph. Send JPEG, PNG or WebP, whatever its name.');
  }
  try {
    const upright = () =>
      sharp(path, { failOn: 'error', limitInputPixels: maxPixels })
        .autoOrient()
        .flatten({ background: '#ffffff' });
    const { data, info } = await upright()
      .resize({ ...within(photoLimits.keptMaxPx), withoutEnlargement: true })
      .jpeg({ quality: fullQuality })
      .toBuffer({ resolveWithObject: true });
    const small = await sharp(data)
      .resize({ ...within(photoLimits.smallMaxPx), withoutEnlargement: true })
      .jpeg({ quality: smallQuality })
      .toBuffer();
    return { full: data, small, widthPx: info.width, heightPx: info.height };
  } catch (error) {
    if (/pixel limit/i.test((error as Error).message)) {
      const most = maxPixels / 1e6;
      throw refuse(`The picture has more than ${most} million pixels. Send a smaller copy.`, error);
    }
    throw refuse(
      'The picture is damaged or ends early and can’t be shown. Take it again, or send the original once more.',
      error,
    );
  }
}

const within = (edgePx: number) => ({ width: edgePx, height: edgePx, fit: 'inside' as const });

async function headOf(path: string): Promise<Buffer> {
  const file = await open(path, 'r');
  try {
    const head = Buffer.alloc(headBytes);
    const { bytesRead } = await file.read(head, 0, headBytes, 0);
    return head.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

/** Only these are handed to the decoder: it would also draw SVG, which can hold anything. */
function kindOf(head: Buffer): 'jpeg' | 'png' | 'webp' | 'heif' | null {
  const text = head.toString('latin1');
  if (text.startsWith('\xff\xd8\xff')) return 'jpeg';
  if (text.startsWith('\x89PNG\r\n\x1a\n')) return 'png';
  if (text.startsWith('RIFF') && text.slice(8, 12) === 'WEBP') return 'webp';
  // Brands of ISO/IEC 23008-12 and of its relatives; the box length stands before.
  const isHeif = /^.{4}ftyp(hei[cxms]|hev[cxms]|mif[12]|msf1|avi[fs])/s.test(text);
  return isHeif ? 'heif' : null;
}

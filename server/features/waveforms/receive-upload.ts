import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import multer from 'multer';
import { AppError } from '#server/http/app-error.ts';
import { diskFullInWords } from '#server/storage/disk-full.ts';
import { uploadMapping, type UploadMapping } from '#shared/contracts/waveform.ts';

/** A file that has arrived in the incoming folder, with what the person settled about it. */
export interface ReceivedFile {
  path: string;
  fileName: string;
  fileBytes: number;
  contentHash: string;
  mapping: UploadMapping;
}

const mappingMaxBytes = 64 * 1024;

/**
 * Takes one file from a multipart request to disk, never whole into memory: field `mapping` with
 * the JSON of the contract, then field `file`.
 *
 * @throws {AppError} `too_large`, or `validation` for a broken form or mapping
 */
export async function receiveUpload(
  req: Request,
  res: Response,
  directory: string,
  fileMaxBytes: number,
): Promise<ReceivedFile> {
  const takeFile = multer({
    storage: multer.diskStorage({
      destination: directory,
      filename: (_req, _file, done) => done(null, randomUUID()),
    }),
    limits: { fileSize: fileMaxBytes, files: 1, fields: 2, fieldSize: mappingMaxBytes },
    defParamCharset: 'utf8',
  }).single('file');
  await new Promise<void>((resolve, reject) => {
    takeFile(req, res, (error: unknown) => {
      if (!error) resolve();
      else reject(uploadFault(error, fileMaxBytes));
    });
  });
  const { file } = req;
  if (file === undefined) {
    throw new AppError('validation', 'The form has no file in its field "file".', {
      fields: [{ path: 'file', message: 'Choose a file.' }],
    });
  }
  try {
    return {
      path: file.path,
      fileName: plainName(file.originalname),
      fileBytes: file.size,
      contentHash: await hashOf(file.path),
      mapping: readMapping((req.body as { mapping?: unknown }).mapping),
    };
  } catch (error) {
    await rm(file.path, { force: true });
    throw error;
  }
}

function uploadFault(error: unknown, fileMaxBytes: number): unknown {
  if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') {
    const most = Math.floor(fileMaxBytes / 1_000_000);
    return new AppError(
      'too_large',
      `The file is larger than ${most} MB, the most that is taken. Send a shorter recording.`,
      { cause: error },
    );
  }
  const known = diskFullInWords(error);
  if (known instanceof AppError || known instanceof multer.MulterError) return known;
  return new AppError(
    'validation',
    'The upload broke off or is no multipart form. Send it again.',
    { cause: error },
  );
}

/** Browsers may send a folder's path; the name alone tells a person which file it was. */
function plainName(sent: string): string {
  const name = (sent.split(/[/\\]/).at(-1) ?? '').replace(/\p{Cc}/gu, '').trim();
  return name === '' ? 'file' : name.slice(0, 255);
}

async function hashOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(path), hash);
  return hash.digest('hex');
}

function readMapping(text: unknown): UploadMapping {
  let value: unknown;
  try {
    value = JSON.parse(String(text));
  } catch (cause) {
    throw new AppError('validation', 'The field "mapping" is no JSON.', { cause });
  }
  const parsed = uploadMapping.safeParse(value);
  if (parsed.success) return parsed.data;
  const fields = parsed.error.issues.map((issue) => ({
    path: ['mapping', ...issue.path].map(String).join('.'),
    message: issue.message,
  }));
  throw new AppError('validation', fields[0]?.message ?? 'The mapping is not as expected.', {
    fields,
  });
}

import { randomUUID } from 'node:crypto';
import type { Request, Response } from 'express';
import multer from 'multer';
import { diskFullInWords } from '#server/storage/disk-full.ts';
import { AppError } from './app-error.ts';

/** A file that has arrived in a folder of the server; who takes it removes it. */
export interface ReceivedFile {
  path: string;
  fileName: string;
  /** The form's other fields. */
  fields: Record<string, unknown>;
}

const fieldMaxBytes = 4096;

/**
 * Takes the one file of a multipart form to disk, from its field `file`. `tooLarge` says what to do
 * about one over the limit.
 *
 * @throws {AppError} `too_large`, or `validation` for a broken form or one without a file
 */
export async function receiveFile(
  req: Request,
  res: Response,
  directory: string,
  fileMaxBytes: number,
  { tooLarge = 'Split it.' }: { tooLarge?: string } = {},
): Promise<ReceivedFile> {
  const take = multer({
    storage: multer.diskStorage({
      destination: directory,
      filename: (_req, _file, done) => done(null, randomUUID()),
    }),
    limits: { fileSize: fileMaxBytes, files: 1, fields: 4, fieldSize: fieldMaxBytes },
    defParamCharset: 'utf8',
  }).single('file');
  await new Promise<void>((resolve, reject) => {
    take(req, res, (error: unknown) => {
      if (!error) resolve();
      else reject(faultOf(error, fileMaxBytes, tooLarge));
    });
  });
  if (req.file === undefined) {
    throw new AppError('validation', 'The form has no file in its field "file".', {
      fields: [{ path: 'file', message: 'Choose a file.' }],
    });
  }
  return {
    path: req.file.path,
    fileName: plainName(req.file.originalname),
    fields: { ...(req.body as Record<string, unknown>) },
  };
}

function faultOf(error: unknown, fileMaxBytes: number, tooLarge: string): unknown {
  if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') {
    const most = Math.floor(fileMaxBytes / 1024 / 1024);
    const message = `The file is larger than ${most} MB, the most that is taken. ${tooLarge}`;
    return new AppError('too_large', message, { cause: error });
  }
  const known = diskFullInWords(error);
  if (known instanceof AppError || known instanceof multer.MulterError) return known;
  const message = 'The upload broke off or is no multipart form. Send it again.';
  return new AppError('validation', message, { cause: error });
}

/** Browsers may send a folder's path; the name alone tells a person which file it was. */
function plainName(sent: string): string {
  const name = (sent.split(/[/\\]/).at(-1) ?? '').replace(/\p{Cc}/gu, '').trim();
  return name === '' ? 'file' : name.slice(0, 255);
}

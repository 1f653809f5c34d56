import { randomUUID } from 'node:crypto';
import type { ErrorRequestHandler } from 'express';
import multer from 'multer';
import type { Logger } from 'pino';
import type { ErrorResponse } from '#shared/contracts/error.ts';
import { AppError, statusOfCode } from './app-error.ts';

/** Turns whatever was thrown into the one error body; only AppErrors keep their words. */
export function errorAnswer(logger: Logger): ErrorRequestHandler {
  return (thrown: unknown, req, res, next) => {
    if (res.headersSent && isLeft(thrown)) {
      // Gone to another page in the middle of a download: nobody is left to tell, nothing failed.
      logger.debug({ method: req.method, url: req.originalUrl }, 'the browser left');
      res.destroy();
      return;
    }
    const error = asAppError(thrown);
    const id = randomUUID();
    const details = { errorId: id, method: req.method, url: req.originalUrl, code: error.code };
    if (error.code === 'internal') logger.error({ ...details, err: thrown }, 'request failed');
    else logger.debug(details, error.message);
    if (res.headersSent) {
      next(thrown);
      return;
    }
    const body: ErrorResponse = {
      error: {
        code: error.code,
        message: error.message,
        id,
        ...(error.fields && { fields: error.fields }),
      },
    };
    res.status(statusOfCode[error.code]).json(body);
  };
}

const isLeft = (thrown: unknown) =>
  (thrown as { code?: unknown } | null)?.code === 'ERR_STREAM_PREMATURE_CLOSE';

function asAppError(thrown: unknown): AppError {
  if (thrown instanceof AppError) return thrown;
  if (thrown instanceof multer.MulterError) {
    return thrown.code === 'LIMIT_FILE_SIZE'
      ? new AppError('too_large', 'The file is larger than the stated limit.', { cause: thrown })
      : new AppError('validation', `The upload is not as expected: ${thrown.message}.`, {
          cause: thrown,
        });
  }
  const status = (thrown as { status?: unknown } | null)?.status;
  if (status === 413) {
    return new AppError('too_large', 'The request is larger than the stated limit.', {
      cause: thrown,
    });
  }
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new AppError('validation', 'The request could not be read.', { cause: thrown });
  }
  return new AppError(
    'internal',
    'Something went wrong on the server. Nothing was changed. Try again; if it stays, tell your administrator the error id.',
    { cause: thrown },
  );
}

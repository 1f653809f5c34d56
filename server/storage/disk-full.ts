import { AppError } from '#server/http/app-error.ts';

const noSpaceCodes = new Set(['ENOSPC', 'EDQUOT']);

/** Turns the system's "no space" into a sentence that says what to do; leaves every other error as it is. */
export function diskFullInWords(error: unknown): unknown {
  const code = (error as { code?: unknown } | null)?.code;
  if (typeof code !== 'string' || !noSpaceCodes.has(code)) return error;
  return new AppError(
    'internal',
    'The server’s disk is full. The file was not kept; make room there and send it again.',
    { cause: error },
  );
}

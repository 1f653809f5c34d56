import { errorResponse } from '#shared/contracts/error.ts';
import { ApiError } from './api-error.ts';

/** Makes an ApiError of a refusing answer's text; one that isn't ours (a proxy's page) says so. */
export function readError(status: number, text: string): ApiError {
  const body = errorResponse.safeParse(parseJson(text));
  if (body.success) {
    const { code, message, id, fields } = body.data.error;
    return new ApiError(code, message, {
      status,
      id,
      ...(fields ? { fields } : {}),
    });
  }
  return new ApiError('unreadable', `The server answered ${status} without saying why.`, {
    status,
  });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

export function unreachable(cause?: unknown): ApiError {
  return new ApiError(
    'unreachable',
    'The server can’t be reached. Nothing was changed; check the connection and try again.',
    { status: 0, cause },
  );
}

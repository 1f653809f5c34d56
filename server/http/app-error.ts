import type { ErrorCode, FieldFault } from '#shared/contracts/error.ts';

/** A refusal that a person may read: its message says what happened and what to do. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: FieldFault[] | undefined;

  constructor(
    code: ErrorCode,
    message: string,
    options: { cause?: unknown; fields?: FieldFault[] } = {},
  ) {
    super(message, { cause: options.cause });
    this.name = 'AppError';
    this.code = code;
    this.fields = options.fields;
  }
}

/** The object is not there, or not for this person: the answer doesn't tell which. */
export const notFound = (what: string) =>
  new AppError('not_found', `This ${what} does not exist or is not yours to see.`);

export const statusOfCode: Readonly<Record<ErrorCode, number>> = {
  validation: 422,
  not_signed_in: 401,
  wrong_credentials: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  wrong_state: 409,
  too_large: 413,
  unreadable_file: 422,
  too_many_requests: 429,
  internal: 500,
};

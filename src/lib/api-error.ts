import type { ErrorCode, FieldFault } from '#shared/contracts/error.ts';

/** `unreachable`: no answer came. `unreadable`: an answer came that the contract does not know. */
export type ApiErrorCode = ErrorCode | 'unreachable' | 'unreadable';

/** A request that did not do what was asked, with words fit to be shown. */
export class ApiError extends Error {
  override readonly name = 'ApiError';
  readonly code: ApiErrorCode;
  /** HTTP status; 0 where there was no answer. */
  readonly status: number;
  /** The id in the server's log. */
  readonly id: string | undefined;
  readonly fields: readonly FieldFault[];

  constructor(
    code: ApiErrorCode,
    message: string,
    more: { status: number; id?: string; fields?: readonly FieldFault[]; cause?: unknown },
  ) {
    super(message, { cause: more.cause });
    this.code = code;
    this.status = more.status;
    this.id = more.id;
    this.fields = more.fields ?? [];
  }
}

/** The fault as one error to show, whatever was thrown. */
export function toApiError(error: unknown): ApiError {
  if (error instanceof ApiError) return error;
  return new ApiError('unreadable', 'This page met something it did not expect.', {
    status: 0,
    cause: error,
  });
}

import { AppError } from '#server/http/app-error.ts';

/** Refuses an input for one field, with the message at the field. */
export function refuseField(path: string, message: string): never {
  throw new AppError('validation', message, { fields: [{ path, message }] });
}

import { z } from 'zod';

/** Every way the server refuses. The list is closed: each code has one HTTP status. */
export const errorCodes = [
  'validation',
  'not_signed_in',
  'wrong_credentials',
  'forbidden',
  'not_found',
  'conflict',
  'wrong_state',
  'too_large',
  'unreadable_file',
  'too_many_requests',
  'internal',
] as const;
export type ErrorCode = (typeof errorCodes)[number];

/** One fault of the input: where it is, what is wrong, what was expected. */
export const fieldFault = z.object({ path: z.string(), message: z.string() });
export type FieldFault = z.infer<typeof fieldFault>;

export const errorResponse = z.object({
  error: z.object({
    code: z.enum(errorCodes),
    message: z.string(),
    /** The same id stands in the server's log. */
    id: z.string(),
    fields: z.array(fieldFault).optional(),
  }),
});
export type ErrorResponse = z.infer<typeof errorResponse>;

import { z } from 'zod';

/** An id in a path or body. */
export const id = z.coerce.number().int().min(1).max(2_147_483_647);

/** A calendar day, YYYY-MM-DD, without a time zone. */
export const isoDate = z.iso.date('Enter a date as YYYY-MM-DD.');

/** A moment, ISO 8601 with zone. */
export const isoDateTime = z.iso.datetime({ offset: true });

/** Text a person types into one line: trimmed, not empty, no control characters. */
export const line = (maxLength: number, what: string) =>
  z
    .string()
    .trim()
    .min(1, `Enter ${what}.`)
    .max(maxLength, `At most ${maxLength} characters.`)
    .regex(/^\P{Cc}*$/u, 'Control characters are not allowed.');

/** Text of several lines. */
export const paragraph = (maxLength: number) =>
  z.string().trim().max(maxLength, `At most ${maxLength} characters.`);

/** A finite number within stated bounds, with the bounds in the message. */
export const numberBetween = (min: number, max: number, unit: string) =>
  z
    .number(`Enter a number${unit === '' ? '' : ` in ${unit}`}.`)
    .min(min, `At least ${min} ${unit}.`.replace(' .', '.'))
    .max(max, `At most ${max} ${unit}.`.replace(' .', '.'));

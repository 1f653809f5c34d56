import { z } from 'zod';

/** Whether the person has a calendar address for the site; the address itself is shown once. */
export const calendarFeedResponse = z.object({
  createdAt: z.string().nullable(),
  lastReadAt: z.string().nullable(),
});
export type CalendarFeedResponse = z.infer<typeof calendarFeedResponse>;

export const calendarAddressResponse = z.object({ address: z.string() });
export type CalendarAddressResponse = z.infer<typeof calendarAddressResponse>;

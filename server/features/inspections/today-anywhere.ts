const halfDayMs = 12 * 3600 * 1000;

/** The calendar day that is still "today" somewhere: a due date is past once it is past everywhere. */
export const todayAnywhere = (now: Date): string =>
  new Date(now.getTime() - halfDayMs).toISOString().slice(0, 10);

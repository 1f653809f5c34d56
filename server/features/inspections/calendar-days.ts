const msPerDay = 24 * 3600 * 1000;

const msOf = (day: string) => Date.parse(`${day}T00:00:00Z`);

/** A calendar day so many days later (or earlier). */
export const addDays = (day: string, count: number): string =>
  new Date(msOf(day) + count * msPerDay).toISOString().slice(0, 10);

/** Whole days from the first day to the second; negative where it lies before. */
export const daysBetween = (from: string, to: string): number =>
  Math.round((msOf(to) - msOf(from)) / msPerDay);

/** The Monday of the day's week. */
export function mondayOf(day: string): string {
  const sinceMonday = (new Date(msOf(day)).getUTCDay() + 6) % 7;
  return addDays(day, -sinceMonday);
}

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const dayUtc = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
});
const minute = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** A calendar day (`2026-03-04`), the same in every time zone: "4 Mar 2026". */
export function formatDay(isoDate: string): string {
  const date = new Date(`${isoDate.slice(0, 10)}T00:00:00Z`);
  return Number.isNaN(date.getTime()) ? isoDate : dayUtc.format(date);
}

/** An instant in the reader's own time zone: "4 Mar 2026, 14:05". */
export function formatInstant(iso: string): string {
  const date = new Date(iso);
  return Number.isNaN(date.getTime()) ? iso : `${day.format(date)}, ${minute.format(date)}`;
}

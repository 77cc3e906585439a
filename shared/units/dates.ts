const day = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "long", year: "numeric", timeZone: "UTC" });
const shortDay = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", year: "numeric", timeZone: "UTC" });

/** A calendar date, "1 November 2026". Takes a date or the instant it lies in, by UTC. The one date formatter. */
export function formatDate(iso: string): string {
  return day.format(new Date(iso));
}

/** "1 Nov 2026", for tables. */
export function formatShortDate(iso: string): string {
  return shortDay.format(new Date(iso));
}

/**
 * An instant where the member is, "1 Nov 2026, 14:05".
 * @param timeZone  an IANA name; left out, the zone of the machine it runs on
 */
export function formatInstant(iso: string, timeZone?: string): string {
  const format = new Intl.DateTimeFormat("en-GB", {
    day: "numeric",
    month: "short",
    year: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    ...(timeZone === undefined ? {} : { timeZone }),
  });
  return format.format(new Date(iso));
}

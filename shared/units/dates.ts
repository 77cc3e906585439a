/** Written here because the English of date libraries changes between versions ("Sept", "Sep"). */
const months = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];

/** A calendar date, "1 November 2026". Takes a date or the instant it lies in, by UTC. The one date formatter. */
export function formatDate(iso: string): string {
  const { day, month, year } = partsOf(iso, "UTC");
  return `${day} ${month} ${year}`;
}

/** "1 Nov 2026", for tables. */
export function formatShortDate(iso: string): string {
  const { day, month, year } = partsOf(iso, "UTC");
  return `${day} ${month.slice(0, 3)} ${year}`;
}

/**
 * An instant where the member is, "1 Nov 2026, 14:05".
 * @param timeZone  an IANA name; left out, the zone of the machine it runs on
 */
export function formatInstant(iso: string, timeZone?: string): string {
  const { day, month, year, hour, minute } = partsOf(iso, timeZone);
  return `${day} ${month.slice(0, 3)} ${year}, ${hour}:${minute}`;
}

interface DateParts {
  day: number;
  month: string;
  year: number;
  /** Two digits each. */
  hour: string;
  minute: string;
}

const formats = new Map<string, Intl.DateTimeFormat>();

/** Formatters are slow to make and a table needs many dates. */
function formatIn(timeZone: string | undefined): Intl.DateTimeFormat {
  const key = timeZone ?? "";
  const known = formats.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat("en-GB", {
    year: "numeric",
    month: "numeric",
    day: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
    ...(timeZone === undefined ? {} : { timeZone }),
  });
  formats.set(key, made);
  return made;
}

/** @throws RangeError when `iso` is no date */
function partsOf(iso: string, timeZone: string | undefined): DateParts {
  const date = new Date(iso);
  if (Number.isNaN(date.getTime())) throw new RangeError(`A date needs to be ISO 8601, not "${iso}"`);
  const parts = Object.fromEntries(
    formatIn(timeZone)
      .formatToParts(date)
      .map(({ type, value }) => [type, value]),
  );
  return {
    day: Number(parts.day),
    month: months[Number(parts.month) - 1]!, // Intl counts 1 to 12
    year: Number(parts.year),
    hour: parts.hour!, // asked for above, as is the minute
    minute: parts.minute!,
  };
}

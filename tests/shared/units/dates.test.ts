import { expect, test } from "vitest";
import { formatDate, formatInstant, formatShortDate } from "#shared/units/dates.ts";

test("writes a date out, by UTC", () => {
  expect(formatDate("2026-11-01")).toBe("1 November 2026");
  expect(formatDate("2026-11-01T23:59:59Z")).toBe("1 November 2026");
  expect(formatDate("2026-11-01T23:30:00-03:00")).toBe("2 November 2026");
});

test("shortens every month to three letters", () => {
  const months = Array.from({ length: 12 }, (_, i) => `2026-${String(i + 1).padStart(2, "0")}-09`);
  expect(months.map((date) => formatShortDate(date).split(" ")[1])).toEqual(
    "Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec".split(" "),
  );
  expect(formatShortDate("2026-09-09")).toBe("9 Sep 2026");
});

test("writes an instant in the zone asked for, over midnight and over the change to summer time", () => {
  expect(formatInstant("2026-11-01T14:05:00Z", "UTC")).toBe("1 Nov 2026, 14:05");
  expect(formatInstant("2026-11-01T00:05:00Z", "UTC")).toBe("1 Nov 2026, 00:05");
  expect(formatInstant("2026-12-31T23:30:00Z", "Europe/Helsinki")).toBe("1 Jan 2027, 01:30");
  // The European Union's summer time begins on the last Sunday of March at 01:00 UTC (Directive 2000/84/EC).
  expect(formatInstant("2026-03-29T00:59:00Z", "Europe/Vienna")).toBe("29 Mar 2026, 01:59");
  expect(formatInstant("2026-03-29T01:00:00Z", "Europe/Vienna")).toBe("29 Mar 2026, 03:00");
});

test.each(["", "soon", "2026-13-01"])("refuses %j", (text) => {
  expect(() => formatDate(text)).toThrow(RangeError);
});

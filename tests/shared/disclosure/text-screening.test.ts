import { describe, expect, test } from "vitest";
import { screenText, textRefusalWords } from "#shared/disclosure/text-screening.ts";

const own = { shop: "Kettleby Moor Metal Works", people: ["Ansa Thrupp", "Will Óspaksson"] };

describe("text screening", () => {
  test.each([
    "Clean cut at 2450 mm/min, 45 A and 118 V; dross below 2000 mm/min.",
    "Tried 2000 2200 2400 2600 2800 mm/min in that order",
    "Tried 30 40 50 60 70 A",
    "Height 1.5/1.6/1.7 mm, delay 0.3-0.4-0.5 s, kerf 0.8 1.6 2450",
    "Height 1.5\u20131.7 mm, feed 2300\u20132500 mm/min; 3 \u00b5m Rz5",
    "Set it more by ear: a kettle of water, by the torch.",
    "Pierce at 3.8 mm. It works on metal with mill scale, and will mark the plate.",
    "",
  ])("lets %j through", (text) => {
    expect(screenText(text, own)).toEqual([]);
  });

  test.each([
    ["write to cut@example.org", "e-mail"],
    ["write to cut (at) example (dot) org", "e-mail"],
    ["write to cut at example dot org", "e-mail"],
    ["write to ｃｕｔ＠ｅｘａｍｐｌｅ．ｏｒｇ", "e-mail"],
    ["call 555-0100", "phone"],
    ["call (202) 555-0143", "phone"],
    ["call 202.555.0143", "phone"],
    ["call +44 20 7946 0958", "phone"],
    ["call 06 12 34 56 78", "phone"],
    ["call 2025550143", "phone"],
    ["call 555\u20130100", "phone"], // as phones set a number: with an en dash
    ["call 202\u00b7555\u00b70143", "phone"],
    ["call \u0662\u0660\u0662 \u0665\u0665\u0665 \u0660\u0661\u0664\u0663", "phone"], // Arabic-Indic digits
    ["see https://example.org/cut", "link"],
    ["see example\u3002com for more", "link"],
    ["see example.tech", "link"],
    ["see www.example.test", "link"],
    ["see example.com for more", "link"],
    ["see example dot com", "link"],
    ["we are @kettlebrand", "link"],
    ["Greetings from Kettleby", "shop-name"],
    ["MOOR settings", "shop-name"],
    ["k e t t l e b y m o o r m e t a l w o r k s", "shop-name"],
    ["kettleby\u200bmoor metal works", "shop-name"],
    ["Greetings from Kettle by", "shop-name"],
    ["Greetings from K-e-t-t-l-e-b-y", "shop-name"],
    ["Ask M o o r", "shop-name"],
    ["KettlebyMoor settings", "shop-name"],
    ["Kettlebys way", "shop-name"],
    ["Greetings from K3ttl3by", "shop-name"],
    ["Greetings from KettIeby", "shop-name"], // a capital i for the l
    ["Greetings from \u041a\u0435ttl\u0435by", "shop-name"], // Cyrillic
    ["Greetings from \u039aettleby", "shop-name"], // Greek
    ["Greetings from Kettle\u3164by", "shop-name"], // Hangul filler: a letter that shows nothing
    ["Greetings from Kettle\u2800by", "shop-name"], // a Braille blank
    ["Ansa found this", "person-name"],
    ["as thr\u03c5pp says", "person-name"],
    ["as thr.upp says", "person-name"],
    ["as thrupp says", "person-name"],
    ["Will found this", "person-name"],
    ["ospaksson's setting", "person-name"],
  ] as const)("refuses %j: %s", (text, reason) => {
    expect(screenText(text, own)).toContain(reason);
  });

  test("gives every reason at once, each with words", () => {
    const reasons = screenText("Ansa at Kettleby, 202-555-0143, ansa@example.org, https://example.org", own);
    expect(reasons).toEqual(["e-mail", "phone", "link", "shop-name", "person-name"]);
    expect(reasons.every((reason) => textRefusalWords[reason].length > 0)).toBe(true);
  });

  test("words half the trade has in its name are no name", () => {
    expect(screenText("Metal works best when clean", own)).toEqual([]);
  });
});

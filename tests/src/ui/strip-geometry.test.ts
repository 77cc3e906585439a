import fc from "fast-check";
import { expect, test } from "vitest";
import { figureWidth, stripLabels, stripTicks } from "../../../src/ui/strip-labels.ts";
import { placeOwn, stripFrame, stripScale } from "../../../src/ui/strip-scale.ts";

const frame = stripFrame(480, "full");
const feed = { p5: 1700, p10: 1820, p25: 2080, p50: 2310, p75: 2490, p90: 2860, p95: 3000 };

test("the bar runs from p10 to p90, with equal stubs beyond", () => {
  const scale = stripScale(feed, "linear", frame);
  expect(scale.x(1820)).toBe(frame.barLeft);
  expect(scale.x(2860)).toBe(frame.barRight);
  expect(frame.barLeft).toBeCloseTo(480 - frame.barRight, 10);
  expect(scale.x((1820 + 2860) / 2)).toBeCloseTo(240, 10);
});

test.each([{ p10: null }, { p90: null }])(
  "the bar runs from p25 to p75 when %j is all that is known of a tail",
  (tail) => {
    const scale = stripScale({ ...feed, ...tail }, "linear", frame);
    expect(scale.ends).toEqual([2080, 2490]);
    expect(stripTicks({ ...feed, ...tail }, scale).map((tick) => tick.name)).toEqual(["p25", "p50", "p75"]);
  },
);

test("on a log scale equal factors are equal lengths", () => {
  const scale = stripScale({ p10: 1, p25: 2, p50: 4, p75: 8, p90: 16 }, "log", frame);
  const steps = [1, 2, 4, 8, 16].map(scale.x);
  expect(steps[1]! - steps[0]!).toBeCloseTo(steps[4]! - steps[3]!, 10);
});

test("where all set the same, that value is in the middle and any other beyond the ends", () => {
  const scale = stripScale({ p10: 5, p25: 5, p50: 5, p75: 5, p90: 5 }, "linear", frame);
  expect(placeOwn(5, scale, 12)).toEqual({ where: "on", x: 240 });
  expect(placeOwn(4.9, scale, 12).where).toBe("left");
  expect(placeOwn(5.1, scale, 12).where).toBe("right");
});

test("the own value leaves the strip where its mark would no longer fit", () => {
  const scale = stripScale(feed, "linear", frame);
  expect(placeOwn(2600, scale, 12).where).toBe("on");
  expect(placeOwn(2900, scale, 12).where).toBe("on");
  expect(placeOwn(9000, scale, 12)).toEqual({ where: "right", x: 480 });
  expect(placeOwn(200, scale, 12)).toEqual({ where: "left", x: 0 });
});

test("figures with room stand right under their ticks", () => {
  const labels = stripLabels(stripTicks(feed, stripScale(feed, "linear", frame)), String, 480);
  expect(labels.map((label) => label.text)).toEqual(["1820", "2080", "2310", "2490", "2860"]);
  for (const label of labels) expect(label.textX).toBeCloseTo(label.x, 10);
});

test("the same figure is written once, at the median", () => {
  const alike = { p10: 40, p25: 45, p50: 45, p75: 45, p90: 50 };
  const labels = stripLabels(stripTicks(alike, stripScale(alike, "linear", frame)), String, 480);
  expect(labels.map((label) => label.name)).toEqual(["p10", "p50", "p90"]);
});

const sorted = fc
  .array(fc.integer({ min: 100, max: 99_999 }), { minLength: 5, maxLength: 5 })
  .map((values) => values.sort((a, b) => a - b))
  .filter((values) => values[0]! < values[4]!);
const readings = { linear: (value: number) => value.toLocaleString("en"), log: (value: number) => `${value}.5` };

test("figures never touch, keep their order and stay inside, on 288 px as on 640", () => {
  fc.assert(
    fc.property(
      sorted,
      fc.constantFrom(288, 320, 640),
      fc.constantFrom("linear" as const, "log" as const),
      (values, width, kind) => {
        const [p10, p25, p50, p75, p90] = values as [number, number, number, number, number];
        const quantiles = { p10, p25, p50, p75, p90 };
        const scale = stripScale(quantiles, kind, stripFrame(width, "full"));
        const labels = stripLabels(stripTicks(quantiles, scale), readings[kind], width);
        const spans = labels.map((label) => {
          const half = figureWidth(label.text, label.name === "p50") / 2;
          return { left: label.textX - half, right: label.textX + half };
        });
        expect(spans[0]!.left).toBeGreaterThanOrEqual(-1e-9);
        expect(spans.at(-1)!.right).toBeLessThanOrEqual(width + 1e-9);
        for (const [i, span] of spans.entries()) if (i > 0) expect(span.left).toBeGreaterThan(spans[i - 1]!.right);
        expect(labels.some((label) => label.name === "p50")).toBe(true);
      },
    ),
    { seed: 7, numRuns: 400 },
  );
});

test("quartiles give up their figures where five have no room", () => {
  const labels = stripLabels(stripTicks(feed, stripScale(feed, "linear", stripFrame(140, "full"))), String, 140);
  expect(labels.map((label) => label.name)).toEqual(["p10", "p50", "p90"]);
});

import { render, screen, waitFor } from "@testing-library/react";
import { expect, test } from "vitest";
import { densityGrid } from "../../../src/ui/density-curve.tsx";
import { StripRow } from "../../../src/ui/strip-row.tsx";
import { TemperStrip, type TemperStripProps } from "../../../src/ui/temper-strip.tsx";

const strip: TemperStripProps = {
  size: "full",
  scale: "log",
  quantiles: { p5: null, p10: 1820, p25: 2080, p50: 2310, p75: 2490, p90: 2860, p95: null },
  own: { value: 2600, text: "2,600 mm/min" },
  tickText: (value) => value.toLocaleString("en"),
  sentence: "Your 2,600 mm/min is quicker than most: about 82 % of peers cut slower.",
};

test("is one picture named by its sentence, which everybody can read below it", () => {
  render(<TemperStrip {...strip} />);
  expect(screen.getByRole("img", { name: strip.sentence })).toBeTruthy();
  expect(screen.getByText(strip.sentence).className).not.toContain("sr-only");
});

test("writes the five figures and marks the own value", () => {
  const { container } = render(<TemperStrip {...strip} />);
  const figures = [...container.querySelectorAll("text")].map((text) => text.textContent);
  expect(figures).toEqual(["1,820", "2,080", "2,310", "2,490", "2,860"]);
  expect(container.querySelectorAll("[data-punch-mark]")).toHaveLength(1);
});

test.each([
  [9000, "right"],
  [300, "left"],
])("points off the end for %d mm/min, to the %s", (value, side) => {
  const { container } = render(<TemperStrip {...strip} own={{ value, text: `${value} mm/min` }} />);
  expect(container.querySelector("[data-off-end]")?.getAttribute("data-off-end")).toBe(side);
  expect(container.querySelector("[data-punch-mark]")).toBeNull();
});

test("a withheld group shows why, and none of the figures even if they were given", () => {
  const reason = "Not enough shops yet. At least 5 are needed.";
  const { container } = render(<TemperStrip {...strip} withheld={reason} />);
  expect(screen.getByRole("img", { name: reason })).toBeTruthy();
  expect(container.querySelectorAll("text, [data-punch-mark], linearGradient")).toHaveLength(0);
  expect(container.textContent).toBe(reason);
  expect(container.querySelector("pattern")).not.toBeNull();
});

test("the mini strip keeps its name but writes nothing", () => {
  const { container } = render(<TemperStrip {...strip} size="mini" />);
  expect(screen.getByRole("img", { name: strip.sentence })).toBeTruthy();
  expect(screen.getByText(strip.sentence).className).toContain("sr-only");
  expect(container.querySelectorAll("text")).toHaveLength(0);
  expect(container.querySelectorAll("[data-punch-mark]")).toHaveLength(1);
});

test("two strips on a page do not share their paint", () => {
  const { container } = render(
    <>
      <TemperStrip {...strip} />
      <TemperStrip {...strip} />
    </>,
  );
  const ids = [...container.querySelectorAll("[id]")].map((element) => element.id);
  expect(new Set(ids).size).toBe(ids.length);
});

test("the density curve stands on the strip when there is one", async () => {
  const density = { from: 1600, to: 3100, logScale: false, heights: [0, 0.4, 1, 0.5, 0] };
  const { container } = render(<TemperStrip {...strip} density={density} />);
  await waitFor(() => expect(container.querySelector("path.fill-line")).not.toBeNull());
  expect(container.querySelector("path.fill-line")?.getAttribute("d")).not.toMatch(/NaN|Infinity/);
});

test("the density grid steps by equal differences or equal factors", () => {
  const grid = { from: 1, to: 16, heights: [0, 0, 0, 0, 0] };
  expect(densityGrid({ ...grid, logScale: false })).toEqual([1, 4.75, 8.5, 12.25, 16]);
  const factors = densityGrid({ ...grid, logScale: true });
  for (const [i, value] of [1, 2, 4, 8, 16].entries()) expect(factors[i]).toBeCloseTo(value, 10);
});

test("a row gives the strip its name, its own value with the unit, and a few words", () => {
  const { container } = render(
    <StripRow name="Feed rate" unit="mm/min" figure="2,600" note="quicker: about 82 %">
      <TemperStrip {...strip} />
    </StripRow>,
  );
  expect(screen.getByRole("heading", { name: "Feed rate" })).toBeTruthy();
  expect(container.textContent).toContain("2,600 mm/min");
  expect(container.textContent).toContain("quicker: about 82 %");
});

import { expect, test } from "vitest";
import { palette, themes } from "../../../tailwind.config.ts";

/** Relative luminance of an sRGB colour, WCAG 2.2, "relative luminance" (threshold 0.04045 as corrected in 2021). */
function luminance(hex: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio, WCAG 2.2, "contrast ratio": (L1 + 0.05) / (L2 + 0.05), lighter over darker. */
function contrast(a: string, b: string): number {
  const [lighter, darker] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (lighter + 0.05) / (darker + 0.05);
}

test("the formula gives 21:1 for black on white and 1:1 for equals, as WCAG 2.2 states its range", () => {
  expect(contrast("#000000", "#FFFFFF")).toBeCloseTo(21, 10);
  expect(contrast("#747C75", "#747C75")).toBe(1);
});

type Name = keyof typeof themes.light;
const grounds: Name[] = ["page", "surface", "sunken"];

/** Every pair that text is set in. Success criterion 1.4.3 (AA): 4.5:1. */
const texts: [text: Name, ground: Name][] = [
  ...(["ink", "soft", "muted", "action", "action-hover", "stop"] as const).flatMap((text) =>
    grounds.map((ground): [Name, Name] => [text, ground]),
  ),
  ...(["sound", "watch", "stop"] as const).flatMap((state): [Name, Name][] => [
    [state, "page"],
    [state, "surface"],
    [state, `${state}-soft`],
    ["ink", `${state}-soft`],
    ["soft", `${state}-soft`],
    ["action", `${state}-soft`],
  ]),
  ["action", "action-soft"],
  ["ink", "action-soft"],
  ["on-action", "action"],
  ["on-action", "action-hover"],
  ["on-danger", "danger"],
  ["on-danger", "danger-hover"],
];

/** Edges of controls, marks and focus rings. Success criterion 1.4.11 (AA): 3:1. */
const graphics: [mark: Name, ground: Name][] = [
  ...grounds.map((ground): [Name, Name] => ["line-strong", ground]),
  ...grounds.map((ground): [Name, Name] => ["action", ground]),
  ["mark-rim", "mark"],
];

for (const theme of ["light", "dark"] as const) {
  const colour = (name: Name) => themes[theme][name];

  test.each(texts)(`${theme}: text %s on %s reaches 4.5:1`, (text, ground) => {
    expect(contrast(colour(text), colour(ground))).toBeGreaterThanOrEqual(4.5);
  });

  test.each(graphics)(`${theme}: %s beside %s reaches 3:1`, (mark, ground) => {
    expect(contrast(colour(mark), colour(ground))).toBeGreaterThanOrEqual(3);
  });

  test(`${theme}: the punch mark stands out from every step of the temper scale by its rim or its body`, () => {
    for (const step of Object.values(palette.temper)) {
      const best = Math.max(contrast(step, colour("mark")), contrast(step, colour("mark-rim")));
      expect(best).toBeGreaterThanOrEqual(3);
    }
  });
}

test("the temper scale darkens at every step, so it survives greyscale", () => {
  const steps = Object.values(palette.temper).map(luminance);
  for (const [i, step] of steps.entries()) if (i > 0) expect(step).toBeLessThan(steps[i - 1]!);
});

test("both themes fill the same names", () => {
  expect(Object.keys(themes.dark)).toEqual(Object.keys(themes.light));
});

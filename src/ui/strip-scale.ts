/** What a strip is drawn from: null or absent where a figure is not released. All in one unit. */
export interface StripQuantiles {
  p5?: number | null;
  p10?: number | null;
  p25: number;
  p50: number;
  p75: number;
  p90?: number | null;
  p95?: number | null;
}

export type StripScaleKind = "linear" | "log";

/** Horizontal measures of a strip, in px. */
export interface StripFrame {
  width: number;
  barLeft: number;
  barRight: number;
}

export interface StripScale {
  frame: StripFrame;
  /** Values at the ends of the bar. */
  ends: readonly [number, number];
  /** Where a value lies, in px from the left; may be outside the frame. */
  x: (value: number) => number;
}

const stubShare = { full: 0.083, mini: 0.1 };
const stubLimits = { full: [26, 40], mini: [8, 12] } as const;

/** The bar in its width, with a stub on either side for what lies beyond it. */
export function stripFrame(width: number, size: "full" | "mini"): StripFrame {
  const [least, most] = stubLimits[size];
  const stub = Math.min(most, Math.max(least, width * stubShare[size]));
  return { width, barLeft: stub, barRight: width - stub };
}

/** The bar runs from p10 to p90 where both are released, else from p25 to p75. */
export function stripScale(quantiles: StripQuantiles, kind: StripScaleKind, frame: StripFrame): StripScale {
  const { p10, p25, p75, p90 } = quantiles;
  const ends: [number, number] = p10 != null && p90 != null ? [p10, p90] : [p25, p75];
  const along = kind === "log" && ends[0] > 0 ? (value: number) => Math.log(Math.max(value, Number.MIN_VALUE)) : Number;
  const [from, to] = [along(ends[0]), along(ends[1])];
  const middle = (frame.barLeft + frame.barRight) / 2;

  return {
    frame,
    ends,
    x: (value) => {
      // Everybody alike: the bar has no extent, so the one value stands in its middle and all others beyond its ends.
      if (to === from) return along(value) === from ? middle : along(value) < from ? -Infinity : Infinity;
      return frame.barLeft + ((along(value) - from) / (to - from)) * (frame.barRight - frame.barLeft);
    },
  };
}

export type OwnPlace = { where: "on"; x: number } | { where: "left" | "right"; x: number };

/** Where the punch mark goes; off the end it becomes an arrow at the rim. `room` is half the mark's width in px. */
export function placeOwn(value: number, scale: StripScale, room: number): OwnPlace {
  const x = scale.x(value);
  if (x < room) return { where: "left", x: 0 };
  if (x > scale.frame.width - room) return { where: "right", x: scale.frame.width };
  return { where: "on", x };
}

import { Curve, Shape } from "@visx/visx";
import type { StripScale } from "./strip-scale.ts";

/** Heights on an even grid from one value to another, the highest being 1. */
export interface DensityShape {
  from: number;
  to: number;
  /** The grid steps by equal factors. */
  logScale: boolean;
  heights: readonly number[];
}

/** The values the heights stand at. */
export function densityGrid({ from, to, logScale, heights }: DensityShape): number[] {
  const last = heights.length - 1;
  return heights.map((_, i) => (logScale ? from * (to / from) ** (i / last) : from + ((to - from) * i) / last));
}

/** How many peers set what, standing on the strip and sharing its scale. What lies beyond the strip is cut off. */
export function DensityCurve({ density, scale, height }: { density: DensityShape; scale: StripScale; height: number }) {
  const values = densityGrid(density);
  const points = density.heights
    .map((level, i) => ({ x: scale.x(values[i]!), y: height - level * (height - 2) }))
    .filter(({ x }) => Number.isFinite(x));

  return (
    <svg
      width={scale.frame.width}
      height={height}
      viewBox={`0 0 ${scale.frame.width} ${height}`}
      className="block h-auto max-w-full overflow-hidden"
      aria-hidden="true"
    >
      <Shape.Area
        data={points}
        x={(point) => point.x}
        y0={height}
        y1={(point) => point.y}
        curve={Curve.curveMonotoneX}
        className="fill-line"
      />
      <Shape.LinePath
        data={points}
        x={(point) => point.x}
        y={(point) => point.y}
        curve={Curve.curveMonotoneX}
        className="stroke-line-strong"
        strokeWidth={1}
        fill="none"
      />
    </svg>
  );
}

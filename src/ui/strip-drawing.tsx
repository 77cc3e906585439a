import { useId } from "react";
import { PunchMarkShape } from "./punch-mark.tsx";
import { type StripLabel, type StripTick, stripLabels, stripTicks } from "./strip-labels.ts";
import { type OwnPlace, placeOwn, type StripFrame, type StripQuantiles, type StripScale } from "./strip-scale.ts";
import { TemperGradient } from "./temper-gradient.tsx";

export interface StripOwn {
  value: number;
  /** The value with its unit. */
  text: string;
}

interface Measures {
  /** Top and height of the bar, and radius of the punch mark, in px. */
  top: number;
  bar: number;
  mark: number;
}

const measures: Record<"full" | "mini", Measures> = {
  full: { top: 7, bar: 16, mark: 9 },
  mini: { top: 6, bar: 8, mark: 5.5 },
};
/** Room for one line of figures, and for the leaders to those that had to move aside. */
const lineHeight = 20;
const leaderHeight = 6;

/** Paper may be narrower than the screen it was measured on; then the drawing shrinks as a whole. */
const svgClasses = "block h-auto max-w-full overflow-visible";

export interface StripDrawingProps {
  quantiles: StripQuantiles;
  own: StripOwn | undefined;
  scale: StripScale;
  size: "full" | "mini";
  tickText: (value: number) => string;
}

export function StripDrawing({ quantiles, own, scale, size, tickText }: StripDrawingProps) {
  const id = useId();
  const m = measures[size];
  const { width, barLeft, barRight } = scale.frame;
  const ticks = stripTicks(quantiles, scale);
  const labels = size === "full" ? stripLabels(ticks, tickText, width) : [];
  const moved = labels.some((label) => Math.abs(label.textX - label.x) > 1) ? leaderHeight : 0;
  const below = m.top + m.bar + m.top + moved;
  const height = below + (labels.length > 0 ? lineHeight : 0);
  const flat = scale.ends[0] === scale.ends[1];

  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} className={svgClasses} aria-hidden="true">
      <defs>
        <TemperGradient id={`${id}-temper`} />
        <Fades id={id} />
      </defs>
      <Stubs id={id} frame={scale.frame} y={m.top + m.bar / 2} />
      <rect
        x={barLeft}
        y={m.top}
        width={barRight - barLeft}
        height={m.bar}
        fill={`url(#${id}-temper)`}
        className="stroke-temper-rim"
        opacity={flat ? 0.35 : 1}
      />
      {ticks.map((tick) => (
        <Tick key={tick.name} tick={tick} m={m} />
      ))}
      {labels.map((label) => (
        <Figure key={label.name} label={label} tickEnd={m.top * 2 + m.bar - 1} top={below} />
      ))}
      {own ? <OwnMark place={placeOwn(own.value, scale, m.mark + 3)} m={m} /> : null}
    </svg>
  );
}

/** The line beyond the bar fades outward: peers are there too, but how far is not shown. */
function Fades({ id }: { id: string }) {
  const ends = [0.25, 1];
  return ends.map((opacity, i) => (
    <linearGradient key={opacity} id={`${id}-fade-${i}`}>
      <stop offset="0" className="[stop-color:var(--line-strong)]" stopOpacity={opacity} />
      <stop offset="1" className="[stop-color:var(--line-strong)]" stopOpacity={ends[1 - i]} />
    </linearGradient>
  ));
}

function Stubs({ id, frame, y }: { id: string; frame: StripFrame; y: number }) {
  // Rectangles, because a gradient along a flat line has no box to be measured in.
  return (
    <>
      <rect x={0} y={y - 0.75} width={frame.barLeft} height={1.5} fill={`url(#${id}-fade-0)`} />
      <rect
        x={frame.barRight}
        y={y - 0.75}
        width={frame.width - frame.barRight}
        height={1.5}
        fill={`url(#${id}-fade-1)`}
      />
    </>
  );
}

function Tick({ tick, m }: { tick: StripTick; m: Measures }) {
  const bottom = m.top + m.bar;
  if (tick.name === "p50") {
    return (
      <g>
        {/* A light edge keeps the median readable on the dark end of the scale. */}
        <rect x={tick.x - 2} y={m.top} width={4} height={m.bar} className="fill-surface opacity-60" />
        <rect x={tick.x - 1} y={m.top - 6} width={2} height={m.bar + 12} className="fill-ink" />
      </g>
    );
  }
  return <rect x={tick.x - 0.5} y={bottom} width={1} height={m.top - 1} className="fill-line-strong" />;
}

interface FigureProps {
  label: StripLabel;
  /** Lower end of the tick and upper edge of the line of figures, in px from the top. */
  tickEnd: number;
  top: number;
}

function Figure({ label, tickEnd, top }: FigureProps) {
  const moved = Math.abs(label.textX - label.x) > 1;
  return (
    <>
      {moved ? (
        <path d={`M${label.x} ${tickEnd}L${label.textX} ${top}`} fill="none" className="stroke-line-strong" />
      ) : null}
      <text
        x={label.textX}
        y={top + 15}
        textAnchor="middle"
        className={label.name === "p50" ? "figures fill-ink text-sm font-bold" : "figures fill-soft text-sm"}
      >
        {label.text}
      </text>
    </>
  );
}

function OwnMark({ place, m }: { place: OwnPlace; m: Measures }) {
  const y = m.top + m.bar / 2;
  if (place.where === "on") return <PunchMarkShape x={place.x} y={y} radius={m.mark} />;
  const inward = place.where === "left" ? 1 : -1;
  const tip = place.x;
  const arrow = `M${tip} ${y}l${inward * m.mark} ${-m.mark}v${m.mark * 2}Z`;
  return (
    <g data-off-end={place.where}>
      <rect
        x={inward === 1 ? tip + m.mark : tip - m.mark - 10}
        y={y - 1.5}
        width={10}
        height={3}
        className="fill-ink"
      />
      <path d={arrow} className="fill-mark stroke-mark-rim" strokeWidth={1.5} />
    </g>
  );
}

/** An empty hatched bar: there are figures, or could be, but they are not shown. */
export function WithheldDrawing({ frame, size }: { frame: StripFrame; size: "full" | "mini" }) {
  const id = useId();
  const m = measures[size];
  const height = m.top * 2 + m.bar;
  return (
    <svg
      width={frame.width}
      height={height}
      viewBox={`0 0 ${frame.width} ${height}`}
      className={svgClasses}
      aria-hidden="true"
    >
      <defs>
        <pattern id={id} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="1.5" height="7" className="fill-line-strong opacity-70" />
        </pattern>
      </defs>
      <rect
        x={frame.barLeft + 0.5}
        y={m.top + 0.5}
        width={frame.barRight - frame.barLeft - 1}
        height={m.bar - 1}
        fill={`url(#${id})`}
        className="stroke-line-strong"
      />
    </svg>
  );
}

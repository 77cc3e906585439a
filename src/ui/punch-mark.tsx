/** The member's own value: a small dark diamond with a light rim. Drawn inside an SVG, centred on (x, y). */
export function PunchMarkShape({ x, y, radius = 9 }: { x: number; y: number; radius?: number }) {
  const diamond = (r: number) => `M${x} ${y - r}L${x + r} ${y}L${x} ${y + r}L${x - r} ${y}Z`;
  return (
    <g data-punch-mark="">
      {/* Three nested diamonds: a dark edge keeps the light rim visible on a light page. */}
      <path d={diamond(radius + 2.5)} className="fill-mark" />
      <path d={diamond(radius + 1)} className="fill-mark-rim" />
      <path d={diamond(radius - 2)} className="fill-mark" />
    </g>
  );
}

/** The same mark on its own, beside the words that say what it is. */
export function PunchMark({ size = 16 }: { size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 24 24"
      aria-hidden="true"
      className="inline-block shrink-0 align-[-0.15em]"
    >
      <PunchMarkShape x={12} y={12} />
    </svg>
  );
}

import { useId } from "react";
import { PunchMarkShape } from "./punch-mark.tsx";
import { TemperGradient } from "./temper-gradient.tsx";

/** The product's sign: a small temper strip with a punch mark, and its name. */
export function Wordmark() {
  const id = useId();
  return (
    <span className="inline-flex items-center gap-2.5">
      <svg width="30" height="20" viewBox="0 0 30 20" aria-hidden="true">
        <defs>
          <TemperGradient id={id} />
        </defs>
        <rect x="0" y="7" width="30" height="10" fill={`url(#${id})`} />
        <PunchMarkShape x={17} y={7} radius={4.5} />
      </svg>
      <span className="text-lg font-black tracking-tight text-ink">Tempermark</span>
    </span>
  );
}

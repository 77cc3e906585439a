import { useId } from "react";
import type { CountBand } from "#shared/contracts/released-figures.ts";
import { countWords } from "#shared/peers/count-words.ts";
import { PunchMark } from "../../ui/punch-mark.tsx";
import { depths } from "./map-depth.ts";

/** Without a network set to a smaller quorum there is no band below five shops. */
const usual: readonly CountBand[] = ["5-9", "10-19", "20-49", "50+"];

/** What the map's squares mean, in words. */
export function MapLegend({ shown }: { shown: readonly CountBand[] }) {
  const hatch = useId();
  const bands: readonly CountBand[] = shown.includes("3-4") ? ["3-4", ...usual] : usual;
  return (
    <ul aria-label="What the squares mean" className="space-y-2 text-sm">
      {bands.map((band) => (
        <li key={band} className="flex items-center gap-3">
          <Swatch>
            <rect x={0.5} y={0.5} width={27} height={19} className="fill-surface stroke-line" />
            <rect width={28} height={20} className="fill-ink" opacity={depths[band].opacity} />
          </Swatch>
          {countWords(band)}
        </li>
      ))}
      <li className="flex items-center gap-3">
        <Swatch>
          <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <rect width="1" height="7" className="fill-line-strong opacity-60" />
          </pattern>
          <rect x={0.5} y={0.5} width={27} height={19} fill={`url(#${hatch})`} className="stroke-line" />
        </Swatch>
        Not shown: too few shops
      </li>
      <li className="flex items-center gap-3">
        <span className="flex w-7 shrink-0 justify-center">
          <PunchMark size={20} />
        </span>
        You have a recipe here
      </li>
    </ul>
  );
}

function Swatch({ children }: { children: React.ReactNode }) {
  return (
    <svg width={28} height={20} aria-hidden="true" className="shrink-0" data-keep-colour="">
      {children}
    </svg>
  );
}

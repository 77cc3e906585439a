import { lazy, Suspense, useId } from "react";
import { classNames } from "./class-names.ts";
import type { DensityShape } from "./density-curve.tsx";
import { StripDrawing, type StripOwn, WithheldDrawing } from "./strip-drawing.tsx";
import { type StripQuantiles, type StripScaleKind, stripFrame, stripScale } from "./strip-scale.ts";
import { useWidth } from "./use-width.ts";

const DensityCurve = lazy(() => import("./density-curve.tsx").then((module) => ({ default: module.DensityCurve })));

export interface TemperStripProps {
  quantiles?: StripQuantiles | undefined;
  own?: StripOwn | undefined;
  /** A figure under a tick, without its unit. */
  tickText: (value: number) => string;
  /** Says all of it to people who do not read plots; the strip's accessible name. */
  sentence: string;
  /** Why nothing is shown, instead of quantiles. */
  withheld?: string | undefined;
  density?: DensityShape | null | undefined;
  size: "full" | "mini";
  scale: StripScaleKind;
  /** The sentence is always there for screen readers; hidden from view where the page says it beside the strip. */
  hideSentence?: boolean;
}

/** Where a value lies among its peers. The one picture of it in the product; the temper scale appears only here. */
export function TemperStrip(props: TemperStripProps) {
  const { quantiles, own, tickText, sentence, withheld, density, size, scale: kind, hideSentence } = props;
  const [box, width] = useWidth<HTMLDivElement>(size === "mini" ? 96 : 320);
  const sentenceId = useId();
  const frame = stripFrame(width, size);
  const shown = withheld === undefined ? quantiles : undefined;
  const scale = shown && stripScale(shown, kind, frame);
  const words = withheld ?? sentence;

  return (
    <div className={size === "mini" ? "inline-block w-24 align-middle" : "w-full"}>
      <div ref={box} role="img" aria-labelledby={sentenceId} data-keep-colour="">
        {density && scale && size === "full" ? (
          <Suspense fallback={<div className="h-10" />}>
            <DensityCurve density={density} scale={scale} height={40} />
          </Suspense>
        ) : null}
        {shown && scale ? (
          <StripDrawing quantiles={shown} own={own} scale={scale} size={size} tickText={tickText} />
        ) : (
          <WithheldDrawing frame={frame} size={size} />
        )}
      </div>
      <p id={sentenceId} className={classNames(size === "mini" || hideSentence ? "sr-only" : "mt-1 text-sm text-soft")}>
        {words}
      </p>
    </div>
  );
}

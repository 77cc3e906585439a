import { StripRow } from "../../ui/strip-row.tsx";
import { TemperStrip } from "../../ui/temper-strip.tsx";
import { exampleFigures } from "./example-figures.ts";

const figure = (mmMin: number) => mmMin.toLocaleString("en-GB");

/** One peer group as a member sees it, from invented figures. */
export function ExampleStrip() {
  const { quantiles, ownMmMin, sentence } = exampleFigures;
  return (
    <figure className="rounded border border-line bg-surface p-4 md:p-6">
      <figcaption className="mb-4 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <span>
          <b>Mild steel, 3.15 mm band, 0.8 mm nozzle</b>
          <span className="block text-sm text-muted">10 to 19 shops, compressed air</span>
        </span>
        <span className="rounded border border-line-strong px-2 text-sm font-bold">Example, figures invented</span>
      </figcaption>
      <StripRow name="Feed rate" unit="mm/min" figure={figure(ownMmMin)} note="Your setpoint">
        <TemperStrip
          size="full"
          scale="log"
          quantiles={quantiles}
          own={{ value: ownMmMin, text: `${figure(ownMmMin)} mm/min` }}
          tickText={figure}
          sentence={sentence}
        />
      </StripRow>
      <p className="mt-3 text-sm text-muted">
        The bar is what other shops set, slowest tenth to quickest tenth. The diamond is you; nobody else sees it.
      </p>
    </figure>
  );
}

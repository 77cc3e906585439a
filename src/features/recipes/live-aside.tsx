import { useWatch } from "react-hook-form";
import type { PeerGroupSubject } from "#shared/peers/peer-group.ts";
import type { RecipeFigures } from "#shared/recipes/limits.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { CautionsLine } from "../../lib/cautions.tsx";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { HeatNote } from "./heat-note.tsx";
import { LiveStandings } from "./live-standing.tsx";
import { figuresSoFar, type RecipeControl, type RecipeFormValues } from "./recipe-form-values.ts";

/** Asked for while thickness or nozzle are not typed yet: the metal's figures are fetched, the group is not looked at. */
const placeholder = { thicknessMm: 3, nozzleMm: 0.8 };

export function liveSubject(values: RecipeFormValues, own: RecipeFigures): PeerGroupSubject {
  return {
    material: values.material,
    gas: values.processGas,
    thicknessMm: own.thicknessMm ?? placeholder.thicknessMm,
    nozzleMm: own.nozzleMm ?? placeholder.nozzleMm,
  };
}

export interface LiveAsideProps {
  control: RecipeControl;
  units: UnitSystem;
  heatOnly?: boolean;
}

/** What the figures typed so far mean: whether they can be, and where they lie among the peers. */
export function LiveAside({ control, units, heatOnly }: LiveAsideProps) {
  const values = useWatch({ control }) as RecipeFormValues; // every field has a default
  const own = figuresSoFar(values, units);
  const { figures } = useGroupFigures(liveSubject(values, own));
  const heat = <HeatNote {...heatFigures(own)} material={values.material} gas={values.processGas} />;
  const cautions = <CautionsLine material={values.material} gas={values.processGas} currentA={own.currentA} />;
  if (heatOnly) {
    return (
      <>
        {heat}
        {cautions}
      </>
    );
  }
  return (
    <aside
      aria-label="What these figures mean"
      className="space-y-4 lg:sticky lg:top-[calc(var(--bar-height)+1rem)] lg:max-h-[calc(100dvh-var(--bar-height)-2rem)] lg:self-start lg:overflow-y-auto"
    >
      {heat}
      {cautions}
      <section>
        <h2 className="text-lg font-bold">Among your peers</h2>
        <LiveStandings figures={figures} own={own} units={units} />
      </section>
    </aside>
  );
}

function heatFigures(own: Required<RecipeFigures>) {
  const { thicknessMm, feedMmMin, kerfWidthMm, currentA, arcVoltageV } = own;
  return { thicknessMm, feedMmMin, kerfWidthMm, currentA, arcVoltageV };
}

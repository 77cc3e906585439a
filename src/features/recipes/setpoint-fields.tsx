import { useWatch } from "react-hook-form";
import type { Material } from "#shared/materials/materials.ts";
import { type Metric, metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useGroupFigures } from "../../lib/edition-queries.ts";
import { FormQuantity } from "../../lib/form-quantity.tsx";
import { liveSubject } from "./live-aside.tsx";
import { LiveStanding } from "./live-standing.tsx";
import { figureReading, figuresSoFar, type RecipeControl, type RecipeFormValues } from "./recipe-form-values.ts";

export interface SetpointFieldsProps {
  control: RecipeControl;
  units: UnitSystem;
  material: Material;
  /** Shows each standing below its field, where there is no room beside the form. */
  live: boolean;
}

const hints: Partial<Record<Metric, string>> = {
  currentA: "As set on the power source.",
  pressureBar: "At the torch, while the gas flows.",
  arcVoltageV: "What the height control holds, as it reads it.",
  kerfWidthMm: "Measured slot width, or left empty.",
};

/** The eight setpoints. Any may stay empty until it is found out. */
export function SetpointFields({ control, units, material, live }: SetpointFieldsProps) {
  return (
    <fieldset>
      <legend className="text-lg font-bold">Setpoints</legend>
      <p className="mb-4 text-sm text-muted">Leave empty what you do not know yet.</p>
      <div className="grid grid-cols-1 gap-5 md:grid-cols-2">
        {metrics.map((metric) => (
          <div key={metric}>
            <FormQuantity
              control={control}
              name={`setpoints.${metric}`}
              label={metricDefinitions[metric].label}
              hint={hints[metric]}
              unit={unitLabel(metricDefinitions[metric].quantity, units)}
              read={figureReading({ field: metric, units, material })}
            />
            {live ? <StandingBelow control={control} metric={metric} units={units} /> : null}
          </div>
        ))}
      </div>
    </fieldset>
  );
}

function StandingBelow({ control, metric, units }: { control: RecipeControl; metric: Metric; units: UnitSystem }) {
  const values = useWatch({ control }) as RecipeFormValues; // every field has a default
  const own = figuresSoFar(values, units);
  const { figures } = useGroupFigures(liveSubject(values, own));
  if (own[metric] === null || own.thicknessMm === null || own.nozzleMm === null) return null;
  return <LiveStanding metric={metric} figures={figures} own={own} units={units} />;
}

import type { Recipe } from "#shared/contracts/recipes.ts";
import { type Metric, metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatQuantity, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { RecipeStateWord } from "./recipe-state.tsx";
import { PeersBelow } from "./setpoint-cell.tsx";

/** What an operator dials in, standing at the machine. */
const dialled: [Metric, string][] = [
  ["currentA", "Current"],
  ["pressureBar", "Pressure"],
  ["feedMmMin", "Feed"],
  ["arcVoltageV", "Arc voltage"],
];

export function RecipeCard({ recipe, units }: { recipe: Recipe; units: UnitSystem }) {
  return (
    <>
      <TextLink to={`/recipes/${recipe.id}`} className="text-lg font-bold">
        {recipeName(recipe.version.content, units)}
      </TextLink>
      <p className="mt-1 flex flex-wrap gap-x-3 text-sm text-muted">
        <span>{recipe.machineName}</span>
        <RecipeStateWord state={recipe.state} />
      </p>
      <dl className="mt-3 grid grid-cols-2 gap-x-4 gap-y-3">
        {dialled.map(([metric, label]) => (
          <div key={metric}>
            <dt className="text-sm text-muted">{label}</dt>
            <dd>
              <Figure recipe={recipe} metric={metric} units={units} />
              <PeersBelow recipe={recipe} metric={metric} units={units} />
            </dd>
          </div>
        ))}
      </dl>
      {recipe.state === "retired" ? null : (
        <ButtonLink to={`/recipes/${recipe.id}/test-cuts/new`} className="mt-4 w-full">
          Log a test cut
        </ButtonLink>
      )}
    </>
  );
}

function Figure({ recipe, metric, units }: { recipe: Recipe; metric: Metric; units: UnitSystem }) {
  const value = recipe.version.content.setpoints[metric];
  const { quantity } = metricDefinitions[metric];
  if (value === null) return <span className="block text-muted">Not set</span>;
  return (
    <span className="figures block text-2xl font-black">
      {formatQuantity(value, quantity, units).text}{" "}
      <span className="text-sm font-normal text-muted">{unitLabel(quantity, units)}</span>
    </span>
  );
}

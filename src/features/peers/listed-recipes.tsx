import { drynessLabels, heightControlLabels, startMethodLabels } from "#shared/contracts/machines.ts";
import type { ListedRecipe } from "#shared/contracts/released-figures.ts";
import type { PeerGroupKey } from "#shared/peers/peer-group.ts";
import { type Metric, metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatQuantity, formatThickness, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { CautionsLine } from "../../lib/cautions.tsx";
import { useSession } from "../../shell/session.queries.ts";
import { type Column, Table } from "../../ui/table.tsx";

/** Nameless copies of recipes that shops chose to show, ordered by their figures. */
export function ListedRecipes({ recipes, groupKey }: { recipes: readonly ListedRecipe[]; groupKey: PeerGroupKey }) {
  const { units } = useSession();
  return (
    <section aria-labelledby="listed" className="mt-10">
      <h2 id="listed" className="text-xl font-black">
        Listed recipes
      </h2>
      {recipes.length === 0 ? (
        <p className="mt-1 max-w-text text-soft">
          None is shown here. Listed recipes appear once enough shops list one in the group, so that none stands alone.
        </p>
      ) : (
        <>
          <p className="mt-1 mb-3 max-w-text text-soft">
            Shown by their owners, without names, rounded and dated to the quarter. Ordered by their figures.
          </p>
          <CautionsLine material={groupKey.material} gas={groupKey.gas} currentA={highestCurrent(recipes)} />
          <div className="mt-3 print:[&_.min-w-40]:min-w-0 print:[&_table]:text-sm print:[&_td]:px-1 print:[&_th]:px-1">
            <Table
              caption="Listed recipes"
              columns={columnsFor(units)}
              rows={recipes}
              rowKey={({ id }) => id}
              renderCard={(recipe) => <Card recipe={recipe} units={units} />}
            />
          </div>
        </>
      )}
    </section>
  );
}

function highestCurrent(recipes: readonly ListedRecipe[]): number | null {
  const currents = recipes.flatMap(({ setpoints }) => setpoints.currentA ?? []);
  return currents.length === 0 ? null : Math.max(...currents);
}

const shortHeaders: Record<Metric, string> = {
  currentA: "Current",
  pressureBar: "Pressure",
  feedMmMin: "Feed",
  cutHeightMm: "Cut height",
  pierceHeightMm: "Pierce height",
  pierceDelayS: "Delay",
  arcVoltageV: "Voltage",
  kerfWidthMm: "Kerf",
};

function columnsFor(units: UnitSystem): Column<ListedRecipe>[] {
  return [
    {
      key: "thickness",
      header: "Sheet",
      rowHeader: true,
      cell: ({ thicknessMm, material }) => (
        <span className="whitespace-nowrap">{formatThickness(thicknessMm, material, units)}</span>
      ),
    },
    ...metrics.map((metric): Column<ListedRecipe> => {
      const { quantity } = metricDefinitions[metric];
      return {
        key: metric,
        header: shortHeaders[metric],
        unit: unitLabel(quantity, units),
        numeric: true,
        cell: ({ setpoints }) => shown(setpoints[metric], metric, units),
      };
    }),
    { key: "about", header: "About it", cell: (recipe) => <About recipe={recipe} /> },
  ];
}

function shown(value: number | null, metric: Metric, units: UnitSystem): string {
  return value === null ? "–" : formatQuantity(value, metricDefinitions[metric].quantity, units).text;
}

function About({ recipe }: { recipe: ListedRecipe }) {
  const traits = traitWords(recipe);
  return (
    <div className="min-w-40 text-sm">
      {recipe.text ? <p className="break-words">“{recipe.text}”</p> : null}
      <p className="text-muted">{[quarterWords(recipe.quarter), ...traits].join(" · ")}</p>
    </div>
  );
}

function traitWords({ traits }: ListedRecipe): string[] {
  const { startMethod, dryness, heightControl } = traits;
  return [
    ...(startMethod ? [`starts: ${startMethodLabels[startMethod].toLowerCase()}`] : []),
    ...(dryness ? [`air: ${drynessLabels[dryness].toLowerCase()}`] : []),
    ...(heightControl ? [`height: ${heightControlLabels[heightControl].toLowerCase()}`] : []),
  ];
}

const quarters = ["", "January to March", "April to June", "July to September", "October to December"];

/** "2026-Q2" as "April to June 2026". */
function quarterWords(quarter: string): string {
  return `${quarters[Number(quarter.slice(-1))]} ${quarter.slice(0, 4)}`;
}

function Card({ recipe, units }: { recipe: ListedRecipe; units: UnitSystem }) {
  return (
    <>
      <p className="font-bold">{formatThickness(recipe.thicknessMm, recipe.material, units)}</p>
      <dl className="mt-2 mb-2 grid grid-cols-2 gap-x-4 gap-y-1">
        {metrics.map((metric) => (
          <div key={metric} className="flex justify-between gap-2">
            <dt className="text-sm text-muted">{shortHeaders[metric]}</dt>
            <dd className="figures">
              {shown(recipe.setpoints[metric], metric, units)}
              {recipe.setpoints[metric] === null ? null : (
                <span className="text-sm text-muted"> {unitLabel(metricDefinitions[metric].quantity, units)}</span>
              )}
            </dd>
          </div>
        ))}
      </dl>
      <About recipe={recipe} />
    </>
  );
}

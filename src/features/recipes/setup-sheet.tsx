import type { Recipe } from "#shared/contracts/recipes.ts";
import { processGasLabels, surfaceLabels } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatDate } from "#shared/units/dates.ts";
import { formatQuantity } from "#shared/units/format.ts";
import { CautionsInFull } from "../../lib/cautions.tsx";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { RecipeQrCode } from "./recipe-qr-code.tsx";

/** The recipe as it hangs at the machine: only on paper, on one page. */
export function SetupSheet({ recipe }: { recipe: Recipe }) {
  const { units } = useSession();
  const { content, number, changedAt, changedBy } = recipe.version;
  const { grade, surface, processGas, note } = content;
  const url = `${window.location.origin}/recipes/${recipe.id}`;
  const facts = [recipe.machineName, processGasLabels[processGas], grade, surfaceLabels[surface]].filter(Boolean);
  const saved = `Version ${number}, saved ${formatDate(changedAt)}${changedBy ? ` by ${changedBy}` : ""}`;

  return (
    <article className="hidden print:block" data-setup-sheet="">
      <header className="flex items-start justify-between gap-6 border-b-2 border-ink pb-3">
        <div>
          <p className="text-sm">Setup sheet</p>
          <h1 className="text-2xl font-black">{recipeName(content, units)}</h1>
          <p>{facts.join(" · ")}</p>
          <p className="text-sm">
            {saved}. Printed {formatDate(new Date().toISOString())}.
          </p>
          <p className="font-bold">{stateWords[recipe.state]}</p>
        </div>
        <RecipeQrCode url={url} />
      </header>
      <dl className="my-4 grid grid-cols-2 gap-x-10">
        {metrics.map((metric) => (
          <SheetFigure key={metric} metric={metric} value={content.setpoints[metric]} />
        ))}
      </dl>
      {note ? (
        <section className="mb-3">
          <h2 className="font-bold">Note</h2>
          <p className="whitespace-pre-wrap">{note}</p>
        </section>
      ) : null}
      <section className="border-t border-ink pt-2">
        <h2 className="mb-1 font-bold">Cautions</h2>
        <CautionsInFull material={content.material} gas={processGas} currentA={content.setpoints.currentA} />
      </section>
      <p className="mt-3 text-sm break-all">{url}</p>
    </article>
  );
}

const stateWords: Record<Recipe["state"], string> = {
  draft: "Not proven: no acceptable test cut with this version yet.",
  proven: "Proven by an acceptable test cut.",
  retired: "Retired: do not cut by this sheet.",
};

function SheetFigure({ metric, value }: { metric: (typeof metrics)[number]; value: number | null }) {
  const { units } = useSession();
  const { label, quantity } = metricDefinitions[metric];
  const shown = value === null ? undefined : formatQuantity(value, quantity, units);
  return (
    <div className="flex items-baseline justify-between border-b border-line py-1.5">
      <dt>{label}</dt>
      <dd className="figures text-2xl font-black">
        {shown ? shown.text : "–"} <span className="text-sm font-normal">{shown?.unit}</span>
      </dd>
    </div>
  );
}

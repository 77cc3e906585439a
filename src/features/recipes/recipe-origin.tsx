import type { RecipeOrigin } from "#shared/contracts/recipes.ts";
import { basisLabels } from "#shared/contracts/starting-recipe-figures.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";

const from = (editionNumber: number | null) => (editionNumber === null ? "" : ` of edition ${editionNumber}`);

/** Where the first version came from, in words; null where it was typed in. */
export function originWords({ kind, editionNumber }: RecipeOrigin): string | null {
  if (kind === "typed") return null;
  const what = kind === "starting-recipe" ? "a starting recipe" : "a listed recipe";
  return `Began as ${what}${from(editionNumber)}.`;
}

/** Where a recipe came from, and what each first value stood on. */
export function RecipeOriginLine({ origin }: { origin: RecipeOrigin }) {
  const words = originWords(origin);
  if (words === null) return null;
  const bases = metrics.flatMap((metric) => {
    const basis = origin.basis[metric];
    return basis
      ? [{ metric, basis: basis in basisLabels ? basisLabels[basis as keyof typeof basisLabels] : basis }]
      : [];
  });
  if (bases.length === 0) return <p className="text-sm text-muted">{words}</p>;
  return (
    <details className="text-sm text-muted">
      <summary className="min-h-6">{words}</summary>
      <dl className="mt-1">
        {bases.map(({ metric, basis }) => (
          <div key={metric} className="flex justify-between gap-4">
            <dt>{metricDefinitions[metric].label}</dt>
            <dd>{basis}</dd>
          </div>
        ))}
      </dl>
    </details>
  );
}

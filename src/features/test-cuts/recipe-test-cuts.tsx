import { useSuspenseQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { Recipe } from "#shared/contracts/recipes.ts";
import type { TestCut } from "#shared/contracts/test-cuts.ts";
import { formatInstant } from "#shared/units/dates.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button, ButtonLink } from "../../ui/button.tsx";
import { TestCutVerdict } from "./test-cut-verdict.tsx";
import { measuredWords, seenWords } from "./test-cut-words.ts";
import { recipeTestCutsQuery } from "./test-cuts.queries.ts";

const shownAtFirst = 5;

/** A recipe's test cuts, newest first, as a part of its page. */
export function RecipeTestCuts({ recipe }: { recipe: Recipe }) {
  const cuts = useSuspenseQuery(recipeTestCutsQuery(recipe.id)).data.items;
  const [all, setAll] = useState(false);
  const shown = all ? cuts : cuts.slice(0, shownAtFirst);
  return (
    <section aria-labelledby="test-cuts">
      <div className="mb-2 flex flex-wrap items-end justify-between gap-3">
        <h2 id="test-cuts" className="text-lg font-bold">
          Test cuts
        </h2>
        {recipe.state === "retired" ? null : (
          <ButtonLink to={`/recipes/${recipe.id}/test-cuts/new`} small>
            Log a test cut
          </ButtonLink>
        )}
      </div>
      {cuts.length === 0 ? (
        <p className="border-y border-line py-4 text-soft">
          None yet. Cut a coupon, look at it, and log what you see: an acceptable cut proves the recipe.
        </p>
      ) : (
        <ol className="border-t border-line">
          {shown.map((cut) => (
            <Entry key={cut.id} cut={cut} />
          ))}
        </ol>
      )}
      {shown.length < cuts.length ? (
        <Button kind="quiet" small className="mt-2 -ml-3" onClick={() => setAll(true)}>
          Show all {cuts.length} test cuts
        </Button>
      ) : null}
    </section>
  );
}

function Entry({ cut }: { cut: TestCut }) {
  const { units } = useSession();
  const measured = measuredWords(cut, units);
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-line py-3 md:grid-cols-[14rem_1fr]">
      <div className="text-sm text-muted">
        <TestCutVerdict acceptable={cut.acceptable} />
        <p>{formatInstant(cut.cutAt)}</p>
        <p>
          {cut.recordedBy || "Somebody who has left"} · version {cut.versionNumber}
        </p>
      </div>
      <div>
        <p>{seenWords(cut)}.</p>
        {measured.length > 0 ? <p className="text-sm text-soft">Measured: {measured.join(", ")}.</p> : null}
        {cut.note ? <p className="mt-1 text-sm break-words whitespace-pre-wrap text-soft">{cut.note}</p> : null}
      </div>
    </li>
  );
}

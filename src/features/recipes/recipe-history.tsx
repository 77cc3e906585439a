import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { type FormEvent, useState } from "react";
import { useNavigate } from "react-router-dom";
import type { Recipe, RecipeVersion } from "#shared/contracts/recipes.ts";
import { formatInstant } from "#shared/units/dates.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button } from "../../ui/button.tsx";
import { StateWord } from "../../ui/notice.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { changeLine, contentChanges } from "./content-facts.ts";
import { originWords } from "./recipe-origin.tsx";
import { recipeVersionsQuery } from "./recipes.queries.ts";

const shownAtFirst = 5;

/** Who changed what, when and why, newest first. */
export function RecipeHistory({ recipe }: { recipe: Recipe }) {
  const versions = useSuspenseQuery(recipeVersionsQuery(recipe.id)).data.items;
  const [all, setAll] = useState(false);
  const shown = all ? versions : versions.slice(0, shownAtFirst);
  return (
    <section aria-labelledby="history">
      <div className="mb-2 flex flex-wrap items-end justify-between gap-3">
        <h2 id="history" className="text-lg font-bold">
          History
        </h2>
        {versions.length > 1 ? <CompareForm id={recipe.id} versions={versions} /> : null}
      </div>
      <ol className="border-t border-line">
        {shown.map((version) => (
          <Entry
            key={version.number}
            version={version}
            before={versions.find(({ number }) => number === version.number - 1)}
          />
        ))}
      </ol>
      {shown.length < versions.length ? (
        <Button kind="quiet" small className="mt-2 -ml-3" onClick={() => setAll(true)}>
          Show all {versions.length} versions
        </Button>
      ) : null}
    </section>
  );
}

function Entry({ version, before }: { version: RecipeVersion; before: RecipeVersion | undefined }) {
  const { number, reason, changedBy, changedAt, proven, origin } = version;
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-line py-3 md:grid-cols-[14rem_1fr]">
      <div className="text-sm text-muted">
        <p className="text-base text-ink">
          <b>Version {number}</b> {proven ? <StateWord kind="sound">Proven</StateWord> : null}
        </p>
        <p>{formatInstant(changedAt)}</p>
        <p>{changedBy || "Somebody who has left"}</p>
      </div>
      <div>
        {reason ? <p className="mb-1">“{reason}”</p> : null}
        {before ? (
          <Changes before={before} after={version} />
        ) : (
          <p>{originWords(origin) ?? "Written into the book."}</p>
        )}
      </div>
    </li>
  );
}

function Changes({ before, after }: { before: RecipeVersion; after: RecipeVersion }) {
  const { units } = useSession();
  const machines = useQuery(machinesQuery).data?.items ?? [];
  const machineName = (id: string) => machines.find((machine) => machine.id === id)?.name ?? "another machine";
  const changes = contentChanges(before.content, after.content, units, machineName);
  if (changes.length === 0) return <p className="text-soft">Changed by less than is shown.</p>;
  return (
    <ul>
      {changes.map((change) => (
        <li key={change.name} className="font-bold">
          {changeLine(change)}
        </li>
      ))}
    </ul>
  );
}

/** Picks two versions to see side by side. */
function CompareForm({ id, versions }: { id: string; versions: readonly RecipeVersion[] }) {
  const navigate = useNavigate();
  const newest = versions[0]!.number; // shown only where there are two
  const [from, setFrom] = useState(String(newest - 1));
  const [to, setTo] = useState(String(newest));
  const choices = versions.map(({ number }) => ({ value: String(number), label: `Version ${number}` }));

  function compare(event: FormEvent) {
    event.preventDefault();
    void navigate(`/recipes/${id}/compare?${new URLSearchParams({ from, to })}`);
  }

  return (
    <form onSubmit={compare} className="flex items-end gap-2">
      <SelectField label="Compare" choices={choices} value={from} onChange={(event) => setFrom(event.target.value)} />
      <SelectField label="with" choices={choices} value={to} onChange={(event) => setTo(event.target.value)} />
      <Button type="submit">Compare</Button>
    </form>
  );
}

import { useSuspenseQuery } from "@tanstack/react-query";
import { useParams } from "react-router-dom";
import type { RecipeVersion } from "#shared/contracts/recipes.ts";
import { formatShortDate } from "#shared/units/dates.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { contentChanges } from "./content-facts.ts";
import { FactsBeside } from "./facts-beside.tsx";
import { recipeVersionsQuery } from "./recipes.queries.ts";

const defaults = { from: "", to: "" };

/** Two versions of one recipe side by side: /recipes/:id/compare?from=1&to=3. */
export function ComparePage() {
  const { id = "" } = useParams();
  const { units } = useSession();
  const [state, change] = useUrlState(defaults);
  const versions = useSuspenseQuery(recipeVersionsQuery(id)).data.items;
  const machines = useSuspenseQuery(machinesQuery).data.items;
  const machineName = (machineId: string) => machines.find((m) => m.id === machineId)?.name ?? "Not known";
  const byNumber = (text: string) => versions.find(({ number }) => String(number) === text);
  const newest = versions[0]!; // a recipe always has a version
  const to = byNumber(state.to) ?? newest;
  const from = byNumber(state.from) ?? byNumber(String(to.number - 1)) ?? to;
  const differing = contentChanges(from.content, to.content, units, machineName).length;

  return (
    <>
      <PageHeader
        title="Two versions side by side"
        facts={recipeName(newest.content, units)}
        back={{ to: `/recipes/${id}`, label: recipeName(newest.content, units) }}
      />
      <div className="mb-4 grid max-w-3xl grid-cols-2 gap-4">
        <VersionChoice label="From" versions={versions} chosen={from} onChoose={(number) => change({ from: number })} />
        <VersionChoice label="To" versions={versions} chosen={to} onChoose={(number) => change({ to: number })} />
      </div>
      <div className="max-w-3xl">
        {differing === 0 ? <Notice title="Nothing that is shown differs" className="mb-3" /> : null}
        <FactsBeside
          left={{ heading: `Version ${from.number}`, content: from.content }}
          // A version beside itself still needs a heading of its own.
          right={{ heading: from === to ? `Version ${to.number} again` : `Version ${to.number}`, content: to.content }}
          units={units}
          machineName={machineName}
        />
      </div>
    </>
  );
}

interface VersionChoiceProps {
  label: string;
  versions: readonly RecipeVersion[];
  chosen: RecipeVersion;
  onChoose: (number: string) => void;
}

function VersionChoice({ label, versions, chosen, onChoose }: VersionChoiceProps) {
  const choices = versions.map(({ number }) => ({ value: String(number), label: `Version ${number}` }));
  return (
    <div>
      <SelectField
        label={label}
        choices={choices}
        value={String(chosen.number)}
        onChange={(event) => onChoose(event.target.value)}
      />
      <p className="mt-1 text-sm text-muted">
        {formatShortDate(chosen.changedAt)}, {chosen.changedBy || "somebody who has left"}
        {chosen.reason ? `: “${chosen.reason}”` : null}
      </p>
    </div>
  );
}

import type { ReactNode } from "react";
import type { Machine } from "#shared/contracts/machines.ts";
import type { StartingRecipe } from "#shared/contracts/starting-recipe-figures.ts";
import { materialLabels, processGasLabels } from "#shared/materials/materials.ts";
import { formatDate } from "#shared/units/dates.ts";
import { formatThickness, formatWithUnit } from "#shared/units/format.ts";
import { CautionsLine } from "../../lib/cautions.tsx";
import { useSession } from "../../shell/session.queries.ts";
import { classNames } from "../../ui/class-names.ts";
import { Notice } from "../../ui/notice.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { CautionsBlock } from "./cautions-block.tsx";
import { SetpointList } from "./setpoint-list.tsx";
import { TestPlan } from "./test-plan.tsx";

export interface StartingRecipeViewProps {
  recipe: StartingRecipe;
  machine: Machine;
  /** Another one is on its way; this one is dimmed meanwhile. */
  behind: boolean;
  actions: ReactNode;
}

/** A starting recipe to read, to print and to cut by. */
export function StartingRecipeView({ recipe, machine, behind, actions }: StartingRecipeViewProps) {
  const { units } = useSession();
  return (
    <article
      aria-label="Starting recipe"
      className={classNames("space-y-6 transition-opacity print:space-y-2", behind && "opacity-55")}
    >
      <Heading recipe={recipe} machine={machine} />
      <div className="print:hidden">
        <CautionsLine material={recipe.material} gas={recipe.gas} currentA={recipe.setpoints.currentA.high} />
      </div>
      {actions}
      <LimitsAndHeat recipe={recipe} />
      <SetpointList setpoints={recipe.setpoints} units={units} />
      <CautionsBlock cautions={recipe.cautions} />
      <TestPlan steps={recipe.testPlan} units={units} />
    </article>
  );
}

function Heading({ recipe, machine }: Pick<StartingRecipeViewProps, "recipe" | "machine">) {
  const { units } = useSession();
  const { material, thicknessMm, gas, nozzle, edition, groupId } = recipe;
  const fitted = nozzle.nozzleMm === null ? [] : [`${formatWithUnit(nozzle.nozzleMm, "nozzle", units)} nozzle`];
  const title = [materialLabels[material], formatThickness(thicknessMm, material, units), ...fitted].join(", ");
  const source = edition ? `edition of ${formatDate(edition.date)}` : "no edition yet";
  return (
    <header>
      <h2 className="text-xl font-black">{title}</h2>
      <p className="text-muted">{[processGasLabels[gas].toLowerCase(), machine.name, source].join(" · ")}</p>
      <p className="mt-2 max-w-text print:mt-1 print:max-w-none print:text-sm">
        <b>Nozzle:</b> {nozzle.reason}{" "}
        {groupId ? (
          <TextLink to={`/peers/${groupId}`} className="print:hidden">
            See these peers
          </TextLink>
        ) : null}
      </p>
    </header>
  );
}

function LimitsAndHeat({ recipe: { limits, heatCheck } }: { recipe: StartingRecipe }) {
  return (
    <>
      {limits.length > 0 ? (
        <Notice kind="watch" title="Your machine sets a limit here">
          <ul>
            {limits.map(({ metric, limit, text }) => (
              <li key={`${limit} ${metric}`}>{text}</li>
            ))}
          </ul>
        </Notice>
      ) : null}
      {heatCheck === null ? null : heatCheck.verdict === "plausible" ? (
        <p className="max-w-text text-soft print:max-w-none print:text-sm">
          <b>Heat check:</b> {heatCheck.words}
        </p>
      ) : (
        <Notice kind="watch" title="The heat does not add up">
          <p>{heatCheck.words}</p>
        </Notice>
      )}
    </>
  );
}

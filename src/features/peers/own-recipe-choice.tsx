import type { Recipe } from "#shared/contracts/recipes.ts";
import { formatShortDate } from "#shared/units/dates.ts";
import { formatThickness } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { recipeStateLabels } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { classNames } from "../../ui/class-names.ts";
import { PunchMark } from "../../ui/punch-mark.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextLink } from "../../ui/text-link.tsx";

export interface OwnRecipeChoiceProps {
  recipes: readonly Recipe[];
  chosen: Recipe | undefined;
  onChoose: (id: string) => void;
}

/** Which own recipe the marks stand for. */
export function OwnRecipeChoice({ recipes, chosen, onChoose }: OwnRecipeChoiceProps) {
  const { units } = useSession();
  if (!chosen) return null;
  const isOneOfMany = recipes.length > 1;
  return (
    <>
      {isOneOfMany ? (
        <SelectField
          label="Your recipe on the strips"
          className="max-w-lg print:hidden"
          value={chosen.id}
          onChange={(event) => onChoose(event.target.value)}
          choices={recipes.map((recipe) => ({ value: recipe.id, label: nameOf(recipe, units) }))}
        />
      ) : null}
      <p className={classNames("text-soft", isOneOfMany && "hidden print:block")}>
        <PunchMark size={18} /> is your recipe:{" "}
        <TextLink to={`/recipes/${chosen.id}`}>{nameOf(chosen, units)}</TextLink>
      </p>
    </>
  );
}

/** Told apart by what differs within a group: machine, sheet, state, age. */
function nameOf({ machineName, state, version }: Recipe, units: UnitSystem): string {
  const { thicknessMm, material } = version.content;
  const thickness = formatThickness(thicknessMm, material, units);
  const stateWord = recipeStateLabels[state].toLowerCase();
  return `${machineName}, ${thickness}, ${stateWord}, changed ${formatShortDate(version.changedAt)}`;
}

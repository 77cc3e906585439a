import type { RecipeState } from "#shared/contracts/recipes.ts";
import { recipeStateLabels } from "../../lib/recipe-words.ts";
import { type NoticeKind, StateWord } from "../../ui/notice.tsx";

const kinds: Record<RecipeState, NoticeKind> = { draft: "watch", proven: "sound", retired: "info" };

export function RecipeStateWord({ state }: { state: RecipeState }) {
  return <StateWord kind={kinds[state]}>{recipeStateLabels[state]}</StateWord>;
}

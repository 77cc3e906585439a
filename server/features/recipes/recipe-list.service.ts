import type { Db } from "#server/db/client.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { readCursor, takePage } from "#server/http/cursor.ts";
import type { Recipe, RecipeQuery } from "#shared/contracts/recipes.ts";
import { type Material, materialLabels, materials } from "#shared/materials/materials.ts";
import { bandIndexOf, bandLimitsMm, nozzleStep } from "#shared/peers/peer-group.ts";
import { presentRecipe } from "./recipe-content.ts";
import * as queries from "./recipe-list.queries.ts";

interface RecipePage {
  items: Recipe[];
  next: string | null;
  total: number;
}

export async function listRecipes(tx: Db, actor: ShopActor, query: RecipeQuery): Promise<RecipePage> {
  const { sort, order, limit } = query;
  const name = `recipes ${sort} ${order}`;
  const types = queries.sortKeysOf(query).map(({ type }) => type);
  const after = readCursor(query.cursor, name, types);
  const filter = filterOf(query);
  const rows = await queries.listRecipes(tx, actor.shopId, filter, { sort, order, after, limit: limit + 1 });
  const { shown, next } = takePage(rows, limit, name);
  return {
    items: shown.map(presentRecipe),
    next,
    total: await queries.countRecipes(tx, actor.shopId, filter),
  };
}

function filterOf(query: RecipeQuery): queries.RecipeFilter {
  const words = query.search?.split(/\s+/).filter((word) => word !== "") ?? [];
  return {
    words: words.map((word) => ({ word, materials: materialsNamed(word) })),
    material: query.material,
    machineId: query.machineId,
    state: query.state,
    sharing: query.sharing,
    thicknessMm: query.thicknessMm === undefined ? undefined : bandLimitsMm(bandIndexOf(query.thicknessMm)),
    nozzleMm: query.nozzleMm === undefined ? undefined : nozzleStep(query.nozzleMm),
  };
}

/** Materials whose name, as shown or as stored, holds the word. */
function materialsNamed(word: string): Material[] {
  const sought = word.toLowerCase();
  return materials.filter((key) => key.includes(sought) || materialLabels[key].toLowerCase().includes(sought));
}

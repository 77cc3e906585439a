import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/starting-recipes.ts";
import { startingRecipeCsv } from "./starting-recipe-csv.ts";
import * as service from "./starting-recipes.service.ts";

export function startingRecipesRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.getStartingRecipe, ({ tx, actor, query }) => service.getStartingRecipe(tx, actor, query));
  route(router, db, contracts.getStartingRecipeCsv, async ({ tx, actor, query, saveAs }) => {
    const csv = startingRecipeCsv(await service.getStartingRecipe(tx, actor, query));
    saveAs(`starting-recipe-${query.material}-${query.thicknessMm}mm.csv`);
    return csv;
  });
  route(router, db, contracts.saveStartingRecipe, ({ tx, actor, body }) => service.saveStartingRecipe(tx, actor, body));

  return router;
}

import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/recipes.ts";
import { bookFilename, exportBook, exportBookAsCsv } from "./book-export.service.ts";
import { listRecipes } from "./recipe-list.service.ts";
import * as service from "./recipes.service.ts";

export function recipesRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.listRecipes, ({ tx, actor, query }) => listRecipes(tx, actor, query));
  route(router, db, contracts.getRecipe, ({ tx, actor, params }) => service.getRecipe(tx, actor, params.id));
  route(router, db, contracts.createRecipe, ({ tx, actor, body }) => service.createRecipe(tx, actor, body));
  route(router, db, contracts.changeRecipe, ({ tx, actor, params, body }) =>
    service.changeRecipe(tx, actor, params.id, body),
  );
  route(router, db, contracts.retireRecipe, ({ tx, actor, params }) => service.retireRecipe(tx, actor, params.id));
  route(router, db, contracts.restoreRecipe, ({ tx, actor, params }) => service.restoreRecipe(tx, actor, params.id));
  route(router, db, contracts.listRecipeVersions, async ({ tx, actor, params }) => ({
    items: await service.listRecipeVersions(tx, actor, params.id),
  }));

  route(router, db, contracts.exportBookJson, ({ tx, actor, saveAs }) => {
    const now = new Date();
    saveAs(bookFilename(now, "json"));
    return exportBook(tx, actor, now);
  });
  route(router, db, contracts.exportBookCsv, ({ tx, actor, saveAs }) => {
    saveAs(bookFilename(new Date(), "csv"));
    return exportBookAsCsv(tx, actor);
  });

  return router;
}

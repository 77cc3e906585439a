import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/test-cuts.ts";
import * as service from "./test-cuts.service.ts";

export function testCutsRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.recordTestCut, ({ tx, actor, params, body }) =>
    service.recordTestCut(tx, actor, params.id, body, new Date()),
  );
  route(router, db, contracts.listRecipeTestCuts, async ({ tx, actor, params }) => ({
    items: await service.listRecipeTestCuts(tx, actor, params.id),
  }));
  route(router, db, contracts.listTestCuts, ({ tx, actor, query }) => service.listTestCuts(tx, actor, query));

  return router;
}

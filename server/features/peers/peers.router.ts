import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/peers.ts";
import * as service from "./peers.service.ts";

export function peersRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.rankBook, ({ tx, actor }) => service.rankBook(tx, actor));

  return router;
}

import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/sharing.ts";
import * as service from "./sharing.service.ts";

export function sharingRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.getSharing, ({ tx, actor, params }) => service.getSharing(tx, actor, params.id));
  route(router, db, contracts.changeSharing, ({ tx, actor, params, body }) =>
    service.changeSharing(tx, actor, params.id, body),
  );
  route(router, db, contracts.previewSharing, ({ tx, actor, params, body }) =>
    service.tryOut(tx, actor, params.id, body),
  );

  return router;
}

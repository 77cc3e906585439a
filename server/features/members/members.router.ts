import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/members.ts";
import * as service from "./members.service.ts";

export function membersRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.listMembers, async ({ tx, query }) => ({ items: await service.listMembers(tx, query) }));
  route(router, db, contracts.suspendMember, ({ tx, actor, params, body }) =>
    service.suspend(tx, actor, params.id, body.reason),
  );
  route(router, db, contracts.reinstateMember, ({ tx, actor, params }) => service.reinstate(tx, actor, params.id));

  return router;
}

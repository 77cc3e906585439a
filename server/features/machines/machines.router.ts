import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/machines.ts";
import * as service from "./machines.service.ts";

export function machinesRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.listMachines, async ({ tx, actor }) => ({
    items: await service.listMachines(tx, actor),
  }));
  route(router, db, contracts.getMachine, ({ tx, actor, params }) => service.getMachine(tx, actor, params.id));
  route(router, db, contracts.createMachine, ({ tx, actor, body }) => service.createMachine(tx, actor, body));
  route(router, db, contracts.updateMachine, ({ tx, actor, params, body }) =>
    service.updateMachine(tx, actor, params.id, body),
  );
  route(router, db, contracts.deleteMachine, ({ tx, actor, params }) => service.deleteMachine(tx, actor, params.id));

  return router;
}

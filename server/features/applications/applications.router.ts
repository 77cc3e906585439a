import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/applications.ts";
import * as service from "./applications.service.ts";

export function applicationsRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.applyForMembership, async ({ tx, body }) => {
    await service.apply(tx, body);
    return { received: true as const };
  });
  route(router, db, contracts.getOwnApplication, ({ tx, actor }) => service.ownApplication(tx, actor));
  route(router, db, contracts.listApplications, async ({ tx }) => ({ items: await service.listApplications(tx) }));
  route(router, db, contracts.admitApplication, ({ tx, actor, params }) => service.admit(tx, actor, params.id));
  route(router, db, contracts.declineApplication, ({ tx, actor, params, body }) =>
    service.decline(tx, actor, params.id, body.reason),
  );

  return router;
}

import { Router } from "express";
import type { Db } from "#server/db/client.ts";
import { notModified, route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/editions.ts";
import * as builds from "./edition-builds.service.ts";
import * as service from "./editions.service.ts";
import * as publication from "./publication.service.ts";

export function editionsRouter(db: Db): Router {
  const router = Router();

  route(router, db, contracts.getCurrentEdition, async ({ tx }) => ({
    edition: await service.findCurrentEdition(tx),
  }));
  route(router, db, contracts.getEditionMaterial, async ({ tx, params, req, hasCurrent }) => {
    if (hasCurrent(await service.etagOf(tx, params.id, req.path))) return notModified;
    return service.readMaterial(tx, params.id, params.material, params.gas);
  });
  route(router, db, contracts.getEditionGroup, async ({ tx, params, req, hasCurrent }) => {
    if (hasCurrent(await service.etagOf(tx, params.id, req.path))) return notModified;
    return service.readGroup(tx, params.id, params.groupId);
  });

  route(router, db, contracts.listEditions, async ({ tx }) => ({ items: await publication.listEditions(tx) }));
  route(router, db, contracts.publishEdition, ({ tx, actor, params }) =>
    publication.publishEdition(tx, actor, params.id),
  );
  route(router, db, contracts.discardEdition, ({ tx, actor, params }) =>
    publication.discardEdition(tx, actor, params.id),
  );
  route(router, db, contracts.startEditionBuild, ({ tx, actor }) => builds.startBuild(tx, actor));
  route(router, db, contracts.listEditionBuilds, async ({ tx }) => ({ items: await builds.listBuilds(tx) }));

  return router;
}

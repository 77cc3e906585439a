import { type Request, Router } from "express";
import type { Db } from "#server/db/client.ts";
import { route } from "#server/http/route.ts";
import * as contracts from "#shared/contracts/accounts.ts";
import { changePreferences, joinWhereInvited, sessionOf } from "./accounts.service.ts";

export interface AccountsOptions {
  demo: boolean;
  /** Where to go so that the provider's own session ends too. */
  endSessionUrl: (idToken: string | undefined) => Promise<string>;
}

export function accountsRouter(db: Db, options: AccountsOptions): Router {
  const router = Router();

  route(router, db, contracts.getSession, async ({ tx, actor }) =>
    sessionOf(await joinWhereInvited(tx, actor), options.demo),
  );

  route(router, db, contracts.changePreferences, async ({ tx, actor, body }) =>
    sessionOf(await changePreferences(tx, actor, body), options.demo),
  );

  route(router, db, contracts.signOut, async ({ req }) => {
    const continueAt = await options.endSessionUrl(req.session.idToken);
    await endSession(req);
    return { continueAt };
  });

  return router;
}

function endSession(req: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => (error ? reject(error) : resolve()));
  });
}

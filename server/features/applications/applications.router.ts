import { Router } from "express";
import type { Db } from "#server/db/client.ts";

export function applicationsRouter(_db: Db): Router {
  return Router();
}

import { Router } from "express";
import type { Db } from "#server/db/client.ts";

export function sharingRouter(_db: Db): Router {
  return Router();
}

import { existsSync } from "node:fs";
import path from "node:path";
import express, { Router } from "express";
import { ProblemError } from "./problem.ts";

/** The built application: hashed files cached for good, the page itself asked for each time. */
export function webFiles(directory: string): Router {
  const root = path.resolve(directory);
  const page = path.join(root, "index.html");
  const router = Router();
  router.use(
    "/assets",
    express.static(path.join(root, "assets"), { immutable: true, maxAge: "1y", fallthrough: false, index: false }),
  );
  router.use(express.static(root, { index: false, maxAge: "1h" }));
  router.get("/{*path}", (_req, res, next) => {
    if (!existsSync(page)) return next(new ProblemError("not-found", { detail: "The application has not been built" }));
    res.set("Cache-Control", "no-cache").sendFile(page);
  });
  return router;
}

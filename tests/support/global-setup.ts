import type { TestProject } from "vitest/node";
import type { TestPostgres } from "./test-postgres.ts";

declare module "vitest" {
  interface ProvidedContext {
    postgres: TestPostgres | null;
  }
}

const projectsWithDatabase = new Set(["api", "e2e"]);

/** Starts PostgreSQL once for the whole run; runs of pure code and pages alone go without and stay quick. */
export async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  if (!project.vitest.projects.some(({ name }) => projectsWithDatabase.has(name))) {
    project.provide("postgres", null);
    return undefined;
  }
  const { startTestPostgres } = await import("./test-postgres.ts");
  const postgres = await startTestPostgres();
  project.provide("postgres", postgres.urls);
  return postgres.stop;
}

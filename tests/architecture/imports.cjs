/* Who may import whom, one rule per sentence of DEVELOPERS.md. Run by `npm run check:imports`. */
const rule = (name, from, to) => ({ name, severity: "error", from, to });
const inPackage = "node_modules/";
/** Numbers and schemas: what pure code may use. */
const pure = "node_modules/(zod|simple-statistics|@stdlib/[^/]+|@asteasolutions/zod-to-openapi)/";
const sql = "node_modules/(drizzle-orm|pg)/";
/** Outside the queries: opening connections, starting PostgreSQL, filling the demo network. */
const mayTouchSql = "\\.queries\\.ts$|^server/(db|launch|seed)/";

module.exports = {
  forbidden: [
    rule("no-cycles", {}, { circular: true }),
    rule("everything-imported-exists", {}, { couldNotResolve: true }),
    rule("shared-imports-shared", { path: "^shared/" }, { path: "^(src|server|oidc-fake|tests)/" }),
    rule("shared-uses-pure-packages", { path: "^shared/" }, { path: inPackage, pathNot: pure }),
    rule("shared-is-not-node", { path: "^shared/" }, { dependencyTypes: ["core"] }),
    rule("stats-import-stats", { path: "^shared/stats/" }, { path: "^shared/", pathNot: "^shared/stats/" }),
    rule("client-not-server", { path: "^src/" }, { path: "^server/" }),
    rule("client-is-not-node", { path: "^src/" }, { dependencyTypes: ["core"] }),
    rule("server-not-client", { path: "^server/" }, { path: "^src/" }),
    rule(
      "stand-in-for-start-and-seed-only",
      { path: "^(src|server|shared)/", pathNot: "^server/(launch|seed)/" },
      { path: "^oidc-fake/" },
    ),
    rule(
      "start-and-seed-know-accounts-only",
      { path: "^server/" },
      { path: "^oidc-fake/", pathNot: "/accounts\\.ts$" },
    ),
    rule("stand-in-stands-alone", { path: "^oidc-fake/" }, { path: "^(src|server|shared)/" }),
    rule("product-not-tests", { path: "^(src|server|shared|oidc-fake)/" }, { path: "^tests/" }),
    rule(
      "product-not-launch",
      { path: "^(src|server|shared|oidc-fake)/", pathNot: "^server/launch/" },
      { path: "^server/launch/" },
    ),
    rule("client-features-apart", { path: "^src/features/([^/]+)/" }, { path: "^src/features/(?!$1/)" }),
    rule("client-parts-know-no-feature", { path: "^src/(ui|lib)/" }, { path: "^src/features/" }),
    rule(
      "server-features-meet-in-services",
      { path: "^server/features/([^/]+)/" },
      { path: "^server/features/(?!$1/)", pathNot: "\\.service\\.ts$" },
    ),
    rule(
      "only-services-call-other-features",
      { path: "^server/features/([^/]+)/", pathNot: "\\.service\\.ts$" },
      { path: "^server/features/(?!$1/)" },
    ),
    rule("sql-in-queries-only", { path: "^server/", pathNot: mayTouchSql }, { path: `${sql}|^server/db/schema/` }),
    rule("routers-call-services", { path: "\\.router\\.ts$" }, { path: "\\.queries\\.ts$" }),
  ],
  options: {
    tsPreCompilationDeps: true,
    doNotFollow: { path: "node_modules" },
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "node", "default", "types"] },
  },
};

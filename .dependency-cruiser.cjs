const OURS = "^(app|components|lib|db|storage|tests)/";

/** A room may import itself and what is listed; everything else of ours is closed to it. */
const may = (room, ...allowed) => ({
  name: `${room.replace("/", "-")}-imports`,
  severity: "error",
  from: { path: `^${room}/` },
  to: { path: OURS, pathNot: [room, ...allowed].map((path) => `^${path}`) },
});

/** @type {import("dependency-cruiser").IConfiguration} */
module.exports = {
  forbidden: [
    may("app", "components/", "lib/(core|schemas|services|auth|http)/"),
    may("components", "lib/(core|schemas)/"),
    may("lib/services", "lib/(core|policies|schemas|jobs)/", "lib/auth/passwords", "lib/env", "db/", "storage/"),
    may("lib/policies", "lib/core/"),
    may("lib/schemas", "lib/core/"),
    may("lib/http", "lib/(core|auth|schemas)/", "lib/env"),
    may("lib/auth", "lib/core/", "lib/env", "db/(client|queries/(people|sessions|rate-limits))"),
    may("lib/jobs", "lib/(core|policies|schemas|services)/", "lib/env", "db/", "storage/"),
    may("lib/cli", "lib/", "db/", "storage/"),
    may("db", "lib/core/", "lib/env"),
    may("storage", "lib/core/", "lib/env"),
    {
      name: "core-is-pure",
      comment: "lib/core gives the same answer on server, browser, worker and test: no I/O, no Node, no clock.",
      severity: "error",
      from: { path: "^lib/core/" },
      to: { pathNot: "^lib/core/|node_modules/(webvtt-parser|canonicalize|@noble/hashes)/" },
    },
    { name: "no-cycles", severity: "error", from: {}, to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } } },
    {
      name: "browser-never-reaches-server",
      severity: "error",
      from: { path: "^components/" },
      to: { path: "^(db|storage|lib/(services|auth|http|jobs|env))", reachable: true },
    },
    { name: "sql-stays-in-db", severity: "error", from: { path: "^(app|components|storage)/" }, to: { path: "node_modules/(knex|pg)/" } },
    { name: "nothing-imports-tests", severity: "error", from: { pathNot: "^tests/" }, to: { path: "^tests/" } },
  ],
  options: {
    tsConfig: { fileName: "tsconfig.json" },
    tsPreCompilationDeps: true,
    doNotFollow: { path: "node_modules" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "require", "node", "default"] },
  },
};

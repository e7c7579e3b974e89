// Which room may import which. The arrows run one way; DEVELOPERS.md draws them.
const PROJECT = "^(app|components|db|lib|tests)/";
/** Small things without rules of their own that any room but the engine may use. */
const LEAVES = "^lib/(errors|ids|clock|env|logger)\\.ts$";

const inRooms = (...rooms) => rooms.map((room) => `^${room}(/|\\.ts$)`).join("|");

/** A room and all it may import from this project. */
const room = (name, comment, from, ...to) => ({
  name,
  comment,
  severity: "error",
  from: { path: `^${from}(/|\\.ts$)` },
  to: { path: PROJECT, pathNot: [inRooms(from, ...to), LEAVES].join("|") },
});

module.exports = {
  forbidden: [
    {
      name: "engine-stands-alone",
      comment: "The engine imports nothing: no room, no package, no part of Node.",
      severity: "error",
      from: { path: "^lib/engine/" },
      to: { pathNot: "^lib/engine/" },
    },
    room(
      "calendar",
      "Civil time and recurrence know the engine's values only.",
      "lib/calendar",
      "lib/engine",
      "lib/schemas",
    ),
    room(
      "schemas",
      "Shapes know the engine's values and the roles.",
      "lib/schemas",
      "lib/engine",
      "lib/policy",
      "lib/calendar",
    ),
    room(
      "policy",
      "Who may do what is decided from roles and the change itself.",
      "lib/policy",
      "lib/engine",
      "lib/schemas",
    ),
    room(
      "format",
      "Words for values.",
      "lib/format",
      "lib/engine",
      "lib/schemas",
      "lib/calendar",
      "lib/policy",
    ),
    room(
      "book",
      "The camp book is the engine with names: no database, no person.",
      "lib/book",
      "lib/engine",
      "lib/calendar",
      "lib/schemas",
      "lib/format",
      "lib/policy",
    ),
    {
      ...room(
        "database",
        "SQL and rows know values, never use cases.",
        "db",
        "lib/engine",
        "lib/schemas",
        "lib/policy",
        "lib/book",
      ),
      // The demo is laid out through the services; start-up scripts use lib/run.
      from: { path: "^db/", pathNot: "^db/seed/|\\.mjs$" },
    },
    room(
      "mail",
      "Mails are made from what the database says.",
      "lib/mail",
      "db",
      "lib/engine",
      "lib/book",
      "lib/calendar",
      "lib/schemas",
      "lib/policy",
      "lib/format",
    ),
    room("auth", "Who someone is.", "lib/auth", "db", "lib/schemas", "lib/policy", "lib/mail"),
    room(
      "services",
      "Use cases know nothing of requests and pages.",
      "lib/services",
      "db",
      "lib/engine",
      "lib/book",
      "lib/calendar",
      "lib/schemas",
      "lib/policy",
      "lib/mail",
      "lib/auth",
      "lib/format",
    ),
    room(
      "http",
      "Requests become calls; no SQL, no rule.",
      "lib/http",
      "db/client",
      "db/pool",
      "db/pool",
      "lib/auth",
      "lib/schemas",
      "lib/policy",
      "lib/services",
    ),
    room(
      "query",
      "The browser's hooks know shapes only.",
      "lib/query",
      "lib/engine",
      "lib/book",
      "lib/schemas",
      "lib/policy",
    ),
    {
      name: "components-know-no-server",
      comment: "What runs in a browser meets the server through lib/query alone.",
      severity: "error",
      from: { path: "^components/" },
      to: {
        path: PROJECT,
        pathNot: [
          inRooms(
            "components",
            "lib/engine",
            "lib/book",
            "lib/calendar",
            "lib/schemas",
            "lib/policy",
            "lib/query",
            "lib/format",
          ),
          "^lib/errors\\.ts$",
        ].join("|"),
      },
    },
    {
      name: "routes-are-declarations",
      comment: "A route names who may call, what body and which service; it reaches for no table itself.",
      severity: "error",
      from: { path: "^app/(api|feeds)/" },
      // The pool is no SQL: a handle to pass on.
      to: { path: "^(components|db)/", pathNot: "^db/pool\\.ts$" },
    },
    {
      name: "pages-write-no-sql",
      comment: "Pages get their data from services.",
      severity: "error",
      from: { path: "^app/" },
      to: { path: "^db/", pathNot: "^db/pool\\.ts$" },
    },
    {
      name: "sql-lives-in-db",
      comment: "Only db/ speaks to PostgreSQL; the job queue is the mail room's, and start-up's.",
      severity: "error",
      from: { path: "^(app|components|lib)/", pathNot: "^lib/run/" },
      to: { path: "node_modules/(drizzle-orm|postgres)/" },
    },
    {
      name: "nothing-imports-tests",
      comment: "Tests may import all, nobody imports tests.",
      severity: "error",
      from: { path: "^(app|components|db|lib)/" },
      to: { path: "^tests/" },
    },
    {
      name: "no-tools-in-the-product",
      comment: "What is installed for development does not exist where the product runs.",
      severity: "error",
      from: { path: "^(app|components|db|lib)/", pathNot: "^lib/run/" },
      to: {
        dependencyTypes: ["npm-dev"],
        dependencyTypesNot: ["type-only"],
        pathNot: "node_modules/@types/",
      },
    },
    {
      name: "no-circles",
      comment: "Two files that import each other are one file; tables may, their references are functions.",
      severity: "error",
      from: { path: PROJECT, pathNot: "^db/schema/" },
      to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } },
    },
    {
      name: "resolves",
      comment: "An import that leads nowhere.",
      severity: "error",
      from: {},
      to: { couldNotResolve: true },
    },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    exclude: { path: "^\\.next/|^\\.data/|\\.css$" },
    tsConfig: { fileName: "tsconfig.json" },
    // Imports of types count: a type that leaks is an arrow too.
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ["exports"],
      conditionNames: ["import", "require", "node", "default", "types"],
    },
  },
};

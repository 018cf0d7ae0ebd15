// Which part of the code may import which. Arrows point down: app -> components -> lib -> db.

/** The lists of words that columns may hold: plain constants, which forms show as choices. */
const WORDS = "^db/words[.]ts$";

/** Parts of lib that belong to no area: every area may use them. */
const SHARED = ["arithmetic", "auth", "books", "http"];

/**
 * Where one area's code may use another's, and why. Anything not listed is an error: a new line here is a decision.
 */
const AREAS = [
  ["people", "catalogue", "a new outfit starts with a copy of the catalogue"],
  ["pickups", "catalogue", "a haul is made of item kinds"],
  ["pickups", "prices", "the rest of a haul's cost goes to its goods by what they would bring"],
  ["bench", "catalogue", "taking items apart follows their breakdown sheets"],
  ["bench", "bins", "weighed parts go into bins"],
  ["bench", "pickups", "items on the bench come from hauls"],
  ["bins", "catalogue", "a bin holds one grade"],
  ["bins", "pickups", "a weigh-in may name the haul it comes from"],
  ["bins", "prices", "a bin shows what it would bring today"],
  ["prices", "catalogue", "a price is for a grade"],
  ["tickets", "catalogue", "a ticket line names a grade"],
  ["tickets", "bins", "selling takes weight out of bins"],
  ["tickets", "prices", "a ticket line is compared with the yard's price sheet"],
  ["money", "catalogue", "earnings are listed by grade"],
  ["money", "tickets", "the month's sales are its posted tickets"],
  ["today", ".*", "Today shows something from every area"],
];
/** Pairs listed both ways would be a cycle, which the first rule refuses by itself. */
const areaRules = [...new Set(AREAS.map(([from]) => from))].map((from) => {
  const allowed = AREAS.filter(([area]) => area === from).map(([, to]) => to);
  return {
    name: `area-${from}`,
    comment: `lib/${from} uses shared code, itself, and the areas that .dependency-cruiser.cjs lists with a reason.`,
    severity: "error",
    from: { path: `^lib/${from}/` },
    to: { path: "^lib/[^/]+/", pathNot: `^lib/(${[...SHARED, from, ...allowed].join("|")})/` },
  };
});
const listed = [...new Set(AREAS.map(([from]) => from))].join("|");

module.exports = {
  forbidden: [
    {
      name: "no-cycles",
      comment: "Two files that need each other are one thing, or the wrong two.",
      severity: "error",
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } },
    },
    { name: "resolvable", comment: "An import that leads nowhere.", severity: "error", from: {}, to: { couldNotResolve: true, pathNot: "^server-only$" } },
    {
      name: "lib-below-app",
      comment: "lib knows nothing of pages and components.",
      severity: "error",
      from: { path: "^lib/" },
      to: { path: "^(app|components)/" },
    },
    {
      name: "components-below-app",
      comment: "A component is used by pages and uses none.",
      severity: "error",
      from: { path: "^components/" },
      to: { path: "^app/" },
    },
    {
      name: "db-at-the-bottom",
      comment: "The database's own files use lib's small tools only. Commands and the demo are programs of their own and may use services.",
      severity: "error",
      from: { path: "^db/", pathNot: "^db/(seed/|books-check[.]ts|server/)" },
      to: { path: "^(app|components|lib)/", pathNot: "^lib/(env|clock|ids)[.]ts$" },
    },
    {
      name: "routes-without-database",
      comment: "A route declares what it takes and calls one service. SQL belongs in lib/<area>/queries.ts or service.ts.",
      severity: "error",
      from: { path: "^app/" },
      to: { path: "^(db/|node_modules/(drizzle-orm|mysql2)/)", pathNot: WORDS },
    },
    {
      name: "services-without-http",
      comment: "A service never sees a Request or a Response: the demo and the tests call it as well.",
      severity: "error",
      from: { path: "^lib/.*/(service|queries|rules)[^/]*[.]ts$|^lib/(books|arithmetic)/" },
      to: { path: "^node_modules/(next|next-auth|react)/" },
    },
    {
      name: "rules-are-pure",
      comment: "The form computes with the same rules as the server, so they have no database, no clock and no environment.",
      severity: "error",
      from: { path: "^lib/[^/]+/(rules|schema)[^/]*[.]ts$" },
      to: {
        path: "^(db/|lib/(env|log|clock)[.]ts|lib/.*/(service|queries)[^/]*[.]ts$|node_modules/(drizzle-orm|mysql2)/)",
        pathNot: WORDS,
        dependencyTypesNot: ["type-only"],
      },
    },
    {
      name: "arithmetic-stands-alone",
      comment: "lib/arithmetic imports nothing of the app.",
      severity: "error",
      from: { path: "^lib/arithmetic/" },
      to: { path: "^(app|components|lib|db)/", pathNot: "^lib/arithmetic/" },
    },
    {
      name: "components-without-server",
      comment: "Components run in the browser: data comes through props or the API. A type costs nothing there.",
      severity: "error",
      from: { path: "^components/" },
      to: { path: "^(db/|lib/.*/(service|queries)[^/]*[.]ts$|lib/(env|log)[.]ts)", pathNot: WORDS, dependencyTypesNot: ["type-only"] },
    },
    {
      name: "area-not-listed",
      comment: "An area that .dependency-cruiser.cjs does not list uses shared code and itself only.",
      severity: "error",
      from: { path: "^lib/([^/]+)/", pathNot: `^lib/(${[...SHARED, listed].join("|")})/` },
      to: { path: "^lib/[^/]+/", pathNot: `^lib/($1|${SHARED.join("|")})/` },
    },
    {
      name: "shared-knows-no-area",
      comment: "What every area uses cannot depend on one of them.",
      severity: "error",
      from: { path: `^lib/(${SHARED.join("|")})/` },
      to: { path: "^lib/[^/]+/", pathNot: `^lib/(${SHARED.join("|")})/` },
    },
    ...areaRules,
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    exclude: { path: "^(db/server/|.*[.]test[.]tsx?$)" },
    tsConfig: { fileName: "tsconfig.json" },
    tsPreCompilationDeps: "specify",
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "require", "node", "default", "types"] },
  },
};

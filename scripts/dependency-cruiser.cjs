/**
 * The import order of the tree. A violation is an error, never a warning; type-only imports count.
 * Folders of the tree are named one by one in what they may import, so that a new folder is refused until it is placed.
 */

const npm = (...names) => names.map((name) => `^node_modules/(@types/)?${name}/`);
const NODE_BUILT_INS = ["^(node:)?(async_hooks|crypto|fs|fs/promises|path)$"];
const OWN_FOLDERS = "^(app|lib|models|policies|templates|tests|scripts)/";

/** `folder` may import itself and what `allowed` lists, and nothing else at all. */
function only(folder, allowed, comment) {
  return {
    name: `${folder.replace("/", "-")}-imports`,
    comment,
    severity: "error",
    from: { path: `^${folder}/` },
    to: { pathNot: [`^${folder}/`, ...allowed] },
  };
}

/** `folder` may import itself and, of our own folders, what `allowed` lists; packages are judged by the rules below. */
function onlyOwn(folder, allowed, comment) {
  return {
    name: `${folder.replace("/", "-")}-imports`,
    comment,
    severity: "error",
    from: { path: `^${folder}/` },
    to: { path: OWN_FOLDERS, pathNot: [`^${folder}/`, ...allowed] },
  };
}

/** A package that has one home. */
function packageStaysIn(name, home, packages) {
  return {
    name,
    comment: `${packages.join(", ")}: only in ${home}, scripts and tests`,
    severity: "error",
    from: { path: OWN_FOLDERS, pathNot: `^(${home}|scripts|tests)/` },
    to: { path: npm(...packages) },
  };
}

/**
 * lib/proposals from the ground up: rows as they are kept, what follows from them, who is told, the acts, what pages
 * read. The files at its root are its vocabulary; queries.ts is the door of the pages.
 */
const PROPOSAL_FLOORS = [
  ...["records", "review", "notices"],
  ...["drafting", "submitting", "signing", "remarks", "files"],
  ...["reading", "day-sheet"],
];

/** No floor of lib/proposals imports from one above it. */
function proposalFloors() {
  return PROPOSAL_FLOORS.slice(0, -1).map((floor, at) => ({
    name: `proposals-${floor}-imports`,
    comment: "lib/proposals is built from its records up to what pages read",
    severity: "error",
    from: { path: `^lib/proposals/${floor}/` },
    to: { path: `^lib/proposals/(${PROPOSAL_FLOORS.slice(at + 1).join("|")})/` },
  }));
}

const DOMAIN = ["^lib/(vocabulary|units|aero|evaluation|audit|users|evidence)/", "^models/", "^policies/"];

/** @type {import("dependency-cruiser").IConfiguration} */
module.exports = {
  forbidden: [
    {
      name: "no-cycles",
      comment: "Two files that need each other are one file, or three.",
      severity: "error",
      from: {},
      to: { circular: true },
    },
    {
      name: "no-unresolved",
      comment: "An import that leads nowhere.",
      severity: "error",
      from: { path: OWN_FOLDERS },
      to: { couldNotResolve: true },
    },
    {
      name: "no-barrels",
      comment: "Import the file itself.",
      severity: "error",
      from: {},
      to: { path: `${OWN_FOLDERS}.*(^|/)index\\.(ts|tsx|mjs)$` },
    },
    {
      name: "nobody-imports-tests-or-scripts",
      severity: "error",
      from: { pathNot: "^(tests|scripts)/" },
      to: { path: "^(tests|scripts)/" },
    },
    ...proposalFloors(),
    only("lib/vocabulary", [], "words everyone may use: no package, no Node built-in"),
    only("lib/units", npm("js-quantities"), "the one unit package"),
    only("lib/aero", ["^lib/units/"], "pure formulas"),
    only(
      "lib/evaluation",
      ["^lib/(aero|units|vocabulary)/", ...npm("zod")],
      "pure: browser, server and scripts use it",
    ),
    only("policies", ["^lib/vocabulary/", ...npm("@casl/ability")], "who may do what, about plain facts"),
    only(
      "models",
      ["^lib/vocabulary/", ...NODE_BUILT_INS, ...npm("sequelize", "sqlite3", "server-only")],
      "rows; no commands",
    ),
    only("templates", ["^lib/(vocabulary|units)/"], "plain functions: props in, text out"),
    onlyOwn("lib/audit", ["^lib/vocabulary/", "^models/"], "the history knows no domain"),
    onlyOwn("lib/mail", ["^lib/vocabulary/", "^models/", "^templates/"], "the outbox knows no domain"),
    onlyOwn("lib/users", ["^lib/vocabulary/", "^models/"], "accounts know no domain"),
    onlyOwn(
      "lib/accounts",
      ["^lib/(vocabulary|audit|users)/", "^models/", "^policies/"],
      "acts on accounts, each recorded",
    ),
    onlyOwn("lib/evidence", ["^lib/vocabulary/", "^models/"], "files on the disk know no domain"),
    onlyOwn("lib/budget", DOMAIN, "reads and issues of a budget"),
    onlyOwn("lib/products", [...DOMAIN, "^lib/(budget|mail)/"], "products and roles"),
    onlyOwn("lib/proposals", [...DOMAIN, "^lib/(budget|mail)/"], "the review cycle"),
    {
      name: "lib-is-placed",
      comment: "A folder of lib that no rule above places: give it one.",
      severity: "error",
      from: {
        path: "^lib/(?!(vocabulary|units|aero|evaluation|audit|mail|users|accounts|evidence|budget|products|proposals)/)",
      },
      to: {},
    },
    onlyOwn("app", ["^lib/", "^policies/"], "pages use lib; policies only to show or hide"),
    packageStaysIn("react-and-next-stay-in-app", "app", [
      "next",
      "next-auth",
      "react",
      "react-dom",
      "@casl/react",
      "swr",
    ]),
    packageStaysIn("sequelize-stays-below-app", "models|lib", ["sequelize"]),
    packageStaysIn("sqlite-stays-in-models", "models", ["sqlite3"]),
    packageStaysIn("smtp-stays-in-mail", "lib/mail", ["nodemailer"]),
    packageStaysIn("casl-stays-in-policies", "policies", ["@casl/ability"]),
    packageStaysIn("units-package-stays-in-units", "lib/units", ["js-quantities"]),
  ],
  options: {
    tsConfig: { fileName: "tsconfig.json" },
    tsPreCompilationDeps: true,
    combinedDependencies: true,
    doNotFollow: { path: "^node_modules/" },
    exclude: { path: "^(\\.next|data|test-results)/" },
    enhancedResolveOptions: {
      exportsFields: ["exports"],
      conditionNames: ["import", "require", "node", "default", "types"],
      mainFields: ["module", "main", "types"],
      extensions: [".ts", ".tsx", ".mts", ".mjs", ".cjs", ".js", ".json", ".d.ts"],
    },
  },
};

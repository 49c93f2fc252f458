import path from "node:path";
import { describe, expect, it } from "vitest";
import { finishedProgram } from "@/tests/support/finished-program";
import { temporaryTree } from "@/tests/support/temporary-tree";

const root = path.resolve(__dirname, "../..");
const PACKAGES = ["react", "next", "zod", "sequelize", "nodemailer", "@casl/ability"];
const FOLDERS = [
  ...[
    "lib/vocabulary",
    "lib/units",
    "lib/aero",
    "lib/evaluation",
    "lib/audit",
    "lib/mail",
    "lib/budget",
    "lib/proposals",
  ],
  ...["models", "policies", "templates", "app", "scripts"],
];

const REFUSED: readonly [folder: string, statement: string, ...rules: string[]][] = [
  ["lib/vocabulary", 'import "node:fs";', "lib-vocabulary-imports"],
  ["lib/units", 'import "@/lib/vocabulary/target";', "lib-units-imports"],
  ["lib/aero", 'import "zod";', "lib-aero-imports"],
  ["lib/evaluation", 'import "@/models/target";', "lib-evaluation-imports"],
  ["lib/evaluation", 'import "@/lib/budget/target";', "lib-evaluation-imports"],
  ["policies", 'import "@/lib/evaluation/target";', "policies-imports"],
  ["policies", 'import type { Target } from "@/models/target"; export type T = Target;', "policies-imports"],
  ["models", 'import "@/policies/target";', "models-imports"],
  ["templates", 'import "react";', "react-and-next-stay-in-app", "templates-imports"],
  ["lib/audit", 'import "@/lib/mail/target";', "lib-audit-imports"],
  ["lib/budget", 'import "@/lib/proposals/target";', "lib-budget-imports"],
  ["lib/budget", 'import "nodemailer";', "smtp-stays-in-mail"],
  ["lib/proposals", 'import "@/app/target";', "lib-proposals-imports"],
  ["lib/proposals", 'import "next";', "react-and-next-stay-in-app"],
  ["lib/proposals", 'import "@casl/ability";', "casl-stays-in-policies"],
  ["lib/proposals", 'import "@/lib/proposals/nowhere";', "no-unresolved"],
  ["app", 'import "@/models/target";', "app-imports"],
  ["app", 'import "sequelize";', "sequelize-stays-below-app"],
  ["app", 'import "@/scripts/target";', "app-imports", "nobody-imports-tests-or-scripts"],
  ["lib/somewhere", 'import "zod";', "lib-is-placed"],
];

const ALLOWED: readonly [folder: string, statement: string][] = [
  ["lib/evaluation", 'import "zod"; import "@/lib/aero/target"; import "@/lib/vocabulary/target";'],
  ["lib/mail", 'import "nodemailer"; import "@/templates/target"; import "@/models/target";'],
  ["lib/proposals", 'import "@/lib/mail/target"; import "@/lib/budget/target"; import "@/policies/target";'],
  ["app", 'import "react"; import "next"; import "@/lib/proposals/target"; import "@/policies/target";'],
];

/** The file in which a statement stands, its folder's case by number. */
const fileOf = (folder: string, statement: string) =>
  `${folder}/case-${[...REFUSED, ...ALLOWED].findIndex(([of, text]) => of === folder && text === statement)}.ts`;

/** A tree with one module per folder and package, and one importing file per case. */
function treeOfCases(): string {
  return temporaryTree({
    ...Object.fromEntries(FOLDERS.map((folder) => [`${folder}/target.ts`, "export type Target = 1;\n"])),
    ...Object.fromEntries(
      PACKAGES.map((name) => [`node_modules/${name}/package.json`, JSON.stringify({ name, main: "main.js" })]),
    ),
    ...Object.fromEntries(PACKAGES.map((name) => [`node_modules/${name}/main.js`, ""])),
    ...Object.fromEntries([...REFUSED, ...ALLOWED].map(([folder, text]) => [fileOf(folder, text), text])),
    "models/one.ts": 'import "./other";',
    "models/other.ts": 'import "./one";',
    "tsconfig.json": JSON.stringify({ compilerOptions: { module: "esnext", paths: { "@/*": ["./*"] } } }),
  });
}

/** The rules that each file of the tree breaks. */
async function rulesBroken(): Promise<ReadonlyMap<string, ReadonlySet<string>>> {
  const program = path.join(root, "node_modules/dependency-cruiser/bin/dependency-cruise.mjs");
  const rules = path.join(root, "scripts/dependency-cruiser.cjs");
  const folders = ["app", "lib", "models", "policies", "templates", "scripts"];
  const { output } = await finishedProgram([program, "--config", rules, "--output-type=json", ...folders], {
    folder: treeOfCases(),
  });
  const report: { summary: { violations: { from: string; rule: { name: string } }[] } } = JSON.parse(output);
  const broken = new Map<string, Set<string>>();
  for (const { from, rule } of report.summary.violations)
    broken.set(from, (broken.get(from) ?? new Set()).add(rule.name));
  return broken;
}

describe("the import order", () => {
  // One run for all cases: starting the checker takes a second or more each time.
  it("refuses each forbidden import by its rule, a circle too, and lets the rest pass", async () => {
    const broken = await rulesBroken();
    const found = (folder: string, statement: string) => [...(broken.get(fileOf(folder, statement)) ?? [])].sort();

    expect(REFUSED.map(([folder, statement]) => [folder, statement, ...found(folder, statement)])).toEqual(REFUSED);
    expect(ALLOWED.map(([folder, statement]) => [folder, statement, ...found(folder, statement)])).toEqual(ALLOWED);
    expect(broken.get("models/one.ts")).toEqual(new Set(["no-cycles"]));
  });
});

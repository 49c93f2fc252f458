// @ts-check
import { readdirSync } from "node:fs";
import path from "node:path";
import { browserFault } from "../readiness/browser.mjs";
import { ensureBuild } from "../readiness/build.mjs";
import { repositoryRoot } from "../readiness/repository-root.mjs";
import { runInstalled } from "../readiness/run-program.mjs";
import { countsOfPlaywright, countsOfProgram, countsOfVitest } from "./counts.mjs";

/**
 * @typedef {import("./counts.mjs").Counts} Counts
 * @typedef {{ unitConfig: string | null, reportFolder: string }} Context
 * @typedef {{ name: string, run: (context: Context) => Promise<Counts> }} Stage
 */

const LAYERED = ["app", "lib", "models", "policies", "templates", "scripts", "tests"];

/** Every check, the cheapest first. @type {readonly Stage[]} */
export const STAGES = [
  { name: "format", run: () => program("prettier/bin/prettier.cjs", ["--check", "--log-level=warn", "."]) },
  { name: "lint", run: () => program("eslint/bin/eslint.js", ["-c", "scripts/eslint.config.mjs", "."]) },
  { name: "types", run: typesStage },
  {
    name: "layers",
    run: () =>
      program("dependency-cruiser/bin/dependency-cruise.mjs", [
        "--config",
        "scripts/dependency-cruiser.cjs",
        ...LAYERED,
        ...readdirSync(repositoryRoot).filter((name) => /^[^.]+\.ts$/.test(name)),
      ]),
  },
  { name: "unit", run: (context) => vitestStage("unit", context) },
  { name: "integration", run: (context) => vitestStage("integration", context) },
  { name: "build", run: buildStage },
  { name: "browser", run: browserStage },
];

/** `npm run check`: what is quick enough to run before every commit. */
export const QUICK_STAGES = ["format", "lint", "types", "layers", "unit"];

/**
 * @param {string} file
 * @param {readonly string[]} args
 */
async function program(file, args) {
  return countsOfProgram(await runInstalled(file, args));
}

/** Route types are generated, so that a fresh clone knows them before its first build. */
async function typesStage() {
  const generated = await runInstalled("next/dist/bin/next", ["typegen"]);
  return generated === 0 ? program("typescript/bin/tsc", ["--noEmit"]) : countsOfProgram(generated);
}

/**
 * @param {"unit" | "integration"} project
 * @param {Context} context
 */
async function vitestStage(project, { unitConfig, reportFolder }) {
  const report = path.join(reportFolder, `${project}.json`);
  const selection = unitConfig
    ? ["--config", unitConfig]
    : ["--config", "tests/vitest.config.ts", "--project", project];
  const code = await runInstalled(
    "vitest/vitest.mjs",
    ["run", ...selection, "--allowOnly=false", "--reporter=default", "--reporter=json", `--outputFile.json=${report}`],
    // The note about the configuration loader concerns a later version of vite.
    { NODE_ENV: "test", VITE_CONFIG_NATIVE_IGNORE_WARNING: "true" },
  );
  return countsOfVitest(report, code);
}

async function buildStage() {
  await ensureBuild();
  return countsOfProgram(0);
}

/** @param {Context} context */
async function browserStage({ reportFolder }) {
  const fault = await browserFault();
  if (fault) return { passed: 0, failed: 1, remarks: [fault] };
  const report = path.join(reportFolder, "browser.json");
  const code = await runInstalled(
    "@playwright/test/cli.js",
    ["test", "--config", "tests/playwright.config.ts", "--forbid-only", "--reporter=list,json"],
    { PLAYWRIGHT_JSON_OUTPUT_FILE: report },
  );
  return countsOfPlaywright(report, code);
}

// @ts-check
import path from "node:path";
import { repositoryRoot } from "./repository-root.mjs";

/**
 * Bundles the thread that draws budgets into one file, packages and all: it is started from wherever it lies.
 * @param {string} [file]
 */
export async function buildMonteCarloWorker(file = path.join(repositoryRoot, ".next/monte-carlo-worker.mjs")) {
  // Loaded late: the packages may just have been installed.
  const { build } = await import("esbuild");
  await build({
    absWorkingDir: repositoryRoot,
    entryPoints: ["lib/budget/monte-carlo/worker.ts"],
    outfile: file,
    bundle: true,
    platform: "node",
    target: "node20",
    format: "esm",
    logLevel: "warning",
  });
}

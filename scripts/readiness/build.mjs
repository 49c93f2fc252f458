// @ts-check
import { existsSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { buildMonteCarloWorker } from "./monte-carlo-worker.mjs";
import { repositoryRoot } from "./repository-root.mjs";
import { runInstalled } from "./run-program.mjs";
import { sourceHash } from "./source-hash.mjs";

const STAMP = path.join(repositoryRoot, ".next/leeboard-source-hash");

/** Builds the application, unless it was built from exactly these sources. */
export async function ensureBuild() {
  // Taken before the build: what is edited meanwhile makes the next start build again.
  const hash = sourceHash();
  if (existsSync(STAMP) && readFileSync(STAMP, "utf8") === hash) return;
  console.log("Building the application. This takes about half a minute, and only happens when its sources change.");
  rmSync(STAMP, { force: true });
  const code = await runInstalled("next/dist/bin/next", ["build"], { NODE_ENV: "production" });
  if (code !== 0) throw new Error("The application could not be built; the build says above why.");
  await buildMonteCarloWorker();
  writeFileSync(STAMP, hash);
}

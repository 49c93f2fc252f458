// @ts-check
import { runTypeScript } from "./readiness/run-typescript.mjs";

// Bundled first: a loader that keeps the names of functions makes every closure many times dearer than it is.
process.exitCode = await runTypeScript("scripts/bench/bench-aero.ts", process.argv.slice(2));

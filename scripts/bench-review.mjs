// @ts-check
import { runTypeScript } from "./readiness/run-typescript.mjs";

process.exitCode = await runTypeScript("scripts/bench/bench-review.ts", process.argv.slice(2));

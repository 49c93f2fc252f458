// @ts-check
// Plain Node: this runs on a fresh clone, before any package is installed.
import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { parseArgs } from "node:util";
import { nodeVersionFault } from "./readiness/node-version.mjs";
import { ensurePackages } from "./readiness/packages.mjs";
import { QUICK_STAGES, STAGES } from "./testing/stages.mjs";

const { values: options } = parseArgs({
  options: {
    /** Stages to run, by name, separated by commas. */
    only: { type: "string" },
    quick: { type: "boolean", default: false },
    /** Another vitest configuration for the unit stage: the test of this runner gives it broken tests. */
    "unit-config": { type: "string" },
  },
});

const reportFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-test-"));
process.on("exit", () => rmSync(reportFolder, { recursive: true, force: true }));

const total = { passed: 0, failed: 0 };
try {
  const fault = nodeVersionFault(process.versions.node);
  if (fault) throw new Error(fault);
  await ensurePackages();
  for (const stage of chosenStages()) await runStage(stage);
} catch (error) {
  total.failed += 1;
  console.error(`\n${error instanceof Error ? error.message : error}`);
}
if (total.passed === 0 && total.failed === 0) total.failed = 1;
process.exitCode = total.failed === 0 ? 0 : 1;
console.log(`\n${total.passed} passed, ${total.failed} failed`);

function chosenStages() {
  const names = options.quick ? QUICK_STAGES : (options.only?.split(",") ?? STAGES.map((stage) => stage.name));
  const unknown = names.filter((name) => !STAGES.some((stage) => stage.name === name));
  if (unknown.length > 0) {
    throw new Error(`There is no stage ${unknown.join(", ")}; there are ${STAGES.map(({ name }) => name).join(", ")}.`);
  }
  return STAGES.filter((stage) => names.includes(stage.name));
}

/**
 * One stage that breaks off counts as one failure and does not keep the others from running.
 * @param {import("./testing/stages.mjs").Stage} stage
 */
async function runStage(stage) {
  console.log(`\n── ${stage.name}`);
  const started = Date.now();
  const counts = await stage
    .run({ unitConfig: options["unit-config"] ?? null, reportFolder })
    .catch((error) => ({ passed: 0, failed: 1, remarks: [String(error.message)] }));
  total.passed += counts.passed;
  total.failed += counts.failed;
  for (const remark of counts.remarks) console.log(`   ${remark}`);
  const seconds = ((Date.now() - started) / 1000).toFixed(1);
  console.log(`   ${stage.name}: ${counts.passed} passed, ${counts.failed} failed (${seconds} s)`);
}

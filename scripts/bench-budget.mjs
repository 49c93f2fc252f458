// @ts-check
import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import os from "node:os";
import path from "node:path";
import { ensureBuild } from "./readiness/build.mjs";
import { ensurePackages } from "./readiness/packages.mjs";
import { runTypeScript } from "./readiness/run-typescript.mjs";
import { applicationEnvironment, startApplication } from "./start/application.mjs";

await ensurePackages();
await ensureBuild();
const dataFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-bench-"));
try {
  const filled = await runTypeScript("scripts/bench/large-database.ts", [], { LEEBOARD_DATA: dataFolder });
  process.exitCode = filled || (await measure());
} finally {
  rmSync(dataFolder, { recursive: true, force: true });
}

async function measure() {
  const port = await freePort();
  const secret = "for the bench only, never for a real installation";
  const environment = applicationEnvironment({ port, dataFolder, secret, smtpUrl: null, mailPort: null });
  const application = await startApplication({ port, environment });
  try {
    return await runTypeScript("scripts/bench/bench-budget.ts", [application.address]);
  } finally {
    await application.stop();
  }
}

/** @returns {Promise<number>} */
function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() =>
        typeof address === "object" && address ? resolve(address.port) : reject(new Error("no port")),
      );
    });
  });
}

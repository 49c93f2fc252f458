import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";

/** Builds what is stale and fills one database with the demo; every worker starts from a copy of it. */
export default async function globalSetup(): Promise<() => void> {
  // Plain Node modules, loaded as such.
  const { ensureBuild } = await import("@/scripts/readiness/build.mjs");
  const { prepareDatabase } = await import("@/scripts/start/database.mjs");

  const dataFolder = mkdtempSync(path.join(os.tmpdir(), "leeboard-demo-"));
  const remove = () => rmSync(dataFolder, { recursive: true, force: true });
  try {
    await ensureBuild();
    await prepareDatabase({ dataFolder, demo: true, adminEmail: null });
  } catch (error) {
    remove();
    throw error;
  }
  process.env.LEEBOARD_DEMO_TEMPLATE = dataFolder;
  return remove;
}

// @ts-check
import { runTypeScript } from "../readiness/run-typescript.mjs";

/**
 * Migrates the database, fills an empty one, and says who can sign in. In a process of its own: it needs the domain,
 * which this one could not load before the packages were installed.
 * @param {{ dataFolder: string, demo: boolean, adminEmail: string | null }} settings
 */
export async function prepareDatabase({ dataFolder, demo, adminEmail }) {
  const code = await runTypeScript("scripts/prepare-database.ts", [], {
    LEEBOARD_DATA: dataFolder,
    LEEBOARD_DEMO: demo ? "on" : "off",
    LEEBOARD_ADMIN_EMAIL: adminEmail ?? "",
  });
  if (code !== 0) throw new Error("The database could not be prepared; the reason stands above.");
}

// @ts-check
// `npm run verify`: proves a database, from outside the running application.
import { ensurePackages } from "./readiness/packages.mjs";
import { repositoryRoot } from "./readiness/repository-root.mjs";
import { runTypeScript } from "./readiness/run-typescript.mjs";
import { readSettings } from "./start/settings.mjs";

await ensurePackages();
const { settings } = readSettings(process.env, repositoryRoot);
process.exitCode = await runTypeScript("scripts/verify-database.ts", [], { LEEBOARD_DATA: settings.dataFolder });

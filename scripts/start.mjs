// @ts-check
// Plain Node: this runs on a fresh clone, before any package is installed.
import { ensureBuild } from "./readiness/build.mjs";
import { nodeVersionFault } from "./readiness/node-version.mjs";
import { ensurePackages } from "./readiness/packages.mjs";
import { repositoryRoot } from "./readiness/repository-root.mjs";
import { applicationEnvironment, startApplication } from "./start/application.mjs";
import { prepareDatabase } from "./start/database.mjs";
import { startMailCatcher } from "./start/mail-catcher.mjs";
import { preconditionFaults } from "./start/preconditions.mjs";
import { sessionSecret } from "./start/secret.mjs";
import { readSettings } from "./start/settings.mjs";

/** What was started and must be stopped, the latest first. @type {(() => Promise<void>)[]} */
const started = [];
let leaving = false;

try {
  await start();
} catch (error) {
  console.error(`\n${error instanceof Error ? error.message : error}`);
  await stopEverything();
  process.exit(1);
}

async function start() {
  const { settings, faults } = readSettings(process.env, repositoryRoot);
  const versionFault = nodeVersionFault(process.versions.node);
  refuse(versionFault ? [versionFault, ...faults] : faults);
  refuse(await preconditionFaults(settings));

  await ensurePackages();
  await ensureBuild();
  await prepareDatabase(settings);

  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => void stopAndLeave(0));
  const mail = settings.mailCatcher ? await startMailCatcher(settings.mailCatcher) : null;
  if (mail) started.unshift(mail.stop);
  const application = await startApplication({
    port: settings.port,
    environment: applicationEnvironment({
      ...settings,
      secret: sessionSecret(settings.dataFolder),
      mailPort: mail?.smtpPort ?? null,
    }),
  });
  started.unshift(application.stop);

  console.log(`\nLeeboard runs at ${application.address}`);
  console.log(mail ? `Mail is caught at http://127.0.0.1:${mail.webPort}` : "Mail goes out by SMTP_URL.");
  console.log("Ctrl-C stops everything.");
  void application.ended.then((code) => {
    if (!leaving) console.error(`The application ended by itself with code ${code}.`);
    return stopAndLeave(1);
  });
}

/** @param {readonly string[]} faults */
function refuse(faults) {
  if (faults.length > 0) throw new Error(faults.join("\n"));
}

/** @param {number} code */
async function stopAndLeave(code) {
  if (leaving) return;
  leaving = true;
  await stopEverything();
  process.exit(code);
}

async function stopEverything() {
  for (const stop of started.splice(0)) await stop();
}

// Run by the start before the application: migrates, fills an empty database, and says who can sign in.
import { randomBytes } from "node:crypto";
import { renameSync, rmSync } from "node:fs";
import { listAccounts } from "@/lib/users/queries";
import { systemClock } from "@/lib/vocabulary/clock";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { closeDatabase, databaseFile, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { DEMO_ADMINISTRATOR, DEMO_PASSWORD, DEMO_PEOPLE, DEMO_ROLES } from "./demo/people";
import { fillDemo } from "./demo/fill-demo";
import { createFirstAdministrator } from "./first-administrator";

void prepareDatabase().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});

async function prepareDatabase(): Promise<void> {
  const demo = process.env.LEEBOARD_DEMO !== "off";
  await openDatabase();
  try {
    await migrateDatabase();
    const empty = (await listAccounts()).length === 0;
    if (empty && demo) await replaceByDemo();
    if (empty && !demo) await prepareEmptyInstallation();
    if (demo) await sayDemoAccounts();
  } finally {
    await closeDatabase();
  }
}

/** Filled aside and moved into place whole: a start that is interrupted leaves no half of a demo. */
async function replaceByDemo(): Promise<void> {
  console.log("Filling the empty database with the demo.");
  await closeDatabase();
  const aside = `${databaseFile()}.filling`;
  for (const ending of ["", "-wal", "-shm"]) rmSync(aside + ending, { force: true });
  await openDatabase(aside);
  await migrateDatabase();
  await fillDemo(new Date());
  await closeDatabase();
  renameSync(aside, databaseFile());
  await openDatabase();
}

async function sayDemoAccounts(): Promise<void> {
  const emails = new Set((await listAccounts()).map(({ email }) => email));
  // A database that was made without the demo keeps to its own people.
  if (!Object.values(DEMO_PEOPLE).every(({ email }) => emails.has(email))) return;
  console.log(`\nAccounts of the demo, all with the password “${DEMO_PASSWORD}”:`);
  console.log(`  ${DEMO_PEOPLE[DEMO_ADMINISTRATOR].email.padEnd(28)}administrator`);
  for (const { person, roles } of DEMO_ROLES) {
    console.log(
      `  ${DEMO_PEOPLE[person].email.padEnd(28)}${roles
        .map((role) => ROLE_NAMES[role])
        .join(", ")
        .toLowerCase()}`,
    );
  }
}

async function prepareEmptyInstallation(): Promise<void> {
  const email = process.env.LEEBOARD_ADMIN_EMAIL;
  if (!email) {
    throw new Error(
      "An empty installation needs its first administrator: set LEEBOARD_ADMIN_EMAIL to their address and start again.",
    );
  }
  const password = randomBytes(15).toString("base64url");
  await createFirstAdministrator(systemClock, { email, name: "Administrator", password });
  console.log(`\nThe first account: ${email}, password ${password}`);
  console.log("The password is shown this once. Sign in and change it under Account.");
}

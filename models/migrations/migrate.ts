import { QueryTypes, type Transaction } from "sequelize";
import { database, inTransaction } from "../database";
import { peopleAndProducts } from "./0001-people-and-products";
import { proposals } from "./0002-proposals";
import { issues } from "./0003-issues";
import { signaturesAndRemarks } from "./0004-signatures-and-remarks";
import { historyAndOutbox } from "./0005-history-and-outbox";
import { closings } from "./0006-closings";
import { monteCarloRuns } from "./0007-monte-carlo-runs";
import { datedFiles } from "./0008-dated-files";
import { namedAndAddressed } from "./0009-named-and-addressed";
import { touchedFields } from "./0009-touched-fields";
import { issueSheets } from "./0025-issue-sheets";
import { sheetsSeen } from "./0028-sheets-seen";
import type { Migration } from "./migration";

/** A static list: a folder that is read at run time would be missing from the built application. */
const MIGRATIONS: readonly Migration[] = [
  peopleAndProducts,
  proposals,
  issues,
  signaturesAndRemarks,
  historyAndOutbox,
  closings,
  monteCarloRuns,
  datedFiles,
  namedAndAddressed,
  touchedFields,
  issueSheets,
  sheetsSeen,
];

/** Brings the open database to the newest schema, each step in a transaction of its own; answers what it ran. */
export async function migrateDatabase(): Promise<string[]> {
  const ran: string[] = [];
  for (const migration of MIGRATIONS) {
    if (await inTransaction((tx) => runOnce(migration, tx))) ran.push(migration.name);
  }
  return ran;
}

async function runOnce({ name, statements }: Migration, tx: Transaction): Promise<boolean> {
  await database.query(
    "CREATE TABLE IF NOT EXISTS schema_migrations (name TEXT PRIMARY KEY, ran_at TEXT NOT NULL) STRICT",
    {
      transaction: tx,
    },
  );
  const done = await database.query("SELECT name FROM schema_migrations WHERE name = :name", {
    transaction: tx,
    type: QueryTypes.SELECT,
    replacements: { name },
  });
  if (done.length > 0) return false;
  for (const statement of statements) await database.query(statement, { transaction: tx });
  await database.query("INSERT INTO schema_migrations VALUES (:name, strftime('%Y-%m-%dT%H:%M:%fZ', 'now'))", {
    transaction: tx,
    replacements: { name },
  });
  return true;
}

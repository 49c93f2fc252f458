import { openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";

/** Opens and migrates the database. A server that cannot would answer every request with an error: it ends instead. */
export async function prepareServer(): Promise<void> {
  try {
    await openDatabase();
    await migrateDatabase();
  } catch (error) {
    console.error("Leeboard cannot open its database and stops.", error);
    process.exit(1);
  }
}

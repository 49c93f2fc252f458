import { sweepIncoming } from "@/lib/evidence/keep-file";
import { startDeliveryLoop } from "@/lib/mail/delivery-loop";
import { startReminderLoop } from "@/lib/proposals/notices/reminder-loop";
import { openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";

/** Opens and migrates the database, removes half-sent files and begins to deliver mail and to remind. */
export async function prepareServer(): Promise<void> {
  try {
    await openDatabase();
    await migrateDatabase();
    await sweepIncoming();
  } catch (error) {
    // A server without its database would answer every request with an error: it ends instead.
    process.stderr.write(`Leeboard cannot open its database and stops: ${String(error)}\n`);
    process.exit(1);
  }
  startDeliveryLoop();
  startReminderLoop();
}

import { copyFileSync, mkdirSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, afterEach, beforeAll, beforeEach } from "vitest";
import { closeDatabase, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";

/** Gives each test of a file a migrated SQLite file of its own, and removes it afterwards. */
export function withDatabase(): void {
  let folder = "";
  let tests = 0;
  const template = () => path.join(folder, "template.sqlite");

  beforeAll(async () => {
    folder = mkdtempSync(path.join(tmpdir(), "leeboard-test-"));
    await openDatabase(template());
    await migrateDatabase();
    await closeDatabase();
  });

  beforeEach(async () => {
    tests += 1;
    // A folder of its own as well: files are kept beside the database.
    const own = path.join(folder, `test-${tests}`);
    mkdirSync(own);
    const file = path.join(own, "leeboard.sqlite");
    copyFileSync(template(), file);
    await openDatabase(file);
  });

  afterEach(closeDatabase);

  afterAll(() => rmSync(folder, { recursive: true, force: true }));
}

import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
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
    const file = path.join(folder, `test-${tests}.sqlite`);
    copyFileSync(template(), file);
    await openDatabase(file);
  });

  afterEach(closeDatabase);

  afterAll(() => rmSync(folder, { recursive: true, force: true }));
}

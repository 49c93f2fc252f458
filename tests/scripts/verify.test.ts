import path from "node:path";
import { beforeEach, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/vocabulary/actor";
import { closeDatabase, database, inTransaction, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { Result } from "@/models/result";
import { addItem, approve, bluffItem, establish, plateItem } from "@/tests/support/budget-on-file";
import { finishedProgram } from "@/tests/support/finished-program";
import { person, product, withRole } from "@/tests/support/people";
import { temporaryTree } from "@/tests/support/temporary-tree";

const verify = (dataFolder: string) =>
  finishedProgram(["scripts/verify.mjs"], { environment: { LEEBOARD_DATA: dataFolder } });

describe("npm run verify", { timeout: 120_000 }, () => {
  let dataFolder: string;
  let lusia: Actor;
  let tansy: Actor;

  beforeEach(async () => {
    dataFolder = temporaryTree();
    await openDatabase(path.join(dataFolder, "leeboard.sqlite"));
    await migrateDatabase();
    await product("TF-2");
    lusia = await withRole(await person("Lusia Brand"), "TF-2", "program_manager");
    tansy = await withRole(await person("Tansy Merle"), "TF-2", "component_owner");
    await establish(lusia, "TF-2", "2026-03-01T09:00:00.000Z");
    await approve("TF-2", "2026-03-10T09:00:00.000Z", {
      proposer: tansy,
      signers: [[lusia, "program_manager"]],
      edits: [addItem("010", bluffItem(tansy.userId, 0.5, 0.2))],
    });
    return closeDatabase;
  });

  it("says of every chain and every issue that it agrees", async () => {
    await closeDatabase();
    const { code, output } = await verify(dataFolder);
    expect(output).toMatch(/^history TF-2: \d+ entries, \d+ bound rows, 0 faults$/m);
    expect(output).toMatch(/^TF-2 issue 1: computes to what it keeps$/m);
    expect(output).toMatch(/^TF-2 issue 2: computes to what it keeps$/m);
    expect(output).toMatch(/Everything agrees\.\s*$/);
    expect(code).toBe(0);
  });

  it("recomputes each issue by the version of a method that it names, before and after another is adopted", async () => {
    const plate = (methodVersion: number) => plateItem(tansy.userId, methodVersion);
    const change = { proposer: tansy, signers: [[lusia, "program_manager"]] as const };
    await approve("TF-2", "2026-03-20T09:00:00.000Z", { ...change, edits: [addItem("020", plate(1))] });
    const adopted = { operation: "revise", kind: "item", number: "020", baseLetter: "–", body: plate(2) } as const;
    await approve("TF-2", "2026-03-30T09:00:00.000Z", { ...change, edits: [adopted] });
    const kept = await Result.findAll({ where: { issue: [3, 4] }, order: ["issue"], raw: true });
    expect(kept.map(({ issue, methodVersion }) => [issue, methodVersion])).toEqual([
      [3, 1],
      [4, 2],
    ]);
    // The printed constants: 0.072 in place of 0.074.
    expect((kept[1]?.basic ?? 0) / (kept[0]?.basic ?? 1)).toBeCloseTo(0.072 / 0.074, 10);
    await closeDatabase();
    const { code, output } = await verify(dataFolder);
    for (const issue of [1, 2, 3, 4]) expect(output).toContain(`TF-2 issue ${issue}: computes to what it keeps`);
    expect(code).toBe(0);
  });

  it("fails on a result that was altered behind the application's back, and names it", async () => {
    await inTransaction(async (tx) => {
      await database.query("DROP TRIGGER results_never_changes", { transaction: tx });
      await database.query("UPDATE results SET predicted = predicted - 0.01 WHERE issue = 2", { transaction: tx });
    });
    await closeDatabase();
    const { code, output } = await verify(dataFolder);
    expect(output).toMatch(/^ {2}issue 2: An issue's lines, results or totals do not give its content hash\.$/m);
    expect(output).toMatch(/^ {2}OP-1, item 010, predicted: keeps [\d.]+, today's code gives [\d.]+$/m);
    expect(code).toBe(1);
  });

  it("says which database is not there", async () => {
    await closeDatabase();
    const { code, output } = await verify(path.join(dataFolder, "nowhere"));
    expect(output).toContain(`There is no database ${path.join(dataFolder, "nowhere", "leeboard.sqlite")}`);
    expect(code).toBe(2);
  });
});

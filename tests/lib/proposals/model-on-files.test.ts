import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { hashPassword } from "@/lib/users/password";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Role } from "@/lib/vocabulary/roles";
import { closeDatabase, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { establish } from "@/tests/support/budget-on-file";
import { conservationFaults } from "@/tests/support/invariants/conservation";
import { endStateFaults, issueNumberFaults, revisionLetterFaults } from "@/tests/support/invariants/numbering";
import { approvalFaults, independenceFaults } from "@/tests/support/invariants/signing";
import { person, product, withRole } from "@/tests/support/people";
import { approves, CODE, editOf, PASSWORD, proposed } from "./review-cycle";
import { steppingClock } from "@/tests/support/recorded-product";
import { databaseDesk } from "./walk/database-desk";
import { firstChange, firstModel, LIMIT, RESERVE } from "./walk/first-issues";
import { ROLES } from "./walk/model-state";
import { walkCommands } from "./walk/walk-commands";

/** More of them, and others, are run by hand: LEEBOARD_WALKS=2000 LEEBOARD_WALK_SEED=1. */
const WALKS = Number(process.env.LEEBOARD_WALKS ?? 60);
const SEED = Number(process.env.LEEBOARD_WALK_SEED ?? 20_261_201);
const ACTS = 24;

const PRODUCT_ROLES: Record<string, Role> = {
  owner: "component_owner",
  reviewer: "reviewer",
  manager: "program_manager",
  auditor: "auditor",
};

let folder = "";
const template = () => path.join(folder, "template.sqlite");
const people: Record<string, Actor> = {};

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), "leeboard-walk-"));
  await openDatabase(template());
  await migrateDatabase();
  await product(CODE);
  const passwordHash = await hashPassword(PASSWORD, { logN: 4, r: 8, p: 1 });
  for (const [name, roles] of Object.entries(ROLES)) {
    let member = await person(`${name} walker`, { passwordHash });
    for (const role of roles) member = await withRole(member, CODE, PRODUCT_ROLES[role] ?? "auditor");
    people[name] = member;
  }
  const { fenno, ines, lusia } = people;
  if (!fenno || !ines || !lusia) throw new Error("somebody is missing");
  await establish(lusia, CODE, "2026-01-05T08:00:00.000Z", { limit: LIMIT, reserve: RESERVE });
  const ids = Object.fromEntries(Object.entries(people).map(([name, { userId }]) => [name, userId]));
  const { edits, transfers } = firstChange(ids);
  const clock = steppingClock("2026-01-06T08:00:00.000Z");
  const first = await proposed(fenno, clock, { edits: edits.map(editOf), transfers });
  await approves(ines, first, "reviewer", clock);
  await approves(lusia, first, "program_manager", clock);
  await closeDatabase();
});

afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A file of its own for each walk. */
async function onItsOwnFile(walk: () => Promise<void>): Promise<void> {
  const file = path.join(folder, "walk.sqlite");
  for (const name of [file, `${file}-wal`, `${file}-shm`]) rmSync(name, { force: true });
  copyFileSync(template(), file);
  await openDatabase(file);
  try {
    await walk();
  } finally {
    await closeDatabase();
  }
}

describe(`${WALKS} walks of random acts by random people, on files`, () => {
  it("go as the rules in words say, act by act, and leave rows that keep every promise", async () => {
    const told = new Set<string>();
    const tell = (outcome: string) => void told.add(outcome);
    const walks = fc.commands(walkCommands(tell), { maxCommands: ACTS, size: "max" });
    await fc.assert(
      fc.asyncProperty(walks, (commands) =>
        onItsOwnFile(async () => {
          await fc.asyncModelRun(
            () => ({ model: firstModel(), real: databaseDesk(people, "2026-03-01T08:00:00.000Z") }),
            commands,
          );
          expect([
            ...(await issueNumberFaults()),
            ...(await revisionLetterFaults()),
            ...(await independenceFaults()),
            ...(await endStateFaults()),
            ...(await conservationFaults()),
            ...(await approvalFaults()),
          ]).toEqual([]);
          expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
        }),
      ),
      { numRuns: WALKS, seed: SEED },
    );
    for (const outcome of ["approve as reviewer: done", "approve as program_manager: done", "return: done"]) {
      expect([...told]).toContain(outcome);
    }
  }, 3_600_000);
});

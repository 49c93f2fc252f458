import { mkdtempSync, rmSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { budgetAt } from "@/lib/budget/queries";
import { reserveHistory } from "@/lib/budget/reserve-history";
import { loadNewestBudget, productByCode } from "@/lib/budget/load-budget";
import { actorById } from "@/lib/users/queries";
import { proposalLabel } from "@/lib/vocabulary/proposals";
import { closeDatabase, inSnapshot, openDatabase } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { fillDemo } from "@/scripts/demo/fill-demo";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import { rows } from "@/tests/support/invariants/rows";

/** Filled once: its acts take some twenty seconds, most of them for hashing passwords. */
describe("the demo", () => {
  const filledAt = new Date("2026-12-01T09:30:00.000Z");
  const folder = mkdtempSync(path.join(os.tmpdir(), "leeboard-demo-test-"));

  beforeAll(async () => {
    await openDatabase(path.join(folder, "demo.sqlite"));
    await migrateDatabase();
    await fillDemo(filledAt);
  }, 240_000);

  afterAll(async () => {
    await closeDatabase();
    rmSync(folder, { recursive: true, force: true });
  });

  // The sums under the demo's own tables: unrounded values added, then printed.
  it.each([
    ["TF2", { basic: "54.96", predicted: "61.59", clearOfReserve: "1.41", standing: "inside", unallocated: 70 }],
    ["PD7", { basic: "124.15", predicted: "138.51", clearOfReserve: "29.49", standing: "inside", unallocated: 1180 }],
    ["GS4", { basic: "275.23", predicted: "310.32", clearOfReserve: "-35.32", standing: "over", unallocated: 150 }],
  ])("leaves %s where its table has it", async (code, expected) => {
    const { results, state } = await inSnapshot(async (tx) => loadNewestBudget((await productByCode(code, tx)).id, tx));
    const point = results.points.find(({ operatingPoint }) => operatingPoint === "OP-1");
    const sheet = state.lines.find(({ kind }) => kind === "allocations");
    expect({
      basic: point?.totals.basic.toFixed(2),
      predicted: point?.totals.predicted.toFixed(2),
      clearOfReserve: point?.totals.clearOfReserve.toFixed(2),
      standing: point?.standing,
      unallocated: sheet?.kind === "allocations" ? sheet.body.unallocatedHundredths : null,
    }).toEqual(expected);
  });

  it("flags the items that its tables mark as over their allocation", async () => {
    const over = async (code: string) => {
      const { results, state } = await inSnapshot(async (tx) =>
        loadNewestBudget((await productByCode(code, tx)).id, tx),
      );
      const sheet = state.lines.find(({ kind }) => kind === "allocations");
      const allocations = sheet?.kind === "allocations" ? sheet.body.rows : [];
      const items = results.points.find(({ operatingPoint }) => operatingPoint === "OP-1")?.items ?? [];
      return items
        .filter(({ item, predicted }) => {
          const allocation = allocations.find(({ kind, number }) => kind === "item" && number === item);
          return Math.round(predicted * 100) > (allocation?.hundredths ?? 0);
        })
        .map(({ item }) => item)
        .sort();
    };
    expect(await over("TF2")).toEqual(["030", "040"]);
    expect(await over("PD7")).toEqual([]);
    expect(await over("GS4")).toEqual(["020", "060", "090", "100", "110"]);
  });

  it("has proposals in every state, and drafts that have no number yet", async () => {
    const proposals = await rows<{ code: string; number: number | null; state: string }>(
      "SELECT p.code, c.number, c.state FROM proposals c JOIN products p ON p.id = c.product_id",
    );
    const inState = (wanted: string) =>
      proposals
        .filter(({ state }) => state === wanted)
        .map(({ code, number }) => (number === null ? "unnumbered" : proposalLabel(code, number)));
    expect(inState("returned")).toEqual(["TF2-CP-06"]);
    expect(inState("disapproved")).toEqual(["TF2-CP-08", "PD7-CP-09", "GS4-CP-08"]);
    expect(inState("draft")).toEqual(["unnumbered"]);
    expect(inState("proposed")).toHaveLength(10);
    expect(inState("approved")).toHaveLength(13);
  });

  it("keeps a Monte Carlo run beside the first order, and a draw on a reserve that ends where the table has it", async () => {
    const runs = await rows<{ code: string; draws: number }>(
      "SELECT p.code, m.draws FROM monte_carlo_runs m JOIN products p ON p.id = m.product_id ORDER BY p.code",
    );
    expect(runs.map(({ code, draws }) => [code, draws])).toEqual([
      ["GS4", 10_000],
      ["TF2", 10_000],
    ]);
    const [lusia] = await rows<{ id: number }>("SELECT id FROM users WHERE email LIKE 'lusia@%'");
    const account = await actorById(lusia?.id ?? 0, filledAt.toISOString());
    if (!account) throw new Error("Lusia has no account");
    const { issue } = await budgetAt(account.actor, "GS4", "newest");
    const [reserve] = await reserveHistory(account.actor, "GS4", issue.number);
    // The demo's table: limit 290 N, reserve 15 N.
    expect(reserve?.moves.map(({ change, balance }) => [change, balance])).toEqual([
      [1650, 1650],
      [-150, 1500],
    ]);
  });

  it("breaks no invariant, and every chain of its history is whole", async () => {
    expect(await invariantFaults()).toEqual([]);
    for (const chain of ["house", "TF2", "PD7", "GS4"]) expect((await verifyChain(chain)).faults, chain).toEqual([]);
  });

  it("lies wholly in the past, and time grows along every chain", async () => {
    const entries = await rows<{ chain: string; at: string }>(
      "SELECT chain, at FROM history_entries ORDER BY chain, sequence",
    );
    expect(entries.filter(({ at }) => at >= filledAt.toISOString())).toEqual([]);
    expect(
      entries.filter(
        ({ chain, at }, index) => entries[index - 1]?.chain === chain && at < (entries[index - 1]?.at ?? ""),
      ),
    ).toEqual([]);
  });
});

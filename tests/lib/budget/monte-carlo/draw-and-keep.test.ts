import { describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { drawAndKeep } from "@/lib/budget/monte-carlo/draw-and-keep";
import type { DrawIssueInput } from "@/lib/budget/monte-carlo/draw-issue";
import { repeatRun } from "@/lib/budget/monte-carlo/repeat-run";
import { runsOf } from "@/lib/budget/monte-carlo/runs-of";
import { database, inTransaction } from "@/models/database";
import { fixedItem } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { forge } from "@/tests/support/forge";
import { rows } from "@/tests/support/invariants/rows";
import { budgetOnFile, withWorker } from "./budget-to-draw";

withDatabase();
const options = withWorker();

const AT = "2026-03-12T10:00:00.000Z";
const clock = () => new Date(AT);
const INPUT: DrawIssueInput = { productCode: "TF-2", issue: "newest", operatingPoint: "OP-1", draws: 4000, seed: 5 };

const lamp = () =>
  budgetOnFile((ownerId) => ({ "010": fixedItem(ownerId, 3, { force: { value: 3, standardUncertainty: 0.4 } }) }));

const entries = () =>
  rows<{ outcome: string; person: string; now: string; reason: string | null }>(
    `SELECT outcome, printed_name AS person, now, reason FROM history_entries
     WHERE act = 'run_monte_carlo' ORDER BY sequence`,
  );

describe("a run that is kept", () => {
  it("stands beside its issue with seed, draws, hashes, person and time, and in the history once", async () => {
    const { lusia, maud } = await lamp();
    const kept = await drawAndKeep(lusia, INPUT, clock, options);
    expect(kept.issue).toBe(2);

    const [run, ...others] = await runsOf(maud, "TF-2", 2, "OP-1");
    expect(others).toEqual([]);
    expect(run).toMatchObject({ id: kept.runId, issue: 2, seed: 5, draws: 4000, by: "Lusia Brand", at: AT });
    // A normal force of 3 N and 0.4 N: five standard errors of its mean and of its deviation.
    expect(Math.abs((run?.result.basic.mean ?? 0) - 3)).toBeLessThan((5 * 0.4) / Math.sqrt(4000));
    expect(Math.abs((run?.result.basic.standardDeviation ?? 0) - 0.4)).toBeLessThan((5 * 0.4) / Math.sqrt(8000));

    const [entry, ...more] = await entries();
    expect(more).toEqual([]);
    expect(entry).toMatchObject({ outcome: "done", person: "Lusia Brand" });
    expect(JSON.parse(entry?.now ?? "")).toMatchObject({
      operatingPoint: "OP-1",
      draws: 4000,
      seed: 5,
      inputHash: run?.inputHash,
      resultHash: run?.resultHash,
    });
  });

  it("is kept as canonical text of at most 12 significant digits", async () => {
    const { lusia } = await lamp();
    await drawAndKeep(lusia, INPUT, clock, options);
    const [row] = await rows<{ result: string }>("SELECT result FROM monte_carlo_runs");
    const text = row?.result ?? "";
    expect(text).toBe(JSON.stringify(JSON.parse(text)));
    const numbers = text.match(/-?\d+(\.\d+)?(e[+-]?\d+)?/g) ?? [];
    expect(numbers.length).toBeGreaterThan(8);
    for (const number of numbers) expect(Number(Number(number).toPrecision(12)), number).toBe(Number(number));
  });

  it("gives the same bytes when it is drawn again, by whoever reads the budget", async () => {
    const { ines, maud } = await lamp();
    const { runId } = await drawAndKeep(ines, INPUT, clock, options);
    const repeated = await repeatRun(maud, "TF-2", runId, options);
    expect(repeated).toEqual({ runId, sameInput: true, sameResult: true });
    expect(await entries()).toHaveLength(1);
  });

  it("is told from what its seed gives, once somebody has changed it", async () => {
    const { ines } = await lamp();
    const { runId } = await drawAndKeep(ines, INPUT, clock, options);
    await forge("UPDATE monte_carlo_runs SET result = replace(result, '\"low95\":2', '\"low95\":1')");
    const repeated = await repeatRun(ines, "TF-2", runId, options);
    expect(repeated).toEqual({ runId, sameInput: true, sameResult: false });
  });

  it("is bound by the history: altered, removed or slipped in, the chain tells", async () => {
    const { tansy } = await lamp();
    await drawAndKeep(tansy, INPUT, clock, options);
    expect((await verifyChain("TF-2")).faults).toEqual([]);

    await forge("UPDATE monte_carlo_runs SET result = replace(result, '\"low95\":2', '\"low95\":1')");
    expect((await verifyChain("TF-2")).faults.map(({ code }) => code)).toEqual(["altered", "text"]);
    await forge(
      "INSERT INTO monte_carlo_runs SELECT id + 1, product_id, issue, operating_point_id, 6, draws, recipe, input_hash, result, result_hash, asked_by_id, printed_name, ran_at FROM monte_carlo_runs",
    );
    expect((await verifyChain("TF-2")).faults.map(({ code }) => code)).toContain("unbound");
    await forge("DELETE FROM monte_carlo_runs");
    expect((await verifyChain("TF-2")).faults.map(({ code }) => code)).toEqual(["removed"]);
  });

  it("never changes and is never deleted", async () => {
    const { lusia } = await lamp();
    await drawAndKeep(lusia, INPUT, clock, options);
    const change = (sql: string) => inTransaction((tx) => database.query(sql, { transaction: tx }));
    for (const sql of ["UPDATE monte_carlo_runs SET seed = 6", "DELETE FROM monte_carlo_runs"]) {
      await expect(change(sql)).rejects.toMatchObject({ parent: { message: expect.stringContaining("never") } });
    }
  });
});

describe("a run that is refused", () => {
  it("is an auditor's, a stranger's, or of what is not there: nothing is drawn, and want of right is in the history", async () => {
    const { maud, otto, lusia } = await lamp();
    const unused = { ...options, onProgress: () => expect.fail("nothing may be drawn") };
    const [auditor, stranger] = [drawAndKeep(maud, INPUT, clock, unused), drawAndKeep(otto, INPUT, clock, unused)];
    await expect(auditor).rejects.toMatchObject({ code: "forbidden" });
    await expect(stranger).rejects.toMatchObject({ code: "forbidden" });
    for (const elsewhere of [{ issue: 9 }, { operatingPoint: "OP-9" }, { productCode: "XX-9" }]) {
      const run = drawAndKeep(lusia, { ...INPUT, ...elsewhere }, clock, unused);
      await expect(run).rejects.toMatchObject({ code: "not_found" });
    }
    expect(await rows("SELECT id FROM monte_carlo_runs")).toEqual([]);
    expect((await entries()).map(({ outcome, person }) => [outcome, person])).toEqual([
      ["refused", "Maud Quill"],
      ["refused", "Otto Veer"],
    ]);
  });

  it("is the second with one seed and as many draws; another seed is taken", async () => {
    const { lusia, ines } = await lamp();
    await drawAndKeep(lusia, INPUT, clock, options);
    const again = drawAndKeep(ines, INPUT, clock, options);
    await expect(again).rejects.toMatchObject({ code: "duplicate", faults: [{ path: "seed" }] });
    await drawAndKeep(ines, { ...INPUT, seed: 6 }, clock, options);
    expect(await runsOf(ines, "TF-2", 2, "OP-1")).toHaveLength(2);
  });

  it("is the second of one person while the first is drawn, and the third of all; afterwards there is room", async () => {
    const { lusia, ines, tansy } = await lamp();
    const long = { ...INPUT, draws: 1_000_000 };
    const first = held(lusia, long);
    const other = held(ines, { ...long, seed: 6 });
    await Promise.all([first.drawing, other.drawing]);
    await expect(drawAndKeep(lusia, { ...INPUT, seed: 7 }, clock, options)).rejects.toMatchObject({
      code: "too_many_attempts",
      message: expect.stringMatching(/^A run of yours is at [\d\u2009]+ of 1\u2009000\u2009000 draws: one at a time\./),
    });
    await expect(drawAndKeep(tansy, { ...INPUT, seed: 8 }, clock, options)).rejects.toMatchObject({
      message: "2 runs of other people are being drawn now. Try again in a minute.",
    });
    for (const { stop, run } of [first, other]) {
      stop.abort();
      await expect(run).rejects.toMatchObject({ name: "AbortError" });
    }
    expect(await rows("SELECT id FROM monte_carlo_runs")).toEqual([]);
    await drawAndKeep(lusia, INPUT, clock, options);
  });

  it("is one of a budget in which nothing is uncertain", async () => {
    const { lusia } = await budgetOnFile((ownerId) => ({ "010": fixedItem(ownerId, 3) }));
    const run = drawAndKeep(lusia, INPUT, clock, options);
    await expect(run).rejects.toMatchObject({ code: "evaluation_refused" });
    expect(await entries()).toEqual([]);
  });

  /** A run that is surely being drawn once its first progress is told. */
  function held(actor: Parameters<typeof drawAndKeep>[0], input: DrawIssueInput) {
    const stop = new AbortController();
    let told = (): void => undefined;
    const drawing = new Promise<void>((resolve) => (told = resolve));
    const run = drawAndKeep(actor, input, clock, { ...options, signal: stop.signal, onProgress: () => told() });
    run.catch(() => undefined);
    return { stop, drawing, run };
  }
});

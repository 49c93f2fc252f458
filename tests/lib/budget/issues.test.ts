import { describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { approvedMoves } from "@/lib/budget/approved-moves";
import { compareIssues, issuesPatch } from "@/lib/budget/compare-issues";
import { lineHistory } from "@/lib/budget/line-history";
import { budgetAt, issuesOf, trendOf } from "@/lib/budget/queries";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { database, inSnapshot, inTransaction } from "@/models/database";
import { Result } from "@/models/result";
import { addItem, approve, bluffItem, establish, fixedItem, newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";
import { cast, close, ISSUE_1, ISSUE_2, ISSUE_3, Q, revise, threeIssues } from "@/tests/support/three-issues";

withDatabase();

describe("a budget as it stands and as it stood", () => {
  it("is read from its issue: every line at its letter, every result as it was frozen", async () => {
    const people = await cast();
    await threeIssues(people);
    const now = await budgetAt(people.ines, "TF-2", "newest");
    const then = await budgetAt(people.ines, "TF-2", 2);

    const letters = (budget: typeof now) =>
      budget.state.lines.filter(({ kind }) => kind === "item").map(({ number, letter }) => [number, letter]);
    expect(letters(now)).toEqual([
      ["010", "A"],
      ["020", "–"],
    ]);
    expect(letters(then)).toEqual([
      ["010", "–"],
      ["020", "–"],
    ]);
    const predicted = (budget: typeof now) => budget.results.points[0]?.items.map((item) => item.predicted);
    // P = q · C_D · A · (1 + growth); the share is 10 % of the basic estimate, at a growth of its own.
    expect(predicted(then)).toEqual([close(Q * 0.1 * 1.2), close(Q * 0.01 * 1.2)]);
    expect(predicted(now)).toEqual([close(Q * 0.08 * 1.15), close(Q * 0.008 * 1.2)]);
    expect(now.issue).toMatchObject({
      number: 3,
      proposal: { label: "TF-2-CP-02", title: "Smaller mirrors", proposer: { name: "Tansy Merle" } },
      signatures: [{ capacity: "reviewer", printedName: "Ines Maat" }],
    });
    expect(now.product.newestIssue).toBe(3);
    expect(now.allocations).toMatchObject({ isConserved: true, unallocatedHundredths: 9000 });
  });

  it("gives back the very numbers that were evaluated, to the last bit", async () => {
    const people = await cast();
    await threeIssues(people);
    const { state, results } = await newestBudget("TF-2");
    const again = evaluateBudget(state);
    expect(results.points.map(({ items }) => items)).toEqual(again.points.map(({ items }) => items));
  });

  it("is found by a moment, and by a day of the product's calendar", async () => {
    const people = await cast();
    await threeIssues(people);
    const numberAt = async (asOf: Parameters<typeof budgetAt>[2]) =>
      (await budgetAt(people.lusia, "TF-2", asOf)).issue.number;
    expect(await numberAt({ at: ISSUE_2 })).toBe(2);
    expect(await numberAt({ at: "2026-03-10T08:59:59.999Z" })).toBe(1);
    expect(await numberAt({ day: "2026-03-10" })).toBe(2);
    expect(await numberAt({ day: "2026-03-19" })).toBe(2);
    await expect(numberAt({ day: "2026-02-27" })).rejects.toMatchObject({ code: "not_found" });
    await expect(numberAt(4)).rejects.toMatchObject({ code: "not_found" });
  });

  it("is closed to who holds no role in the product", async () => {
    const people = await cast();
    await threeIssues(people);
    const stranger = await person("Someone Else");
    for (const read of [
      () => budgetAt(stranger, "TF-2", "newest"),
      () => issuesOf(stranger, "TF-2"),
      () => trendOf(stranger, "TF-2"),
      () => compareIssues(stranger, "TF-2", 1, 2),
      () => lineHistory(stranger, "TF-2", "item", "010"),
    ]) {
      await expect(read()).rejects.toMatchObject({ code: "forbidden" });
    }
    await expect(budgetAt(people.ines, "XX-9", "newest")).rejects.toMatchObject({ code: "not_found" });
  });
});

describe("writing an issue", () => {
  it("writes only the results that changed", async () => {
    const people = await cast();
    await establish(people.lusia, "TF-2", ISSUE_1);
    const fixed = (order: number, newtons: number) => fixedItem(people.tansy.userId, newtons, { order });
    const signers = [[people.ines, "reviewer"]] as const;
    const edits = [addItem("010", fixed(10, 1)), addItem("020", fixed(20, 2))];
    await approve("TF-2", ISSUE_2, { proposer: people.tansy, signers, edits });
    await approve("TF-2", ISSUE_3, {
      proposer: people.tansy,
      signers,
      edits: [revise("020", "–", fixed(20, 3))],
    });
    const rows = await Result.findAll({ order: [["id", "ASC"]], raw: true });
    expect(rows.map(({ issue, basic }) => [issue, basic])).toEqual([
      [2, 1],
      [2, 2],
      [3, 3],
    ]);
  });

  it("makes each issue later than the one before, whatever the clock says", async () => {
    const people = await cast();
    await establish(people.lusia, "TF-2", ISSUE_3);
    const change = { proposer: people.tansy, edits: [addItem("010", bluffItem(people.tansy.userId, 0.5, 0.2))] };
    const { madeAt } = await approve("TF-2", ISSUE_1, { ...change, signers: [[people.ines, "reviewer"]] });
    expect(madeAt).toBe("2026-03-20T09:00:00.001Z");
  });

  it("binds its content: the chain fits, and a result altered behind its back is found", async () => {
    const people = await cast();
    await threeIssues(people);
    expect((await verifyChain("TF-2")).faults).toEqual([]);
    await inTransaction(async (tx) => {
      await database.query("DROP TRIGGER results_never_changes", { transaction: tx });
      await database.query("UPDATE results SET predicted = predicted - 0.01 WHERE issue = 2", { transaction: tx });
    });
    expect((await verifyChain("TF-2")).faults).toMatchObject([{ code: "content", where: "issue 2" }]);
  });
});

describe("what issues tell together", () => {
  it("is the trend of every operating point", async () => {
    const people = await cast();
    await threeIssues(people);
    const trend = await trendOf(people.lusia, "TF-2");
    expect(trend.map(({ number, at }) => [number, at])).toEqual([
      [1, ISSUE_1],
      [2, ISSUE_2],
      [3, ISSUE_3],
    ]);
    expect(trend.map(({ points }) => points[0]?.predicted)).toEqual([
      0,
      close(Q * 0.11 * 1.2),
      close(Q * (0.08 * 1.15 + 0.008 * 1.2)),
    ]);
    expect(trend[2]?.points[0]).toMatchObject({ operatingPoint: "OP-1", limit: 100, reserve: 10, standing: "inside" });
  });

  it("is what two of them differ in, field by field and as a patch", async () => {
    const people = await cast();
    await threeIssues(people);
    const { lines, items, points } = await compareIssues(people.ines, "TF-2", 2, 3);
    expect(lines).toMatchObject([{ kind: "item", number: "010", letterWas: "–", letterNow: "A" }]);
    expect(lines[0]?.fields.map(({ field, was, now }) => [field, was, now])).toContainEqual([
      "dragCoefficient",
      "0.5",
      "0.4",
    ]);
    expect(items.map(({ item, operatingPoint }) => [item, operatingPoint])).toEqual([
      ["010", "OP-1"],
      ["020", "OP-1"],
    ]);
    expect(points).toMatchObject([{ operatingPoint: "OP-1", predictedWas: close(Q * 0.11 * 1.2) }]);

    const patch = await issuesPatch(people.ines, "TF-2", 2, 3);
    expect(patch).toMatch(/^--- item 010\trevision –\n\+\+\+ item 010\trevision A\n@@/);
    expect(patch).toContain("\n-dragCoefficient: 0.5\n+dragCoefficient: 0.4\n");
    expect(patch).not.toContain("item 020");
    await expect(compareIssues(people.ines, "TF-2", 3, 3)).rejects.toMatchObject({ code: "invalid" });
  });

  it("is the same in the other direction, from a later issue back to an earlier one", async () => {
    const people = await cast();
    await threeIssues(people);
    const back = await compareIssues(people.ines, "TF-2", 3, 2);
    expect(back.lines).toMatchObject([{ number: "010", letterWas: "A", letterNow: "–" }]);
    expect(back.lines[0]?.fields.map(({ field, was, now }) => [field, was, now])).toContainEqual([
      "dragCoefficient",
      "0.4",
      "0.5",
    ]);
    expect(back.points).toMatchObject([{ operatingPoint: "OP-1", predictedNow: close(Q * 0.11 * 1.2) }]);
    const first = await compareIssues(people.ines, "TF-2", 2, 1);
    expect(first.lines.filter(({ kind }) => kind === "item")).toMatchObject([
      { number: "010", letterWas: "–", letterNow: null },
      { number: "020", letterWas: "–", letterNow: null },
    ]);
    expect(await issuesPatch(people.ines, "TF-2", 3, 2)).toContain("\n-dragCoefficient: 0.4\n+dragCoefficient: 0.5\n");
  });

  it("is the history of a line, newest revision first", async () => {
    const people = await cast();
    await threeIssues(people);
    const history = await lineHistory(people.ines, "TF-2", "item", "010");
    expect(history.map(({ letter, issue }) => [letter, issue.number, issue.proposal?.label])).toEqual([
      ["A", 3, "TF-2-CP-02"],
      ["–", 2, "TF-2-CP-01"],
    ]);
    expect(history[0]?.fields.map(({ field }) => field)).toEqual(
      expect.arrayContaining(["dragCoefficient", "grade", "evidence.0"]),
    );
    await expect(lineHistory(people.ines, "TF-2", "item", "990")).rejects.toMatchObject({ code: "not_found" });
  });

  it("is what was approved for an item in the window, with the growth that its grade released", async () => {
    const people = await cast();
    await threeIssues(people);
    const { id } = (await budgetAt(people.ines, "TF-2", "newest")).product;
    const moves = await inSnapshot((tx) => approvedMoves(id, "2026-04-15T09:00:00.000Z", 30, tx));
    // Issue 2 lies 36 days back. The share only followed: it was not edited.
    expect(moves).toEqual([
      {
        item: "010",
        operatingPoint: "OP-1",
        issue: 3,
        predicted: close(Q * (0.08 * 1.15 - 0.1 * 1.2)),
        released: close(Q * 0.08 * 0.05),
        programManagerSigned: false,
      },
    ]);
    const all = await inSnapshot((tx) => approvedMoves(id, "2026-04-01T09:00:00.000Z", 30, tx));
    expect(all.map(({ item, issue, programManagerSigned }) => [item, issue, programManagerSigned])).toEqual([
      ["010", 2, true],
      ["020", 2, true],
      ["010", 3, false],
    ]);
  });
});

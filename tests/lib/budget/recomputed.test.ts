import { describe, expect, it } from "vitest";
import { budgetAt } from "@/lib/budget/queries";
import { recomputedToday } from "@/lib/budget/recomputed-today";
import { recomputeIssue } from "@/lib/budget/recompute-issue";
import { database, inSnapshot, inTransaction } from "@/models/database";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";
import { cast, close, Q, threeIssues } from "@/tests/support/three-issues";

withDatabase();

describe("an issue recomputed today", () => {
  it("recomputes to what it stored, and tells the number that does not", async () => {
    const people = await cast();
    await threeIssues(people);
    const { id } = (await budgetAt(people.ines, "TF-2", "newest")).product;
    const recomputed = (issue: number) => inSnapshot((tx) => recomputeIssue(id, issue, tx));
    for (const issue of [1, 2, 3]) expect(await recomputed(issue)).toEqual([]);
    await inTransaction(async (tx) => {
      await database.query("DROP TRIGGER results_never_changes", { transaction: tx });
      await database.query("UPDATE results SET growth = growth * (1 + 1e-9) WHERE issue = 3", { transaction: tx });
    });
    const differences = await recomputed(3);
    expect(differences.map(({ item, quantity }) => [item, quantity])).toEqual([
      ["010", "growth"],
      ["020", "growth"],
    ]);
  });

  it("stands beside what was signed, item by item with the version of its method", async () => {
    const people = await cast();
    await threeIssues(people);
    const { points, differences } = await recomputedToday(people.lusia, "TF-2", 2);
    expect(differences).toEqual([]);
    const predicted = close(Q * 0.1 * 1.2);
    expect(points[0]?.items[0]).toMatchObject({ item: "010", method: "bluff-body", version: 1, newestVersion: 1 });
    expect(points[0]?.items[0]).toMatchObject({ frozen: predicted, today: predicted, newest: predicted });
    expect(points[0]?.total).toEqual({
      frozen: close(Q * 0.11 * 1.2),
      today: close(Q * 0.11 * 1.2),
      newest: close(Q * 0.11 * 1.2),
    });
  });

  it("is for those who may read the budget", async () => {
    const people = await cast();
    await threeIssues(people);
    const stranger = await person("Elske Winterhey");
    await expect(recomputedToday(stranger, "TF-2", 2)).rejects.toMatchObject({ code: "forbidden" });
  });
});

import { describe, expect, it } from "vitest";
import { budgetSheet, pointOf } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { reportFacts } from "@/app/(workspace)/products/[productCode]/_sheet/report-facts";
import { sideFairing } from "@/tests/support/demo-budgets";
import { frozenBudget } from "./frozen-budget";

/** The demo's own table D1: predicted values by item, allocations 030 and 040 over, 040 and 130 of grade estimated. */
describe("what a report upward says", () => {
  const budget = frozenBudget(sideFairing());
  const point = pointOf(budget, "OP-1");
  const facts = point && reportFacts(budgetSheet(budget, point));

  it("names the five greatest items, greatest first, with their share of the total", () => {
    expect(facts?.greatest.map(({ row }) => row.number)).toEqual(["020", "070", "040", "010", "100"]);
    expect(facts?.greatest[0]?.share).toBeCloseTo(9.35 / 61.59, 3);
  });

  it("names what is over its allocation, and what no document stands behind", () => {
    expect(facts?.over.map(({ number }) => number)).toEqual(["030", "040"]);
    expect(facts?.unverified.map(({ number }) => number)).toEqual(["040", "130"]);
    expect(facts?.unverifiedShare).toBeCloseTo((7.03 + 3.6) / 61.59, 3);
  });
});

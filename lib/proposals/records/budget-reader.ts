import type { Transaction } from "sequelize";
import { loadBudget, newestIssue, type LoadedBudget } from "@/lib/budget/load-budget";
import { Refusal } from "@/lib/vocabulary/refusal";

/** Budgets of one product, each issue read once within a transaction. */
export interface BudgetReader {
  at(issue: number): Promise<LoadedBudget>;
  newest(): Promise<LoadedBudget>;
}

export function budgetReader(productId: number, tx: Transaction): BudgetReader {
  const read = new Map<number, LoadedBudget>();
  const at = async (issue: number) => {
    const budget = read.get(issue) ?? (await loadBudget(productId, issue, tx));
    read.set(issue, budget);
    return budget;
  };
  const newest = async () => {
    const issue = await newestIssue(productId, tx);
    if (issue === null) throw new Refusal("wrong_state", "This product has not been established yet.");
    return at(issue);
  };
  return { at, newest };
}

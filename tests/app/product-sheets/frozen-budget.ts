import { uncertaintyToStore } from "@/lib/budget/stored-uncertainty";
import type { BudgetAt } from "@/lib/budget/views";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";

/** A state as a budget at its first issue, with one person who owns everything. */
export function frozenBudget(state: BudgetState): BudgetAt {
  const { code, name, kind } = state.product;
  const results = evaluateBudget(state);
  return {
    product: { id: 1, code, name, kind, timeZone: "UTC", newestIssue: 1 },
    issue: {
      number: 1,
      at: "2026-05-01T08:00:00.000Z",
      contentHash: "0",
      proposal: null,
      signatures: [],
      baselines: [],
    },
    state,
    results,
    uncertainty: uncertaintyToStore(state, results),
    allocations: allocationsView(state, results),
    people: [{ id: 1, name: "Tansy Brackenholt" }],
  };
}

import type { BudgetState } from "../lines/line-state";
import { circleProblems } from "./circle-problems";
import { indexState } from "./indexed-state";
import { itemProblems } from "./item-problems";
import type { Problem, ProblemOptions } from "./problem";
import { productProblems } from "./product-problems";

/** Everything that the lines of a budget may not do to one another. */
export function structureProblems(state: BudgetState, options: ProblemOptions): Problem[] {
  const indexed = indexState(state);
  return [...productProblems(indexed), ...itemProblems(indexed, options), ...circleProblems(indexed)];
}

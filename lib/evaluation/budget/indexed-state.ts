import { ALLOCATIONS_NUMBER, type AllocationsBody } from "../lines/allocations-body";
import type { FinishBody } from "../lines/finish-body";
import type { GroupBody } from "../lines/group-body";
import type { ItemBody } from "../lines/item-body";
import type { BudgetState, LineState } from "../lines/line-state";
import type { OperatingPointBody } from "../lines/operating-point-body";
import { TERMS_NUMBER, type TermsBody } from "../lines/terms-body";
import { oncePer } from "./once-per";

/** The lines in force, by kind and number; retired ones are left out. */
export interface IndexedState {
  product: BudgetState["product"];
  terms: TermsBody;
  allocations: AllocationsBody;
  items: ReadonlyMap<string, ItemBody>;
  groups: ReadonlyMap<string, GroupBody>;
  operatingPoints: ReadonlyMap<string, OperatingPointBody>;
  finishes: ReadonlyMap<string, FinishBody>;
}

/**
 * A state never changes: each edit makes another one. So it is gone through once, however many questions it is asked.
 *
 * @throws RangeError if the budget was never established: it then has no terms and no allocations
 */
export const indexState = oncePer((state: BudgetState): IndexedState => {
  const items = new Map<string, ItemBody>();
  const groups = new Map<string, GroupBody>();
  const operatingPoints = new Map<string, OperatingPointBody>();
  const finishes = new Map<string, FinishBody>();
  for (const line of state.lines) {
    if (line.retired) continue;
    if (line.kind === "item") items.set(line.number, line.body);
    if (line.kind === "group") groups.set(line.number, line.body);
    if (line.kind === "operating_point") operatingPoints.set(line.number, line.body);
    if (line.kind === "finish") finishes.set(line.number, line.body);
  }
  const terms = termsOf(state);
  return { product: state.product, terms, allocations: allocationsOf(state), items, groups, operatingPoints, finishes };
});

export function termsOf(state: BudgetState): TermsBody {
  for (const line of state.lines) if (line.kind === "terms" && line.number === TERMS_NUMBER) return line.body;
  throw new RangeError("the budget has no terms");
}

export function allocationsOf(state: BudgetState): AllocationsBody {
  for (const line of state.lines) {
    if (line.kind === "allocations" && line.number === ALLOCATIONS_NUMBER) return line.body;
  }
  throw new RangeError("the budget has no allocations sheet");
}

export function findLine(state: BudgetState, kind: LineState["kind"], number: string): LineState | undefined {
  return state.lines.find((line) => line.kind === kind && line.number === number);
}

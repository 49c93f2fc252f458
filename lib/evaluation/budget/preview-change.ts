import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { BudgetState, LineState } from "../lines/line-state";
import { applyEdits } from "./apply-edits";
import type { ApplyOptions, LineEdit, Shortfall, TransferEdit } from "./edits";
import type { Effects } from "./effects";
import { effectsOf } from "./effects-of";
import { evaluateBudget } from "./evaluate-budget";
import type { BudgetResults } from "./results";
import { unaffectedResults } from "./unaffected-results";

export interface PreviewedChange {
  after: { state: BudgetState; results: BudgetResults };
  effects: Effects;
  faults: FieldFault[];
  shortfall: Shortfall | null;
  changedLines: LineState[];
}

/** What a change would do: frozen results hold where nothing they depend on moved, the rest is computed. */
export function previewChange(
  state: BudgetState,
  frozen: BudgetResults,
  edits: readonly LineEdit[],
  transfers: readonly TransferEdit[],
  options: ApplyOptions = {},
): PreviewedChange {
  const { state: changed, faults, shortfall, changedLines } = applyEdits(state, edits, transfers, options);
  const results = evaluateBudget(changed, { frozen: unaffectedResults(state, changed, frozen) });
  const edited = edits.flatMap(({ kind, number }) => (kind === "item" ? [number] : []));
  return {
    after: { state: changed, results },
    effects: effectsOf(frozen, results, edited),
    faults,
    shortfall,
    changedLines,
  };
}

import type { PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";

import type { BudgetSheet } from "../_sheet/budget-sheet";

/** What stands on a sheet of its uncertainty: the frozen numbers, or why there are none. */
export type SheetUncertainty =
  | { state: "known"; frozen: PointUncertainty }
  | { state: "not_kept" }
  | { state: "no_items" }
  | { state: "exact" }
  | { state: "refused"; items: readonly string[] };

export function sheetUncertainty({ uncertainty, point }: BudgetSheet): SheetUncertainty {
  if (uncertainty === null) return { state: "not_kept" };
  if ("refused" in uncertainty) return { state: "refused", items: uncertainty.refused };
  if (point.items.length === 0) return { state: "no_items" };
  return uncertainty.basic.standardUncertainty === 0 ? { state: "exact" } : { state: "known", frozen: uncertainty };
}

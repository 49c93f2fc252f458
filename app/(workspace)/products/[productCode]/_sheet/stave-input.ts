import type { SheetDataRow } from "@/lib/budget/sheet-data";
import type { PointTotals } from "@/lib/evaluation/budget/results";

import type { StaveInput } from "../_pictures/stave-layout";
import type { BudgetRow } from "./budget-sheet";

/** What the stave draws: the items in the order of the sheet, and the totals as frozen. */
export function staveInput(rows: readonly (BudgetRow | SheetDataRow)[], point: PointTotals): StaveInput {
  const items = rows.filter((row) => row.kind === "item" && !isRefused(row));
  const { basic, growth, predicted } = point.totals;

  return {
    items: items.map(({ number, name, basic: newtons }) => ({ number, name, basic: newtons })),
    basic,
    growth,
    predicted,
    limit: point.limitHundredths / 100,
    reserve: point.reserveHundredths / 100,
  };
}

function isRefused(row: BudgetRow | SheetDataRow): boolean {
  if (row.kind === "group") return false;
  return "result" in row ? row.result.refused !== null : row.refused;
}

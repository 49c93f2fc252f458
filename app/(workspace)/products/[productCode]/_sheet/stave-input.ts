import type { StaveInput } from "../_pictures/stave-layout";
import type { BudgetSheet, ItemRow } from "./budget-sheet";

/** What the stave draws: the items in the order of the sheet, and the totals as frozen. */
export function staveInput({ rows, point }: BudgetSheet): StaveInput {
  const items = rows.filter((row): row is ItemRow => row.kind === "item" && row.result.refused === null);
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

import { formatNewtons } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import type { BudgetSheet, ItemRow } from "../_sheet/budget-sheet";
import { itemWorking, step } from "./item-working";
import type { Working } from "./working";

/** How uncertain an item's basic estimate is, as its issue froze it; null where nothing is kept of it. */
export function itemUncertaintyWorking(sheet: BudgetSheet, row: ItemRow): Working | null {
  const u = row.result.answer?.standardUncertainty;
  if (u === undefined) return null;
  const part = row.basic === 0 ? [] : [`${formatPercent(u / Math.abs(row.basic), 1)} of the basic estimate.`];

  return {
    ...itemWorking(sheet, row, "Standard uncertainty"),
    answer: formatNewtons(u),
    steps: [
      step({
        quantity: "Standard uncertainty of the basic estimate",
        symbol: "u(B)",
        formula: "u² = Σ_c (∂B/∂c · u_c)²",
        value: formatSignificant(u),
        source:
          "JCGM 100:2008, eq. (10), over its own inputs, the operating point’s, and the biases of its method and its line.",
      }),
    ],
    sentences: [...part, "Items share causes: their uncertainties do not add up to the total’s."],
  };
}

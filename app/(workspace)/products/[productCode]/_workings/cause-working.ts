import { formatNewtons } from "@/lib/units/format-newtons";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import type { BudgetSheet } from "../_sheet/budget-sheet";
import { causeRows } from "../_uncertainty/cause-rows";
import { sheetUncertainty } from "../_uncertainty/frozen-uncertainty";
import { step } from "./item-working";
import { emptyWorking } from "./total-working";
import { GUM } from "./total-uncertainty-working";
import type { Working } from "./working";

/** What one cause does to ΣB, and what part of its variance that is. */
export function causeWorking(sheet: BudgetSheet, key: string | null): Working | null {
  const uncertainty = sheetUncertainty(sheet);
  if (uncertainty.state !== "known") return null;
  const { frozen } = uncertainty;
  const row = causeRows(sheet, frozen).find((each) => each.key === key);
  if (!row) return null;
  const { standardUncertainty } = frozen.basic;
  const [effect, total] = [formatSignificant(row.newtons), formatSignificant(standardUncertainty)];

  return {
    ...emptyWorking(`${row.what}, ${row.where}, at ${sheet.point.operatingPoint}`),
    answer: `${formatPercent(row.share, 1)} of the variance of ΣB`,
    steps: [
      step({
        quantity: "Its standard uncertainty",
        symbol: row.symbol === "" ? "u_c" : `u(${row.symbol})`,
        formula: row.value === null ? "" : `value ${row.value}`,
        value: row.standardUncertainty,
        unit: "",
        source: row.basis.kind === "source" ? `Source: ${row.basis.text}` : `Judgement: ${row.basis.text}`,
      }),
      step({
        quantity: "What one standard uncertainty of it does to ΣB",
        symbol: "",
        formula: "Σ_i ∂B_i/∂c · u_c",
        value: effect,
        source: GUM,
      }),
      step({
        quantity: "Share of the variance of ΣB",
        symbol: "",
        formula: "(Σ_i ∂B_i/∂c · u_c)² / u²(ΣB)",
        withValues: `(${effect} / ${total})²`,
        value: formatPercent(row.share, 1),
        unit: "",
      }),
    ],
    sentences: [`u(ΣB) is ${formatNewtons(standardUncertainty)}. The shares of all causes add up to 100 %.`],
  };
}

import { COVERAGE_95, type PointUncertainty } from "@/lib/evaluation/uncertainty/budget-uncertainty";
import { formatHundredths, formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatExact, formatFixed, formatSignificant } from "@/lib/units/format-number";

import type { BudgetSheet } from "../_sheet/budget-sheet";
import { causeRows } from "../_uncertainty/cause-rows";
import { chanceText } from "../_uncertainty/chance-text";
import { sheetUncertainty } from "../_uncertainty/frozen-uncertainty";
import { step } from "./item-working";
import { emptyWorking } from "./total-working";
import type { Figure, Working, WorkingStep } from "./working";

export const GUM = "JCGM 100:2008, eqs. (10) and (13): to first order, what items share counted once over all of them.";
const COVERAGE = formatFixed(COVERAGE_95, 3);

/** How a number of the total's uncertainty came about, from what the issue froze. */
export function totalUncertaintyWorking(sheet: BudgetSheet, figure: Figure): Working | null {
  const uncertainty = sheetUncertainty(sheet);
  if (uncertainty.state !== "known") return null;
  const { frozen } = uncertainty;
  const shared = { links: [{ path: pathOf(sheet), label: "All causes, and the runs of this issue" }] };

  switch (figure) {
    case "interval":
      return { ...intervalWorking(sheet, frozen), ...shared };
    case "standardUncertainty":
      return { ...spreadWorking(sheet, frozen), ...shared };
    case "basicExceedsLimit":
      return { ...exceedanceWorking(sheet, frozen, "ΣB"), ...shared };
    case "predictedExceedsLimit":
      return { ...exceedanceWorking(sheet, frozen, "ΣB + ΣG"), ...shared };
    default:
      return null;
  }
}

function pathOf({ budget, point }: BudgetSheet): string {
  return `uncertainty?issue=${budget.issue.number}&point=${encodeURIComponent(point.operatingPoint)}`;
}

function intervalWorking({ point }: BudgetSheet, { basic }: PointUncertainty): Working {
  const { value, standardUncertainty, low95, high95 } = basic;
  const end = (quantity: string, sign: string, newtons: number): WorkingStep =>
    step({
      quantity,
      symbol: "",
      formula: `ΣB ${sign} ${COVERAGE} · u(ΣB)`,
      withValues: `${formatNewtonsNumber(value)} ${sign} ${COVERAGE} · ${formatSignificant(standardUncertainty)}`,
      value: formatNewtonsNumber(newtons),
    });
  return {
    ...emptyWorking(`95 % interval of ΣB at ${point.operatingPoint} ${point.name}`),
    answer: `${formatNewtonsNumber(low95)} to ${formatNewtons(high95)}`,
    steps: [spreadStep(basic.standardUncertainty, "ΣB"), end("Lower end", "−", low95), end("Upper end", "+", high95)],
    sentences: ["The sum is taken as normal: 2.5 % lie below the interval and 2.5 % above. Growth is not in it."],
  };
}

function spreadWorking(sheet: BudgetSheet, frozen: PointUncertainty): Working {
  const { standardUncertainty } = frozen.basic;
  const others = frozen.otherCauses;
  return {
    ...emptyWorking(`Standard uncertainty of ΣB at ${sheet.point.operatingPoint} ${sheet.point.name}`),
    answer: formatNewtons(standardUncertainty),
    steps: [spreadStep(standardUncertainty, "ΣB")],
    terms: [
      ...causeRows(sheet, frozen).map(({ what, where, newtons }) => ({
        label: `${what}, ${where}`,
        value: formatSignificant(newtons),
      })),
      { label: "u(ΣB), root of the sum of their squares", value: formatNewtonsNumber(standardUncertainty) },
    ],
    sentences: [
      "Each line is what one standard uncertainty of that cause does to ΣB, over all items that it reaches.",
      ...(others.count > 0 ? [`${others.count} further causes have less than 0.1 % of the variance each.`] : []),
    ],
  };
}

/** What is needed for a probability: how far the limit lies, in standard uncertainties. */
function exceedanceWorking({ point }: BudgetSheet, frozen: PointUncertainty, of: "ΣB" | "ΣB + ΣG"): Working {
  const { value, standardUncertainty } = of === "ΣB" ? frozen.basic : frozen.predicted;
  const chance = of === "ΣB" ? frozen.basicExceedsLimit : frozen.predictedExceedsLimit;
  const distance = (point.limitHundredths / 100 - value) / standardUncertainty;
  return {
    ...emptyWorking(`Probability that ${of} exceeds the limit at ${point.operatingPoint} ${point.name}`),
    answer: chanceText(chance),
    steps: [
      spreadStep(standardUncertainty, of),
      step({
        quantity: "Distance to the limit, in standard uncertainties",
        symbol: "z",
        formula: `z = (limit − (${of})) / u(${of})`,
        withValues: `(${formatHundredths(point.limitHundredths)} − ${formatNewtonsNumber(value)}) / ${formatSignificant(standardUncertainty)}`,
        value: formatSignificant(distance),
        unit: "",
      }),
      step({
        quantity: "Probability beyond it",
        symbol: "",
        formula: "1 − Φ(z)",
        value: formatSignificant(chance),
        unit: "",
        source: "The sum is taken as normal.",
      }),
    ],
    sentences:
      of === "ΣB"
        ? ["Growth is left out: this is the chance that the basic estimates alone are too much."]
        : [
            `Growth is a fraction of each basic estimate and moves with it. u(ΣB) alone is ${formatExact(Number(frozen.basic.standardUncertainty.toPrecision(3)))} N.`,
          ],
  };
}

function spreadStep(standardUncertainty: number, of: "ΣB" | "ΣB + ΣG"): WorkingStep {
  return step({
    quantity: "Combined standard uncertainty",
    symbol: `u(${of})`,
    formula: of === "ΣB" ? "u² = Σ_c (Σ_i ∂B_i/∂c · u_c)²" : "u² = Σ_c (Σ_i (1 ± g_i) · ∂B_i/∂c · u_c)²",
    value: formatSignificant(standardUncertainty),
    source: GUM,
  });
}

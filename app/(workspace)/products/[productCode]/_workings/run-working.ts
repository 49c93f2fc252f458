import type { RunView } from "@/lib/budget/monte-carlo/runs-of";
import { formatHundredths, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatExact, formatSignificant } from "@/lib/units/format-number";

import type { BudgetSheet } from "../_sheet/budget-sheet";
import { chanceText } from "../_uncertainty/chance-text";
import { step } from "./item-working";
import { emptyWorking } from "./total-working";
import type { Working, WorkingStep } from "./working";

const METHOD =
  "JCGM 101:2008, sec. 7: what items share is drawn once for all of them; every cause is normal, cut off where it cannot be.";

/** How the numbers of a kept run came about, and how far another seed would move them. */
export function runWorking({ point }: BudgetSheet, run: RunView): Working {
  const { result, draws, seed } = run;
  return {
    ...emptyWorking(`Run of ${formatExact(draws)} draws with seed ${seed} at ${point.operatingPoint} ${point.name}`),
    answer: `ΣB from ${formatNewtonsNumber(result.basic.low95)} to ${formatNewtonsNumber(result.basic.high95)} N in 95 % of the draws`,
    steps: [...momentSteps(result), ...endSteps(result), ...chanceSteps(run, point.limitHundredths)],
    sentences: [
      METHOD,
      `Asked by ${run.by}. Recipe ${run.recipe}. Drawn from ${run.inputHash}; what came out is ${run.resultHash}.`,
      ...(result.refusedDraws > 0
        ? [`${formatExact(result.refusedDraws)} draws were refused by a method and are left out.`]
        : []),
    ],
  };
}

function momentSteps({ basic, predicted, draws, refusedDraws }: RunView["result"]): WorkingStep[] {
  const kept = draws - refusedDraws;
  return [
    step({
      quantity: "Mean of ΣB",
      symbol: "",
      formula: "Σ ΣB_k / M",
      value: formatNewtonsNumber(basic.mean),
      range: `another seed moves it by about ${formatSignificant(basic.standardDeviation / Math.sqrt(kept), 2)} N`,
    }),
    step({
      quantity: "Standard deviation of ΣB",
      symbol: "u(ΣB)",
      formula: "√(Σ (ΣB_k − mean)² / (M − 1))",
      value: formatSignificant(basic.standardDeviation, 4),
      range: `another seed moves it by about ${formatSignificant(basic.standardDeviation / Math.sqrt(2 * kept), 2)} N`,
    }),
    step({
      quantity: "Standard deviation of ΣB + ΣG",
      symbol: "u(ΣB + ΣG)",
      value: formatSignificant(predicted.standardDeviation, 4),
    }),
  ];
}

function endSteps({ basic }: RunView["result"]): WorkingStep[] {
  return [
    step({ quantity: "Below it lie 2.5 % of the draws", symbol: "", value: formatNewtonsNumber(basic.low95) }),
    step({ quantity: "Above it lie 2.5 % of the draws", symbol: "", value: formatNewtonsNumber(basic.high95) }),
  ];
}

function chanceSteps({ result, draws }: RunView, limitHundredths: number): WorkingStep[] {
  const kept = draws - result.refusedDraws;
  const over = (quantity: string, part: number): WorkingStep =>
    step({
      quantity,
      symbol: "",
      formula: `draws above the limit ${formatHundredths(limitHundredths)} N / M`,
      withValues: `${formatExact(Math.round(part * kept))} / ${formatExact(kept)}`,
      value: chanceText(part),
      unit: "",
      range: `another seed moves it by about ${chanceText(Math.sqrt((part * (1 - part)) / kept))}`,
    });
  return [
    over("ΣB + ΣG exceeds the limit", result.predictedExceedsLimit),
    over("ΣB alone exceeds the limit", result.basicExceedsLimit),
  ];
}

import type { Transaction } from "sequelize";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetResults, ItemResult } from "@/lib/evaluation/budget/results";
import { loadBudget } from "./load-budget";
import { loadUncertainty } from "./load-uncertainty";
import { uncertaintyDifferences } from "./recompute-uncertainty";
import { agree, type RecomputedDifference } from "./recomputed-difference";
import { uncertaintyToStore } from "./stored-uncertainty";

/**
 * Recomputes an issue with the versions that its lines name, its results and their uncertainty to first order; answers
 * every number that differs from the stored one.
 */
export async function recomputeIssue(
  productId: number,
  issue: number,
  tx: Transaction,
): Promise<RecomputedDifference[]> {
  const { state, results } = await loadBudget(productId, issue, tx);
  const again = evaluateBudget(state);
  const frozen = await loadUncertainty(productId, issue, tx);
  const uncertainty = frozen ? uncertaintyDifferences(frozen, uncertaintyToStore(state, again)) : [];
  return [...resultDifferences(results, again), ...uncertainty];
}

function resultDifferences(results: BudgetResults, again: BudgetResults): RecomputedDifference[] {
  return results.points.flatMap((point, index) => {
    const other = again.points[index];
    const key = { operatingPoint: point.operatingPoint };
    if (other?.operatingPoint !== point.operatingPoint)
      return [{ ...key, item: "", quantity: "point", stored: 1, recomputed: 0 }];
    const totals = differences({ ...point.totals }, { ...other.totals }).map((each) => ({ ...key, item: "", ...each }));
    const items = point.items.flatMap((result) =>
      differences(numbersOf(result), numbersOf(itemOf(again, point.operatingPoint, result.item))).map((each) => ({
        ...key,
        item: result.item,
        ...each,
      })),
    );
    return [...totals, ...items];
  });
}

function differences(stored: Record<string, number>, recomputed: Record<string, number>) {
  const quantities = [...new Set([...Object.keys(stored), ...Object.keys(recomputed)])];
  return quantities
    .map((quantity) => ({
      quantity,
      stored: stored[quantity] ?? Number.NaN,
      recomputed: recomputed[quantity] ?? Number.NaN,
    }))
    .filter((pair) => !agree(pair.stored, pair.recomputed));
}

/** Every number of a result, those of the method's answer by name; notes by how often each code stands there. */
function numbersOf(result: ItemResult | undefined): Record<string, number> {
  if (!result) return {};
  const { basic, growthFraction, growth, predicted, methodVersion, answer, notes } = result;
  const numbers: Record<string, number> = { basic, growthFraction, growth, predicted, methodVersion };
  for (const [name, value] of Object.entries(answer ?? {}))
    if (typeof value === "number") numbers[`answer.${name}`] = value;
  for (const { code } of notes) numbers[`note.${code}`] = (numbers[`note.${code}`] ?? 0) + 1;
  return numbers;
}

function itemOf({ points }: BudgetResults, operatingPoint: string, item: string): ItemResult | undefined {
  const point = points.find((each) => each.operatingPoint === operatingPoint);
  return point?.items.find((result) => result.item === item);
}

import type { Transaction } from "sequelize";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { indexState } from "@/lib/evaluation/budget/indexed-state";
import type { BudgetResults, ItemResult, PointResult } from "@/lib/evaluation/budget/results";
import { withNewestVersions } from "@/lib/evaluation/budget/with-newest-versions";
import { newestVersionOf } from "@/lib/evaluation/methods/method-versions";
import type { MethodName } from "@/lib/evaluation/methods/method-name";
import type { Actor } from "@/lib/vocabulary/actor";
import { inSnapshot } from "@/models/database";
import { loadBudget } from "./load-budget";
import { readableProduct } from "./queries";
import { recomputeIssue } from "./recompute-issue";
import type { RecomputedDifference } from "./recomputed-difference";

/** Newtons of an item as they were frozen, as the same versions give them today, and by the newest version. */
export interface RecomputedItem {
  item: string;
  name: string;
  method: MethodName;
  version: number;
  newestVersion: number;
  frozen: number;
  today: number | null;
  newest: number | null;
}

export interface RecomputedPoint {
  operatingPoint: string;
  name: string;
  items: RecomputedItem[];
  /** Sums of the predicted values. */
  total: { frozen: number; today: number; newest: number };
}

export interface RecomputedIssue {
  productCode: string;
  issue: number;
  points: RecomputedPoint[];
  /** Every number of the issue that today's code does not give again; empty is the proof. */
  differences: RecomputedDifference[];
}

/** What an issue keeps, beside what the code of today makes of the same lines. */
export function recomputedToday(actor: Actor, productCode: string, issue: number): Promise<RecomputedIssue> {
  return inSnapshot(async (tx: Transaction) => {
    const product = await readableProduct(actor, productCode, tx);
    const { state, results } = await loadBudget(product.id, issue, tx);
    const { items } = indexState(state);
    const today = evaluateBudget(state);
    const newest = evaluateBudget(withNewestVersions(state));
    const points = results.points.map(({ operatingPoint, name, items: frozen, totals }) => ({
      operatingPoint,
      name,
      items: frozen.flatMap((result) => {
        const body = items.get(result.item);
        if (!body) return [];
        return {
          item: result.item,
          name: body.name,
          method: body.method,
          version: result.methodVersion,
          newestVersion: newestVersionOf(body.method),
          frozen: result.predicted,
          today: predictedOf(today, operatingPoint, result.item),
          newest: predictedOf(newest, operatingPoint, result.item),
        };
      }),
      total: {
        frozen: totals.predicted,
        today: totalOf(today, operatingPoint),
        newest: totalOf(newest, operatingPoint),
      },
    }));
    return { productCode, issue, points, differences: await recomputeIssue(product.id, issue, tx) };
  });
}

function pointOf({ points }: BudgetResults, operatingPoint: string): PointResult | undefined {
  return points.find((point) => point.operatingPoint === operatingPoint);
}

/** null where the item is refused. */
function predictedOf(results: BudgetResults, operatingPoint: string, item: string): number | null {
  const result: ItemResult | undefined = pointOf(results, operatingPoint)?.items.find((each) => each.item === item);
  return result && !result.refused ? result.predicted : null;
}

function totalOf(results: BudgetResults, operatingPoint: string): number {
  return pointOf(results, operatingPoint)?.totals.predicted ?? Number.NaN;
}

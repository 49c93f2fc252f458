import { roundStored } from "@/lib/units/rounding";
import type { BudgetResults } from "../budget/results";
import type { BudgetState } from "../lines/line-state";
import { budgetModel, type BudgetModel } from "./budget-model";
import type { Cause } from "./cause";
import { contributionsOfItems, type ItemContributions } from "./contributions-of-items";
import { normalBeyond } from "./normal-distribution";
import { normalQuantile } from "./normal-quantile";

/** Standard uncertainties to each side of the mean between which 95 % of a normal distribution lie. */
export const COVERAGE_95 = normalQuantile(0.975);
/** Causes with a smaller part of the variance are told together. */
const SMALLEST_SHARE = 0.001;

export interface CauseShare extends Pick<Cause, "key" | "origin" | "name" | "field"> {
  /** N, signed: what one standard uncertainty of the cause does to ΣB. */
  newtons: number;
  /** Of the variance of ΣB. */
  share: number;
}

/** How uncertain a budget is at one operating point, to first order. Newtons, 12 significant digits. */
export interface PointUncertainty {
  operatingPoint: string;
  basic: { value: number; standardUncertainty: number; low95: number; high95: number };
  predicted: { value: number; standardUncertainty: number };
  /** Probability that ΣB alone exceeds the limit. */
  basicExceedsLimit: number;
  /** Probability that ΣB + ΣG exceeds it. */
  predictedExceedsLimit: number;
  items: { item: string; standardUncertainty: number }[];
  /** The greatest first. */
  causes: CauseShare[];
  otherCauses: { count: number; share: number };
}

/** A budget with an item that has no result has no sum to be uncertain about: those items are named instead. */
export type PointUncertaintyOutcome = PointUncertainty | { operatingPoint: string; refused: string[] };

/**
 * First-order uncertainty of a budget at one of its operating points.
 *
 *   u²(ΣB) = Σ_c (Σ_i ∂B_i/∂c · u_c)²
 *
 * Every cause counts once over all items it reaches, which is the sum over the variances and covariances of the items.
 * Causes are independent of each other; probabilities and interval take the sum as normal.
 *
 * Source: JCGM 100:2008 (GUM), eqs. (10) and (13). Worked: reference vector of six items, u = 1.3771 N where items taken
 * as independent give 1.1372 N.
 *
 * @param results of that very state
 * @throws RangeError if the budget has no such operating point
 */
export function budgetUncertainty(
  state: BudgetState,
  results: BudgetResults,
  operatingPoint: string,
): PointUncertaintyOutcome {
  const point = results.points.find((each) => each.operatingPoint === operatingPoint);
  if (!point) throw new RangeError(`no results at operating point ${operatingPoint}`);
  const model = budgetModel(state, point);
  return "refused" in model ? { operatingPoint, refused: model.refused } : firstOrder(model);
}

/** First-order uncertainty of a model of a budget. */
export function firstOrder(model: BudgetModel): PointUncertainty {
  const perItem = contributionsOfItems(model);
  const onBasic = sumOverItems(model, perItem, () => 1);
  // Growth is a fraction of the magnitude: that of a saving shrinks what it takes away.
  const onPredicted = sumOverItems(
    model,
    perItem,
    ({ basic, growthFraction }) => 1 + Math.sign(basic) * growthFraction,
  );
  const basic = model.items.reduce((total, item) => total + item.basic, 0);
  const growth = model.items.reduce((total, item) => total + Math.abs(item.basic) * item.growthFraction, 0);
  const [u, uPredicted] = [rootOfSquares(onBasic), rootOfSquares(onPredicted)];
  return {
    operatingPoint: model.operatingPoint,
    basic: {
      value: roundStored(basic),
      standardUncertainty: roundStored(u),
      low95: roundStored(basic - COVERAGE_95 * u),
      high95: roundStored(basic + COVERAGE_95 * u),
    },
    predicted: { value: roundStored(basic + growth), standardUncertainty: roundStored(uPredicted) },
    basicExceedsLimit: roundStored(exceedance(model.limit, basic, u)),
    predictedExceedsLimit: roundStored(exceedance(model.limit, basic + growth, uPredicted)),
    items: model.items.map(({ item }, index) => ({
      item,
      standardUncertainty: roundStored(rootOfSquares([...(perItem[index]?.values() ?? [])])),
    })),
    ...sharesOf(model.causes, onBasic, u),
  };
}

/** Newtons by place of the cause, each item's counted with a weight. */
function sumOverItems(
  { items, causes }: BudgetModel,
  perItem: readonly ItemContributions[],
  weight: (item: BudgetModel["items"][number]) => number,
): number[] {
  const sums = causes.map(() => 0);
  items.forEach((item, index) => {
    for (const [place, newtons] of perItem[index] ?? []) sums[place] = (sums[place] ?? 0) + weight(item) * newtons;
  });
  return sums;
}

function sharesOf(
  causes: readonly Cause[],
  contributions: readonly number[],
  u: number,
): Pick<PointUncertainty, "causes" | "otherCauses"> {
  if (u === 0) return { causes: [], otherCauses: { count: 0, share: 0 } };
  const all = causes.map(({ key, origin, name, field }, place) => {
    const newtons = contributions[place] ?? 0;
    return { key, origin, name, field, newtons: roundStored(newtons), share: roundStored((newtons / u) ** 2) };
  });
  const told = all.filter(({ share }) => share >= SMALLEST_SHARE).sort((one, other) => other.share - one.share);
  const others = all.filter(({ share }) => share < SMALLEST_SHARE);
  const share = roundStored(others.reduce((sum, cause) => sum + cause.share, 0));
  return { causes: told, otherCauses: { count: others.length, share } };
}

/** What is known exactly exceeds a limit or does not. */
function exceedance(limit: number, value: number, u: number): number {
  return u === 0 ? Number(value > limit) : normalBeyond((limit - value) / u);
}

function rootOfSquares(newtons: readonly number[]): number {
  return Math.sqrt(newtons.reduce((sum, each) => sum + each ** 2, 0));
}

import type { BudgetAt } from "@/lib/budget/views";
import { type IndexedState, indexState } from "@/lib/evaluation/budget/indexed-state";
import type { ItemResult, PointResult } from "@/lib/evaluation/budget/results";
import { type GroupSheetRow, type ItemSheetRow, sheetRows } from "@/lib/evaluation/budget/sheet-rows";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { type MeasureBasis, measureBasis } from "@/lib/evaluation/measures/measure-basis";
import type { PointUncertaintyOutcome } from "@/lib/evaluation/uncertainty/budget-uncertainty";

export interface ItemRow extends ItemSheetRow {
  owner: string;
}

export type GroupRow = GroupSheetRow;

export type BudgetRow = ItemRow | GroupRow;

/** A budget at one operating point as its sheet shows it. */
export interface BudgetSheet {
  budget: BudgetAt;
  indexed: IndexedState;
  point: PointResult;
  /** To first order, as the issue froze it; null where it keeps nothing of it. */
  uncertainty: PointUncertaintyOutcome | null;
  /** Allocations are set at the reference operating point; at another one a margin is no flag. */
  isReference: boolean;
  /** Groups ahead of what they hold. */
  rows: BudgetRow[];
  retired: LineState[];
}

/** The operating point asked for, else the one that stands worst. */
export function pointOf(budget: BudgetAt, asked: string | undefined): PointResult | undefined {
  const { points, worstPoint } = budget.results;
  return points.find(({ operatingPoint }) => operatingPoint === (asked ?? worstPoint));
}

export function budgetSheet(budget: BudgetAt, point: PointResult): BudgetSheet {
  const indexed = indexState(budget.state);
  const uncertainty = budget.uncertainty?.points.find((each) => each.operatingPoint === point.operatingPoint) ?? null;
  const uncertainties = uncertaintiesOf(uncertainty);
  const people = new Map(budget.people.map(({ id, name }) => [id, name]));
  const rows = sheetRows(budget.state, point).map((row): BudgetRow => {
    if (row.kind === "group") return row;
    const owner = people.get(row.body.ownerId) ?? `person ${row.body.ownerId}`;
    return { ...row, owner, result: withUncertainty(row.result, uncertainties.get(row.number)) };
  });

  return {
    budget,
    indexed,
    point,
    uncertainty,
    isReference: indexed.terms.referenceOperatingPoint === point.operatingPoint,
    rows,
    retired: budget.state.lines.filter(({ retired }) => retired),
  };
}

/** What the forces of the sheet are referred to when they are read in another measure. */
export function sheetBasis({ budget, indexed, point }: BudgetSheet): MeasureBasis {
  const hoursPerYear = indexed.operatingPoints.get(point.operatingPoint)?.hoursPerYear ?? null;
  return measureBasis(budget.product.kind, indexed.terms, point.stream, hoursPerYear);
}

function uncertaintiesOf(outcome: PointUncertaintyOutcome | null): ReadonlyMap<string, number> {
  if (outcome === null || "refused" in outcome) return new Map();
  return new Map(outcome.items.map(({ item, standardUncertainty }) => [item, standardUncertainty]));
}

/** A result is kept without its uncertainty: that stands with the issue, where what items share is counted once. */
function withUncertainty(result: ItemResult, standardUncertainty: number | undefined): ItemResult {
  if (!result.answer || standardUncertainty === undefined) return result;
  return { ...result, answer: { ...result.answer, standardUncertainty } };
}

import type { BudgetSheet, ItemRow } from "./budget-sheet";
import { isOver } from "./chosen-rows";

export interface ReportItem {
  row: ItemRow;
  /** Of the predicted total without savings. */
  share: number;
}

/** What a report upward says of the items of a sheet. */
export interface ReportFacts {
  /** The greatest predicted values, greatest first. */
  greatest: ReportItem[];
  /** Over their allocation; empty at an operating point where allocations are not set. */
  over: ItemRow[];
  /** Of the lowest grade: an estimate that no document stands behind yet. */
  unverified: ItemRow[];
  /** Of the predicted total without savings. */
  unverifiedShare: number;
}

const LISTED = 5;

export function reportFacts({ rows, point, isReference }: BudgetSheet): ReportFacts {
  const total = point.totals.predictedWithoutSavings;
  const items = rows.filter((row): row is ItemRow => row.kind === "item" && row.result.refused === null);
  const contributions = items.filter(({ body }) => !body.saving);
  const unverified = contributions.filter(({ body }) => body.grade === "estimated");
  const shareOf = (newtons: number) => (total > 0 ? newtons / total : 0);

  return {
    greatest: contributions
      .toSorted((one, other) => other.predicted - one.predicted)
      .slice(0, LISTED)
      .map((row) => ({ row, share: shareOf(row.predicted) })),
    over: isReference ? items.filter(isOver) : [],
    unverified,
    unverifiedShare: shareOf(unverified.reduce((sum, { predicted }) => sum + predicted, 0)),
  };
}

import { allocatedSum, holderTree, openSheet } from "@/lib/evaluation/budget/allocation-sheet";

import type { BudgetSheet } from "./budget-sheet";

/** Σ allocations + unallocated + reserve = limit, at the reference operating point, in hundredths of a newton. */
export interface Conservation {
  operatingPoint: string;
  allocated: number;
  unallocated: number;
  reserve: number;
  limit: number;
  holds: boolean;
}

export function conservationOf({ budget, indexed }: BudgetSheet): Conservation | null {
  const reference = budget.results.points.find(
    ({ operatingPoint }) => operatingPoint === indexed.terms.referenceOperatingPoint,
  );
  if (!reference) return null;
  const allocated = allocatedSum(openSheet(indexed.allocations), holderTree(budget.state.lines));
  const unallocated = indexed.allocations.unallocatedHundredths;
  const { reserveHundredths: reserve, limitHundredths: limit } = reference;

  return {
    operatingPoint: reference.operatingPoint,
    allocated,
    unallocated,
    reserve,
    limit,
    holds: allocated + unallocated + reserve === limit,
  };
}

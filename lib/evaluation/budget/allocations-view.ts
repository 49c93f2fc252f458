import { toHundredths } from "@/lib/units/rounding";
import type { BudgetState } from "../lines/line-state";
import { allocatedSum, heldInside, holderTree, keyOf, openSheet } from "./allocation-sheet";
import { itemsOfGroup } from "./group-tree";
import { indexState } from "./indexed-state";
import type { BudgetResults } from "./results";
import { limitAndReserve } from "./roll-up";
import { sheetOrder } from "./sheet-order";

/** One item or group beside what it may use, at the reference operating point. */
export interface AllocationLine {
  kind: "item" | "group";
  number: string;
  name: string;
  /** How many groups it stands in. */
  depth: number;
  /** null: no allocation, which is not the same as none left. */
  allocationHundredths: number | null;
  /** Newtons; of a group all its items together. null where an item has no result. */
  predicted: number | null;
  /** Allocation − predicted, both rounded to 0.01 N. */
  marginHundredths: number | null;
  isOver: boolean;
  /** Of an allocated group: what its members don't hold. */
  freeHundredths: number | null;
}

export interface AllocationsView {
  operatingPoint: string;
  lines: AllocationLine[];
  allocatedHundredths: number;
  unallocatedHundredths: number;
  reserveHundredths: number;
  limitHundredths: number;
  /** Allocated + unallocated + reserve = limit, and every ceiling kept. */
  isConserved: boolean;
}

/** Allocations against predicted values, in the order of the sheet, with the check that nothing got lost. */
export function allocationsView(state: BudgetState, results: BudgetResults): AllocationsView {
  const indexed = indexState(state);
  const tree = holderTree(state.lines);
  const sheet = openSheet(indexed.allocations);
  const operatingPoint = indexed.terms.referenceOperatingPoint;
  const point = results.points.find((each) => each.operatingPoint === operatingPoint);
  const predictedOf = (item: string) =>
    point?.items.find((each) => each.item === item && each.refused === null)?.predicted;

  const lines = sheetOrder(indexed).map(({ kind, number, depth }): AllocationLine => {
    const held = sheet.rows.get(keyOf(kind, number))?.hundredths ?? null;
    const members = kind === "item" ? [number] : itemsOfGroup(indexed, number);
    const predicted = sumOrNull(members.map(predictedOf));
    const margin = held === null || predicted === null ? null : held - toHundredths(predicted);
    return {
      kind,
      number,
      name: (kind === "item" ? indexed.items : indexed.groups).get(number)?.name ?? number,
      depth,
      allocationHundredths: held,
      predicted,
      marginHundredths: margin,
      isOver: margin !== null && margin < 0,
      freeHundredths: kind === "group" && held !== null ? held - heldInside(number, sheet, tree) : null,
    };
  });

  const limits = limitAndReserve(operatingPoint, indexed);
  const allocatedHundredths = allocatedSum(sheet, tree);
  const sum = allocatedHundredths + sheet.unallocated + limits.reserveHundredths;
  const isWithin = lines.every(({ freeHundredths }) => freeHundredths === null || freeHundredths >= 0);
  return {
    operatingPoint,
    lines,
    allocatedHundredths,
    unallocatedHundredths: sheet.unallocated,
    ...limits,
    isConserved: sum === limits.limitHundredths && sheet.unallocated >= 0 && isWithin,
  };
}

function sumOrNull(values: readonly (number | undefined)[]): number | null {
  let sum = 0;
  for (const value of values) {
    if (value === undefined) return null;
    sum += value;
  }
  return sum;
}

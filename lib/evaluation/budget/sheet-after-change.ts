import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { AllocationsBody } from "../lines/allocations-body";
import type { BudgetState, LineState } from "../lines/line-state";
import { sameBody } from "../lines/same-body";
import { allocatedSum, closeSheet, holderTree, keyOf, moveAllocation, openSheet } from "./allocation-sheet";
import type { AllocationSheet, HolderTree } from "./allocation-sheet";
import type { Shortfall, TransferEdit } from "./edits";
import { allocationsOf, indexState, termsOf } from "./indexed-state";
import { limitAndReserve } from "./roll-up";
import { findShortfall } from "./shortfall";
import { transferFaults } from "./transfer-faults";

export interface SheetAfterChange {
  sheet: AllocationsBody;
  /** Whether the change writes the sheet's next revision. */
  isMoved: boolean;
  faults: FieldFault[];
  shortfall: Shortfall | null;
}

/**
 * The allocations sheet after a change: limit, reserve and tree first; added items without allocation; the net of all
 * transfers; retired rows back to unallocated. Only the end state is checked.
 */
export function sheetAfterChange(
  before: BudgetState,
  after: BudgetState,
  transfers: readonly TransferEdit[],
): SheetAfterChange {
  const tree = holderTree(after.lines);
  const sheet = openSheet(allocationsOf(before));
  const available = availableHundredths(after);
  sheet.unallocated = available - allocatedSum(sheet, tree);

  const { faults, sound } = transferFaults(transfers, before, after);
  for (const transfer of sound) moveAllocation(sheet, tree, transfer);
  freeRetiredRows(sheet, tree, after.lines);
  if (allocatedSum(sheet, tree) + sheet.unallocated !== available) {
    throw new RangeError("allocations, unallocated and reserve no longer make up the limit");
  }

  const signs = savingFaults(sheet, after, transfers);
  const isMoved =
    allocationsFreed(before, after) || !sameBody(closeSheet(openSheet(allocationsOf(before))), closeSheet(sheet));
  return {
    sheet: closeSheet(sheet),
    isMoved,
    faults: [...faults, ...signs],
    shortfall: findShortfall(sheet, tree, after, transfers),
  };
}

/** Limit less reserve at the reference operating point: what can be allocated. */
export function availableHundredths(state: BudgetState): number {
  const indexed = indexState(state);
  const { limitHundredths, reserveHundredths } = limitAndReserve(indexed.terms.referenceOperatingPoint, indexed);
  return limitHundredths - reserveHundredths;
}

/** What a retired line held goes back to unallocated; items ahead of the groups that held them. */
function freeRetiredRows(sheet: AllocationSheet, tree: HolderTree, lines: readonly LineState[]): void {
  const unallocated = { kind: "unallocated", number: null } as const;
  for (const kind of ["item", "group"] as const) {
    for (const line of lines) {
      if (line.kind !== kind || !line.retired) continue;
      const row = sheet.rows.get(keyOf(kind, line.number));
      if (!row) continue;
      moveAllocation(sheet, tree, {
        giver: { kind, number: line.number },
        receiver: unallocated,
        hundredths: row.hundredths,
      });
      sheet.rows.delete(keyOf(kind, line.number));
    }
  }
}

/** A saving's allocation is what it promised: at most 0. */
function savingFaults(sheet: AllocationSheet, after: BudgetState, transfers: readonly TransferEdit[]): FieldFault[] {
  return after.lines.flatMap((line) => {
    if (line.kind !== "item" || line.retired || !line.body.saving) return [];
    const held = sheet.rows.get(keyOf("item", line.number))?.hundredths ?? 0;
    if (held <= 0) return [];
    const sentence = `Item ${line.number} is a saving: its allocation is what it promised, at most 0.`;
    const index = transfers.findIndex(({ receiver }) => receiver.kind === "item" && receiver.number === line.number);
    return [{ path: index < 0 ? "transfers" : `transfers.${index}.receiver`, sentence }];
  });
}

/** Acts that write the sheet anew even where no number of it moves: another limit, reserve, reference or tree. */
function allocationsFreed(before: BudgetState, after: BudgetState): boolean {
  const [was, now] = [indexState(before), indexState(after)];
  if (termsOf(before).referenceOperatingPoint !== termsOf(after).referenceOperatingPoint) return true;
  const reference = now.terms.referenceOperatingPoint;
  const [limitWas, limitNow] = [limitAndReserve(reference, was), limitAndReserve(reference, now)];
  if (limitWas.limitHundredths !== limitNow.limitHundredths) return true;
  if (limitWas.reserveHundredths !== limitNow.reserveHundredths) return true;

  const [treeWas, treeNow] = [holderTree(before.lines), holderTree(after.lines)];
  for (const [key, parent] of treeWas) if (treeNow.get(key) !== parent) return true;
  return false;
}

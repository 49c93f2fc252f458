import { formatHundredths } from "@/lib/units/format-newtons";
import { THIN_SPACE } from "@/lib/units/format-number";
import type { BudgetState } from "../lines/line-state";
import { heldInside, keyOf, type AllocationSheet, type HolderTree } from "./allocation-sheet";
import type { Holder, Shortfall, TransferEdit } from "./edits";
import { findLine } from "./indexed-state";

/**
 * Who would have to give more than they hold. Givers of the change come first, in its order; then everybody else, as
 * a lower limit or another tree takes from them too.
 */
export function findShortfall(
  sheet: AllocationSheet,
  tree: HolderTree,
  after: BudgetState,
  transfers: readonly TransferEdit[],
): Shortfall | null {
  const rows = [...sheet.rows.values()].map(({ kind, number }): Holder => ({ kind, number }));
  const everybody = [...transfers.map(({ giver }) => giver), ...rows, { kind: "unallocated", number: null } as const];
  for (const giver of everybody) {
    const hundredths = lackOf(giver, sheet, tree, after);
    if (hundredths > 0) return { giver, hundredths, sentence: sentenceOf(giver, hundredths) };
  }
  return null;
}

function lackOf({ kind, number }: Holder, sheet: AllocationSheet, tree: HolderTree, after: BudgetState): number {
  if (kind === "unallocated" || number === null) return -sheet.unallocated;

  const held = sheet.rows.get(keyOf(kind, number))?.hundredths;
  if (held === undefined) return 0;
  if (kind === "group") return Math.max(heldInside(number, sheet, tree) - held, 0);
  const line = findLine(after, "item", number);
  const isSaving = line?.kind === "item" && line.body.saving;
  return isSaving ? 0 : -held;
}

function sentenceOf({ kind, number }: Holder, hundredths: number): string {
  const newtons = `${formatHundredths(hundredths)}${THIN_SPACE}N`;
  if (kind === "unallocated") return `Unallocated would have to give ${newtons} more than it holds.`;
  const giver = kind === "group" ? `Group ${number ?? ""}` : `Item ${number ?? ""}`;
  const free = kind === "group" ? "its members leave it" : "it holds";
  return `${giver} would have to give ${newtons} more than ${free}.`;
}

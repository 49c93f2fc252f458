import type { Holder, TransferEdit } from "@/lib/evaluation/budget/edits";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import { formatHundredths } from "@/lib/units/format-newtons";

/** "0.30 N from the unallocated rest to item 050 (Splitter baffles)" */
export function transferText({ giver, receiver, hundredths }: TransferEdit, state: BudgetState): string {
  return `${formatHundredths(hundredths)} N from ${holderText(giver, state)} to ${holderText(receiver, state)}`;
}

export function holderText(holder: Holder, state: BudgetState): string {
  if (holder.number === null) return "the unallocated rest";
  const name = holderName(holder, state);
  return `${holder.kind} ${holder.number}${name === "" ? "" : ` (${name})`}`;
}

export function holderName({ kind, number }: Holder, state: BudgetState): string {
  const line = state.lines.find((each) => each.kind === kind && each.number === number);
  return line ? lineName(line) : "";
}

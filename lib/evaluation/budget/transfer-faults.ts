import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { BudgetState } from "../lines/line-state";
import type { Holder, TransferEdit } from "./edits";
import { findLine } from "./indexed-state";

/** Transfers that say who gives and who receives, and what is wrong with the others. */
export function transferFaults(
  transfers: readonly TransferEdit[],
  after: BudgetState,
): { faults: FieldFault[]; sound: TransferEdit[] } {
  const told = transfers.map((transfer, index) => ({ transfer, faults: faultsOf(transfer, index, after) }));
  return {
    faults: told.flatMap(({ faults }) => faults),
    sound: told.flatMap(({ transfer, faults }) => (faults.length === 0 ? [transfer] : [])),
  };
}

function faultsOf({ giver, receiver, hundredths }: TransferEdit, index: number, after: BudgetState): FieldFault[] {
  const at = `transfers.${index}`;
  const isAmount = Number.isSafeInteger(hundredths) && hundredths >= 1;
  const isSame = giver.kind === receiver.kind && giver.number === receiver.number;
  return [
    ...holderFaults(`${at}.giver`, giver, after, true),
    ...holderFaults(`${at}.receiver`, receiver, after, false),
    ...(isSame ? [{ path: `${at}.receiver`, sentence: "Giver and receiver are the same." }] : []),
    ...(isAmount ? [] : [{ path: `${at}.hundredths`, sentence: "A transfer moves at least 0.01 N, to 0.01 N." }]),
  ];
}

/** A line that this change retires may still give; it receives nothing. */
function holderFaults(path: string, { kind, number }: Holder, after: BudgetState, mayBeRetired: boolean): FieldFault[] {
  if (kind === "unallocated") return [];
  if (number === null) return [{ path, sentence: "Name an item or a group." }];

  const line = findLine(after, kind, number);
  if (!line) return [{ path, sentence: `There is no ${kind} ${number}.` }];
  return line.retired && !mayBeRetired ? [{ path, sentence: `The ${kind} ${number} is retired.` }] : [];
}

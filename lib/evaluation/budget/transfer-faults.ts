import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { BudgetState } from "../lines/line-state";
import type { Holder, TransferEdit } from "./edits";
import { findLine } from "./indexed-state";

/** Transfers that say who gives and who receives, and what is wrong with the others. */
export function transferFaults(
  transfers: readonly TransferEdit[],
  before: BudgetState,
  after: BudgetState,
): { faults: FieldFault[]; sound: TransferEdit[] } {
  const told = transfers.map((transfer, index) => ({ transfer, faults: faultsOf(transfer, index, { before, after }) }));
  return {
    faults: told.flatMap(({ faults }) => faults),
    sound: told.flatMap(({ transfer, faults }) => (faults.length === 0 ? [transfer] : [])),
  };
}

interface Sides {
  before: BudgetState;
  after: BudgetState;
}

function faultsOf({ giver, receiver, hundredths }: TransferEdit, index: number, sides: Sides): FieldFault[] {
  const at = `transfers.${index}`;
  const isAmount = Number.isSafeInteger(hundredths) && hundredths >= 1;
  const isSame = giver.kind === receiver.kind && giver.number === receiver.number;
  return [
    ...holderFaults(`${at}.giver`, giver, sides, true),
    ...holderFaults(`${at}.receiver`, receiver, sides, false),
    ...(isSame ? [{ path: `${at}.receiver`, sentence: "Giver and receiver are the same." }] : []),
    ...(isAmount ? [] : [{ path: `${at}.hundredths`, sentence: "A transfer moves at least 0.01 N, to 0.01 N." }]),
  ];
}

/** A line that this change retires may still give; one that was retired before holds nothing. Neither receives. */
function holderFaults(path: string, { kind, number }: Holder, { before, after }: Sides, gives: boolean): FieldFault[] {
  if (kind === "unallocated") return [];
  if (number === null) return [{ path, sentence: "Name an item or a group." }];

  const line = findLine(after, kind, number);
  if (!line) return [{ path, sentence: `There is no ${kind} ${number}.` }];
  const mayStillGive = gives && findLine(before, kind, number)?.retired === false;
  return line.retired && !mayStillGive ? [{ path, sentence: `The ${kind} ${number} is retired.` }] : [];
}

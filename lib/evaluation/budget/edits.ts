import type { EditOperation, LineKind } from "@/lib/vocabulary/lines";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { BudgetState, LineState } from "../lines/line-state";

export interface LineEdit {
  operation: EditOperation;
  kind: LineKind;
  number: string;
  /** Letter of the revision that the edit starts from; null for a new line. */
  baseLetter: string | null;
  /** As it was typed; null where the operation needs none. */
  body: unknown;
}

export interface Holder {
  kind: "item" | "group" | "unallocated";
  number: string | null;
}

export interface TransferEdit {
  giver: Holder;
  receiver: Holder;
  hundredths: number;
}

/** Who would have to give more than they hold, and by how much. */
export interface Shortfall {
  giver: Holder;
  hundredths: number;
  sentence: string;
}

export interface AppliedChange {
  /** As it would stand at the next issue; edits with faults are left out of it. */
  state: BudgetState;
  /** Paths as in the input: "edits.0.body.length", "transfers.1.giver". */
  faults: FieldFault[];
  shortfall: Shortfall | null;
  /** The lines that would get a new revision, as they would then stand. */
  changedLines: LineState[];
}

export interface ApplyOptions {
  /** The number of the issue that the change would make; the newest revision's plus one by default. */
  issue?: number;
  /** Whether a person may own an item here; without it owners are not checked. */
  mayOwn?: (userId: number) => boolean;
}

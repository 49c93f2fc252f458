import type { ProposalState } from "@/lib/vocabulary/proposals";
import { Refusal } from "@/lib/vocabulary/refusal";

/** Every legal move of a proposal. What is not listed here cannot happen. */
const MOVES = {
  propose: { from: ["draft", "returned"], to: "proposed" },
  /** The next round of what is proposed already; carrying forward is one too. */
  revise: { from: ["proposed"], to: "proposed" },
  approve: { from: ["proposed"], to: "approved" },
  return: { from: ["proposed"], to: "returned" },
  disapprove: { from: ["proposed"], to: "disapproved" },
  withdraw: { from: ["draft", "proposed", "returned"], to: "withdrawn" },
} as const satisfies Record<string, { from: readonly ProposalState[]; to: ProposalState }>;
export type Move = keyof typeof MOVES;

const STATE_WORDS: Record<ProposalState, string> = {
  draft: "still a draft",
  proposed: "open for signatures",
  returned: "returned for rework",
  approved: "approved",
  disapproved: "disapproved",
  withdrawn: "withdrawn",
};

export function canMove(state: ProposalState, move: Move): boolean {
  const from: readonly ProposalState[] = MOVES[move].from;
  return from.includes(state);
}

export function stateAfter(state: ProposalState, move: Move): ProposalState {
  if (!canMove(state, move)) throw new Refusal("wrong_state", wrongStateSentence(state));
  return MOVES[move].to;
}

/** Whether the working copy may change: as long as the proposal is in no end state. */
export function isOpen(state: ProposalState): boolean {
  return canMove(state, "withdraw");
}

export function wrongStateSentence(state: ProposalState): string {
  return `This proposal is ${STATE_WORDS[state]}, so this can no longer be done, or not yet.`;
}

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

/** What stands against an act in each state, and what its reader can do. */
const STATE_SENTENCES: Record<ProposalState, string> = {
  draft: "This proposal is still a draft: it has to be submitted first.",
  proposed: "This proposal is open for signatures already.",
  returned: "This proposal was returned for rework: it has to be submitted again first.",
  approved: "This proposal has been approved and never changes again. A further change needs a new proposal.",
  disapproved: "This proposal was disapproved and never changes again. The same change needs a new proposal.",
  withdrawn: "This proposal was withdrawn and never changes again. The same change needs a new proposal.",
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
  return STATE_SENTENCES[state];
}

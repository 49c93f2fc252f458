import type { ProposalState } from "@/lib/vocabulary/proposals";

const WORDS: Record<ProposalState, string> = {
  draft: "draft",
  proposed: "proposed",
  returned: "returned for rework",
  approved: "approved",
  disapproved: "disapproved",
  withdrawn: "withdrawn",
};

/** A state as its reader says it: "returned for rework, round 2". */
export function stateWords(state: ProposalState, round: number): string {
  return round > 1 ? `${WORDS[state]}, round ${round}` : WORDS[state];
}

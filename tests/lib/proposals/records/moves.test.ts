import { describe, expect, it } from "vitest";
import { canMove, isOpen, stateAfter, type Move } from "@/lib/proposals/records/moves";
import { PROPOSAL_STATES, type ProposalState } from "@/lib/vocabulary/proposals";

// The states of a proposal as the specification writes them, one arrow per row.
const ARROWS: [ProposalState, Move, ProposalState][] = [
  ["draft", "propose", "proposed"],
  ["draft", "withdraw", "withdrawn"],
  ["proposed", "approve", "approved"],
  ["proposed", "return", "returned"],
  ["proposed", "disapprove", "disapproved"],
  ["proposed", "withdraw", "withdrawn"],
  ["proposed", "revise", "proposed"],
  ["returned", "propose", "proposed"],
  ["returned", "withdraw", "withdrawn"],
];
const MOVES: Move[] = ["propose", "revise", "approve", "return", "disapprove", "withdraw"];

describe("moves of a proposal", () => {
  it.each(ARROWS)("leads from %s by %s to %s", (from, move, to) => {
    expect(stateAfter(from, move)).toBe(to);
  });

  it("refuses every other move by name and changes nothing", () => {
    const legal = new Set(ARROWS.map(([from, move]) => `${from} ${move}`));
    for (const state of PROPOSAL_STATES) {
      for (const move of MOVES) {
        if (legal.has(`${state} ${move}`)) continue;
        expect(canMove(state, move), `${state} ${move}`).toBe(false);
        expect(() => stateAfter(state, move)).toThrow(expect.objectContaining({ code: "wrong_state" }));
      }
    }
  });

  it("lets the working copy change in no end state", () => {
    expect(PROPOSAL_STATES.filter(isOpen)).toEqual(["draft", "proposed", "returned"]);
  });
});

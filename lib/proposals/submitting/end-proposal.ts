import { Proposal } from "@/models/proposal";
import type { ProposalAct } from "../records/act-on-proposal";
import { stateAfter, type Move } from "../records/moves";

/** Moves a proposal into an end state, which it never leaves. */
export async function endProposal(
  { tx, at, proposal }: ProposalAct,
  move: Extract<Move, "approve" | "disapprove" | "withdraw">,
): Promise<void> {
  const state = stateAfter(proposal.state, move);
  await Proposal.update(
    { state, endedAt: at, lockVersion: proposal.lockVersion + 1 },
    { where: { id: proposal.id }, transaction: tx },
  );
}

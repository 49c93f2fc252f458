import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Proposal } from "@/models/proposal";
import { actOnProposal } from "../records/act-on-proposal";
import { mailDecided } from "../notices/mails";
import { stateAfter } from "../records/moves";
import { openRound } from "../submitting/open-round";
import type { ReturnProposalInput } from "../schema";
import { writeSignature } from "./write-signature";

/** Any signer sends a round back for rework, with a reason and without a password. */
export function returnProposal(actor: Actor, input: ReturnProposalInput, clock: Clock = systemClock): Promise<void> {
  const { proposalId, capacity, reason, deputyForId } = input;
  return actOnProposal(actor, clock, { act: "return_proposal", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    const review = await openRound(actor, context, { decision: "return", capacity, deputyForId });
    if (input.roundHash !== review.round.hash) {
      throw new Refusal("moved", "A newer round was submitted in the meantime. Read it before you return it.");
    }
    const words = { decision: "return", capacity, meaning: null, reason, deputyForId, takesBackId: null } as const;
    const signature = await writeSignature(actor, review, words, at, tx);
    const state = stateAfter(proposal.state, "return");
    await Proposal.update({ state }, { where: { id: proposal.id }, transaction: tx });
    record({
      capacity,
      was: { state: proposal.state },
      now: {
        ...{ state, round: review.round.number, signature: signature.hash },
        ...(signature.deputyForName ? { deputyFor: signature.deputyForName } : {}),
      },
      reason,
    });
    await mailDecided(actor, context, "returned");
  });
}

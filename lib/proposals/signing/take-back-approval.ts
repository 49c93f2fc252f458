import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { mailDecided } from "../notices/mails";
import { stateAfter } from "../records/moves";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";
import type { TakeBackApprovalInput } from "../schema";
import { writeSignature } from "./write-signature";

/** Until the last signature a signer may take back an approval; it stays visible and counts no longer. */
export function takeBackApproval(
  actor: Actor,
  { proposalId, reason }: TakeBackApprovalInput,
  clock: Clock = systemClock,
): Promise<void> {
  return actOnProposal(actor, clock, { act: "take_back_approval", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    authorize(actor, { on: "Signature", action: "take_back", productId: proposal.productId, signerId: actor.userId });
    stateAfter(proposal.state, "approve");
    const round = await roundOf(proposal.id, proposal.round, tx);
    const review = round && (await reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx }));
    const own = review?.approvals.find(({ signerId }) => signerId === actor.userId);
    if (!review || !own) throw new Refusal("wrong_state", "You have no approval on this round to take back.");

    const { capacity, deputyForId } = own;
    const words = { decision: "take_back", capacity, meaning: null, reason, deputyForId, takesBackId: own.id } as const;
    const signature = await writeSignature(actor, review, words, at, tx);
    record({ capacity, was: { signature: own.hash }, now: { signature: signature.hash }, reason });
    await mailDecided(actor, context, "approval_taken_back");
  });
}

import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Assignment } from "@/models/assignment";
import { authorize } from "@/policies/authorize";
import { signingRights } from "@/policies/signing-rights";
import { actOnProposal } from "./act-on-proposal";
import { budgetReader } from "./budget-reader";
import { mailProposed } from "./mails";
import { canMove, wrongStateSentence } from "./moves";
import { roundOf } from "./round-record";
import { reviewRound } from "./round-review";
import type { NameReviewerInput } from "./schema";

/** A program manager names the one reviewer who fills the capacity, or opens it to all reviewers again. */
export function nameReviewer(
  actor: Actor,
  { proposalId, userId }: NameReviewerInput,
  clock: Clock = systemClock,
): Promise<void> {
  return actOnProposal(actor, clock, { act: "name_reviewer", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    authorize(actor, { on: "Product", action: "assign_reviewer", productId: proposal.productId });
    const round = await roundOf(proposal.id, proposal.round, tx);
    if (!round || !canMove(proposal.state, "approve")) {
      throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    }
    const budgets = budgetReader(proposal.productId, tx);
    const { signing, people } = await reviewRound(proposal, round, budgets, { at, tx });
    if (userId === signing.namedReviewerId) return;
    const free = signingRights("reviewer", { ...signing, namedReviewerId: null }).filter(({ deputyFor }) => !deputyFor);
    if (userId !== null && !free.some((right) => right.userId === userId)) {
      const sentence = "Name a reviewer of this product who has no part in the proposal.";
      throw new Refusal("invalid", sentence, [{ path: "userId", sentence }]);
    }

    await Assignment.update(
      { endedAt: at },
      { where: { proposalId: proposal.id, capacity: "reviewer", endedAt: null }, transaction: tx },
    );
    if (userId !== null) {
      const named = {
        proposalId: proposal.id,
        capacity: "reviewer",
        userId,
        namedById: actor.userId,
        namedAt: at,
      } as const;
      await Assignment.create(named, { transaction: tx });
    }
    const nameOf = (id: number | null) => (id === null ? null : (people.get(id) ?? ""));
    record({ was: { reviewer: nameOf(signing.namedReviewerId) }, now: { reviewer: nameOf(userId) } });
    const { routing } = await reviewRound(proposal, round, budgets, { at, tx });
    await mailProposed(actor, context, { routing, round });
  });
}

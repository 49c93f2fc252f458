import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Assignment } from "@/models/assignment";
import { authorize } from "@/policies/authorize";
import { signingRights } from "@/policies/signing-rights";
import { actOnProposal, type ProposalAct } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { mailProposed } from "../notices/mails";
import { canMove, wrongStateSentence } from "../records/moves";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";
import type { NameReviewerInput } from "../schema";

/**
 * A program manager names the one reviewer who fills the capacity, or opens it to all reviewers again. Who takes the
 * place of one who was named, and is away, is named with a reason.
 */
export function nameReviewer(
  actor: Actor,
  { proposalId, userId, reason }: NameReviewerInput,
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

    const isReplaced = signing.namedReviewerId !== null;
    if (isReplaced && reason.length < 3) {
      const sentence = "Say in a sentence why it is no longer the reviewer who was named.";
      throw new Refusal("invalid", sentence, [{ path: "reason", sentence }]);
    }

    await replaceNamed(actor, { proposalId, userId, reason: isReplaced ? reason : null, at }, tx);
    const nameOf = (id: number | null) => (id === null ? null : (people.get(id) ?? ""));
    record({
      was: { reviewer: nameOf(signing.namedReviewerId) },
      now: { reviewer: nameOf(userId) },
      ...(reason === "" ? {} : { reason }),
    });
    const { routing } = await reviewRound(proposal, round, budgets, { at, tx });
    await mailProposed(actor, context, { routing, round });
  });
}

interface Naming {
  proposalId: number;
  userId: number | null;
  reason: string | null;
  at: string;
}

async function replaceNamed(
  actor: Actor,
  { proposalId, userId, reason, at }: Naming,
  tx: ProposalAct["tx"],
): Promise<void> {
  const capacity = "reviewer";
  await Assignment.update({ endedAt: at }, { where: { proposalId, capacity, endedAt: null }, transaction: tx });
  if (userId === null) return;
  const named = { proposalId, capacity, userId, namedById: actor.userId, namedAt: at, reason } as const;
  await Assignment.create(named, { transaction: tx });
}

import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { budgetReader } from "../records/budget-reader";
import { endProposal } from "./end-proposal";
import { mailFacts, mailMany } from "../notices/mails";
import { stateAfter } from "../records/moves";
import { proposalQuestion } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import { reviewRound } from "../review/round-review";
import type { WithdrawProposalInput } from "../schema";

/** The proposer, or of what was submitted a program manager, ends it without a decision. Number and rounds stay. */
export function withdrawProposal(
  actor: Actor,
  { proposalId, reason }: WithdrawProposalInput,
  clock: Clock = systemClock,
): Promise<void> {
  return actOnProposal(actor, clock, { act: "withdraw_proposal", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    authorize(actor, proposalQuestion(proposal, actor, "withdraw"));
    const state = stateAfter(proposal.state, "withdraw");
    const round = proposal.state === "proposed" ? await roundOf(proposal.id, proposal.round, tx) : null;
    const review = round && (await reviewRound(proposal, round, budgetReader(proposal.productId, tx), { at, tx }));

    await endProposal(context, "withdraw");
    record({ was: { state: proposal.state }, now: { state }, reason });
    if (!review) return;
    const asked = review.routing.flatMap(({ maySign }) => maySign.map(({ userId }) => userId));
    await mailMany(context, {
      template: "withdrawn",
      occasion: "withdrawn",
      to: [proposal.proposerId, ...proposal.coEditorIds, ...asked],
      except: actor,
      data: { ...mailFacts(proposal), actorName: actor.printedName },
    });
  });
}

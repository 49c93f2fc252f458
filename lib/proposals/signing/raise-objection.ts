import { z } from "zod";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Objection } from "@/models/objection";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { answeredBefore, keepAnswer } from "../records/answered-before";
import { canMove, wrongStateSentence } from "../records/moves";
import { roundOf } from "../records/round-record";
import type { RaiseObjectionInput } from "../schema";

const Raised = z.object({ objectionId: z.int() });

/** A member says no, with a reason that all signers see. It moves nothing. */
export function raiseObjection(
  actor: Actor,
  { proposalId, reason, key }: RaiseObjectionInput,
  clock: Clock = systemClock,
): Promise<{ objectionId: number }> {
  return actOnProposal(actor, clock, { act: "raise_objection", proposalId }, async ({ tx, at, proposal, record }) => {
    authorize(actor, { on: "Product", action: "object", productId: proposal.productId });
    const form = { userId: actor.userId, act: "raise_objection" as const, key };
    const earlier = await answeredBefore(form, Raised, tx);
    if (earlier) return earlier;
    const round = await roundOf(proposal.id, proposal.round, tx);
    if (!round || !canMove(proposal.state, "approve")) {
      throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    }

    const { id } = await Objection.create(
      {
        ...{ proposalId: proposal.id, roundId: round.id, authorId: actor.userId, printedName: actor.printedName },
        ...{ reason, raisedAt: at },
      },
      { transaction: tx },
    );
    record({ now: { round: round.number }, reason });
    const answer = { objectionId: id };
    await keepAnswer(form, answer, at, tx);
    return answer;
  });
}

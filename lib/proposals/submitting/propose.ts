import { z } from "zod";
import { passwordRefusal } from "@/lib/users/password-refusal";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { answeredBefore, keepAnswer } from "../records/answered-before";
import { checkedSubmission } from "./check-submission";
import { stateAfter } from "../records/moves";
import { proposalQuestion } from "../records/proposal-record";
import type { ProposeInput } from "../schema";
import { writeRound } from "./write-round";

const Proposed = z.object({ key: z.string(), number: z.int(), round: z.int() });
export type Proposed = z.infer<typeof Proposed>;

/** Submits the working copy as a round, open to signers until the next one. The first submission gives the number. */
export async function propose(actor: Actor, input: ProposeInput, clock: Clock = systemClock): Promise<Proposed> {
  // Hashing takes its time: outside the transaction.
  const password = input.password === null ? needsPassword() : await passwordRefusal(actor.userId, input.password);
  const { proposalId } = input;
  return actOnProposal(actor, clock, { act: "propose", proposalId }, async (context) => {
    const { tx, at, proposal } = context;
    const form = { userId: actor.userId, act: "propose" as const, key: input.key };
    const earlier = await answeredBefore(form, Proposed, tx);
    if (earlier) return earlier;

    authorize(actor, proposalQuestion(proposal, actor, "propose"));
    stateAfter(proposal.state, proposal.state === "proposed" ? "revise" : "propose");
    if (proposal.lockVersion !== input.lockVersion) throw movedSince();
    const submission = await checkedSubmission(actor, context);
    const signsBySubmitting = submission.preview.routing.some(({ signedBySubmitting }) => signedBySubmitting);
    if (signsBySubmitting && password) throw password;

    const act = proposal.round === 0 ? "propose" : "propose_next_round";
    const answer = await writeRound(actor, context, { ...submission, signsBySubmitting, act });
    await keepAnswer(form, answer, at, tx);
    return answer;
  });
}

function movedSince(): Refusal {
  return new Refusal(
    "moved",
    "The working copy was saved by somebody else in the meantime: read it again, then propose.",
  );
}

function needsPassword(): Refusal {
  const sentence = "Type your password: by submitting it you sign it as program manager.";
  return new Refusal("invalid", sentence, [{ path: "password", sentence }]);
}

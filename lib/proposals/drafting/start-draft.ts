import { z } from "zod";
import { performAct } from "@/lib/audit/perform-act";
import { newestIssue, productByCode } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Proposal } from "@/models/proposal";
import { ProposalEditor } from "@/models/proposal-editor";
import { authorize } from "@/policies/authorize";
import { answeredBefore, keepAnswer } from "../records/answered-before";
import { keyOf, subjectOf } from "../records/proposal-record";
import type { StartDraftInput } from "../schema";

const StartedDraft = z.object({ proposalId: z.int(), key: z.string() });
export type StartedDraft = z.infer<typeof StartedDraft>;

/** Starts a working copy on the newest issue. Nobody but its proposer and whom they name sees what is in it. */
export function startDraft(actor: Actor, input: StartDraftInput, clock: Clock = systemClock): Promise<StartedDraft> {
  const frame = { act: "start_draft", chain: input.productCode } as const;
  return performAct(actor, clock, frame, async (tx, record, at) => {
    const product = await productByCode(input.productCode, tx);
    authorize(actor, { on: "Product", action: "start_draft", productId: product.id });
    const form = { userId: actor.userId, act: frame.act, key: input.key };
    const earlier = await answeredBefore(form, StartedDraft, tx);
    if (earlier) return earlier;

    const baseIssue = await newestIssue(product.id, tx);
    if (baseIssue === null) throw new Refusal("wrong_state", "This product has not been established yet.");
    const facts = { productId: product.id, proposerId: actor.userId, baseIssue };
    const { id } = await Proposal.create({ ...facts, title: input.title, createdAt: at }, { transaction: tx });
    await ProposalEditor.create(
      { proposalId: id, userId: actor.userId, firstEditAt: at, lastEditAt: at },
      { transaction: tx },
    );

    const draft = { id, number: null, productCode: product.code };
    record({ act: frame.act, subject: subjectOf(draft), now: { baseIssue } });
    const answer = { proposalId: id, key: keyOf(draft) };
    await keepAnswer(form, answer, at, tx);
    return answer;
  });
}

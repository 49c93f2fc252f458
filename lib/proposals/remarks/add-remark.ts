import { z } from "zod";
import { membersAt } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Comment } from "@/models/comment";
import { CommentAddressee } from "@/models/comment-addressee";
import { authorize } from "@/policies/authorize";
import { actOnProposal, type ProposalAct } from "../records/act-on-proposal";
import { answeredBefore, keepAnswer } from "../records/answered-before";
import { lineIds } from "../records/line-ids";
import { mailRemark } from "../notices/mail-remark";
import { isOpen, wrongStateSentence } from "../records/moves";
import { roundOf } from "../records/round-record";
import type { AddRemarkInput } from "../schema";

const AddedRemark = z.object({ remarkId: z.int(), number: z.int() });
export type AddedRemark = z.infer<typeof AddedRemark>;

/** A remark on the proposal or on one field of one of its lines, or the answer to one. Never deleted. */
export function addRemark(actor: Actor, input: AddRemarkInput, clock: Clock = systemClock): Promise<AddedRemark> {
  const act = input.parentId === null ? "add_remark" : "answer_remark";
  return actOnProposal(actor, clock, { act, proposalId: input.proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    authorize(actor, { on: "Product", action: "remark", productId: proposal.productId });
    const form = { userId: actor.userId, act, key: input.key } as const;
    const earlier = await answeredBefore(form, AddedRemark, tx);
    if (earlier) return earlier;
    if (proposal.round === 0 || !isOpen(proposal.state)) {
      throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    }

    const round = await roundOf(proposal.id, proposal.round, tx);
    const parent = await parentOf(input, context);
    const remark = await Comment.create(
      {
        proposalId: proposal.id,
        roundId: round?.id ?? null,
        number: parent ? null : await nextNumber(context),
        parentId: parent?.id ?? null,
        lineId: parent ? null : await lineIdOf(input, context),
        field: parent ? null : input.field,
        authorId: actor.userId,
        printedName: actor.printedName,
        body: input.text,
        suggestion: input.suggestion,
        asksAction: !parent && input.asksForAction,
        writtenAt: at,
      },
      { transaction: tx },
    );
    const number = parent?.number ?? remark.number ?? 0;
    const addressed = await addressRemark(remark.id, input.to, context);
    record({
      now: {
        ...{ remark: number, asksForAction: remark.asksAction, ...whereOf(input) },
        ...(addressed.length === 0 ? {} : { to: addressed.map(({ printedName }) => printedName) }),
      },
      reason: input.text,
    });
    const to = addressed.map(({ userId }) => userId);
    await mailRemark(actor, context, { remark, number, parent, to });
    const answer = { remarkId: remark.id, number };
    await keepAnswer(form, answer, at, tx);
    return answer;
  });
}

async function parentOf({ parentId }: AddRemarkInput, { proposal, tx }: ProposalAct): Promise<Comment | null> {
  if (parentId === null) return null;
  const parent = await Comment.findOne({
    where: { id: parentId, proposalId: proposal.id, parentId: null },
    transaction: tx,
  });
  if (!parent) throw new Refusal("not_found", "There is no such remark to answer.");
  return parent;
}

/** Keeps to whom it is addressed: members of the product, each once. */
async function addressRemark(commentId: number, to: readonly number[], { proposal, at, tx }: ProposalAct) {
  if (to.length === 0) return [];
  const members = await membersAt(proposal.productId, at, tx);
  const addressed = members.filter(({ userId }) => to.includes(userId));
  if (addressed.length < new Set(to).size) {
    const sentence = "Address it to people who hold a role in this product.";
    throw new Refusal("invalid", sentence, [{ path: "to", sentence }]);
  }
  await CommentAddressee.bulkCreate(
    addressed.map(({ userId }) => ({ commentId, userId })),
    { transaction: tx },
  );
  return addressed;
}

async function nextNumber({ proposal, tx }: ProposalAct): Promise<number> {
  const newest = await Comment.max<number | null, Comment>("number", {
    where: { proposalId: proposal.id },
    transaction: tx,
  });
  return (newest ?? 0) + 1;
}

async function lineIdOf({ line }: AddRemarkInput, { proposal, tx }: ProposalAct): Promise<number | null> {
  if (line === null) return null;
  const id = (await lineIds(proposal.productId, tx)).get(`${line.kind} ${line.number}`);
  const sentence = `There is no line ${line.number} here.`;
  if (id === undefined) throw new Refusal("invalid", sentence, [{ path: "line", sentence }]);
  return id;
}

function whereOf({ line, field }: AddRemarkInput) {
  return line === null ? {} : { line: `${line.kind} ${line.number}`, ...(field === null ? {} : { field }) };
}

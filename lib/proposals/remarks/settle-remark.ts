import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { Comment } from "@/models/comment";
import { authorize } from "@/policies/authorize";
import { actOnProposal } from "../records/act-on-proposal";
import { mailSettled } from "../notices/mail-remark";
import { isOpen, wrongStateSentence } from "../records/moves";
import { hasPart } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import type { SettleRemarkInput } from "../schema";
import { ownsEditedItem } from "../review/owns-edited-item";

/** Settles a request for action: only who raised it may, or a program manager who has no part in the proposal. */
export async function settleRemark(
  actor: Actor,
  { remarkId, reason }: SettleRemarkInput,
  clock: Clock = systemClock,
): Promise<void> {
  const named = await inSnapshot((tx) => Comment.findByPk(remarkId, { transaction: tx }));
  if (!named) throw new Refusal("not_found", "There is no such remark.");
  const { proposalId } = named;
  await actOnProposal(actor, clock, { act: "settle_remark", proposalId }, async (context) => {
    const { tx, at, proposal, record } = context;
    const remark = await Comment.findByPk(remarkId, { transaction: tx, rejectOnEmpty: true });
    const round = await roundOf(proposal.id, proposal.round, tx);
    const isOwner = round !== null && (await ownsEditedItem(actor.userId, proposal.productId, round, tx));
    authorize(actor, {
      on: "Remark",
      action: "settle",
      productId: proposal.productId,
      authorId: remark.authorId,
      hasPart: isOwner || hasPart(proposal, actor.userId),
    });
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
    if (!remark.asksAction || remark.parentId !== null) {
      throw new Refusal("wrong_state", "This remark asks for no action: there is nothing to settle.");
    }
    if (remark.settledAt !== null) {
      throw new Refusal("wrong_state", `${remark.settledByName ?? "Somebody"} has settled this remark already.`);
    }

    await remark.update(
      { settledById: actor.userId, settledByName: actor.printedName, settledAt: at, settledReason: reason },
      { transaction: tx },
    );
    record({ now: { remark: remark.number, settled: true }, reason });
    await mailSettled(actor, context, remark);
  });
}

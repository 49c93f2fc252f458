import type { Transaction } from "sequelize";
import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { lineName } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { Comment } from "@/models/comment";
import { Line } from "@/models/line";
import { Objection } from "@/models/objection";
import { isAllowed } from "@/policies/authorize";
import { hasPart, type ProposalRecord } from "./proposal-record";
import { isOpen } from "./moves";
import type { ObjectionView, RemarkView, ReplyView } from "./views";

interface RemarkContext {
  actor: Actor;
  proposal: ProposalRecord;
  /** Items edited by this proposal belong to the reader: a part in it. */
  isOwner: boolean;
  /** The budget with the change, so that new lines have names too. */
  state: BudgetState;
  roundNumbers: ReadonlyMap<number, number>;
}

/** Remarks with their threads, in the order of their numbers. */
export async function remarkViews(context: RemarkContext, tx: Transaction): Promise<RemarkView[]> {
  const { proposal } = context;
  const comments = await Comment.findAll({
    where: { proposalId: proposal.id },
    order: [["id", "ASC"]],
    transaction: tx,
  });
  const lines = new Map(
    (await Line.findAll({ where: { productId: proposal.productId }, transaction: tx })).map((line) => [line.id, line]),
  );
  return comments
    .filter(({ parentId }) => parentId === null)
    .map((remark) => ({
      ...replyView(remark),
      number: remark.number ?? 0,
      round: context.roundNumbers.get(remark.roundId ?? 0) ?? 1,
      ...placeOf(remark, remark.lineId === null ? undefined : lines.get(remark.lineId), context.state),
      asksForAction: remark.asksAction,
      settled: settledOf(remark),
      replies: comments.filter(({ parentId }) => parentId === remark.id).map(replyView),
      maySettle: maySettle(remark, context),
    }));
}

export async function objectionViews(
  proposal: ProposalRecord,
  roundNumbers: ReadonlyMap<number, number>,
  tx: Transaction,
): Promise<ObjectionView[]> {
  const rows = await Objection.findAll({
    where: { proposalId: proposal.id },
    order: [["id", "ASC"]],
    transaction: tx,
  });
  return rows.map(({ id, authorId, printedName, raisedAt, roundId, reason }) => ({
    id,
    by: { id: authorId, name: printedName },
    at: raisedAt,
    round: roundNumbers.get(roundId) ?? 1,
    reason,
  }));
}

function replyView({ id, authorId, printedName, writtenAt, body, suggestion }: Comment): ReplyView {
  const author = { id: authorId, name: printedName };
  return { id, author, at: writtenAt, text: body, suggestion: suggestion ?? null };
}

function placeOf({ field }: Comment, line: Line | undefined, state: BudgetState) {
  if (!line) return { line: null, field: null, fieldLabel: null };
  const { kind, number } = line;
  const standing = state.lines.find((each) => each.kind === kind && each.number === number);
  const [key] = (field ?? "").split(".");
  const spec = standing && fieldsOfBody(kind, standing.body).find((each) => each.key === key);
  return {
    line: { kind, number, name: standing ? lineName(standing) : "" },
    field: field ?? null,
    fieldLabel: field === null ? null : (spec?.label ?? field),
  };
}

function settledOf({ settledById, settledByName, settledAt, settledReason }: Comment): RemarkView["settled"] {
  if (settledById === null || settledAt === null) return null;
  return { by: { id: settledById, name: settledByName ?? "" }, at: settledAt, reason: settledReason ?? "" };
}

function maySettle(remark: Comment, { actor, proposal, isOwner }: RemarkContext): boolean {
  if (!remark.asksAction || remark.settledAt !== null || !isOpen(proposal.state)) return false;
  const { productId } = proposal;
  const part = isOwner || hasPart(proposal, actor.userId);
  return isAllowed(actor, { on: "Remark", action: "settle", productId, authorId: remark.authorId, hasPart: part });
}

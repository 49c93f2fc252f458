import { Op, type Transaction } from "sequelize";
import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { lineName, nameBookOf } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { Comment } from "@/models/comment";
import { CommentAddressee } from "@/models/comment-addressee";
import { Line } from "@/models/line";
import { Objection } from "@/models/objection";
import { isAllowed } from "@/policies/authorize";
import { hasPart, type ProposalRecord } from "../records/proposal-record";
import { isOpen } from "../records/moves";
import type { RoundRecord } from "../records/round-record";
import type { ObjectionView, RemarkView, ReplyView } from "../views";

interface RemarkContext {
  actor: Actor;
  proposal: ProposalRecord;
  /** Items edited by this proposal belong to the reader: a part in it. */
  isOwner: boolean;
  /** The budget with the change, so that new lines have names too. */
  state: BudgetState;
  rounds: readonly RoundRecord[];
  /** The round that is shown. */
  shown: RoundRecord;
  people: ReadonlyMap<number, string>;
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
  const addressees = await addresseesOf(
    comments.map(({ id }) => id),
    tx,
  );
  const reply = (comment: Comment) => replyView(comment, addressees.get(comment.id) ?? [], context.people);
  return comments
    .filter(({ parentId }) => parentId === null)
    .map((remark) => {
      const line = remark.lineId === null ? undefined : lines.get(remark.lineId);
      const round = context.rounds.find(({ id }) => id === remark.roundId);
      return {
        ...reply(remark),
        number: remark.number ?? 0,
        round: round?.number ?? 1,
        ...placeOf(remark, line, context.state, round),
        referredTo: referredTo(remark, line, round, context),
        asksForAction: remark.asksAction,
        settled: settledOf(remark),
        replies: comments.filter(({ parentId }) => parentId === remark.id).map(reply),
        maySettle: maySettle(remark, context),
      };
    });
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

async function addresseesOf(commentIds: readonly number[], tx: Transaction): Promise<Map<number, number[]>> {
  const where = { commentId: { [Op.in]: [...commentIds] } };
  const found = new Map<number, number[]>();
  for (const { commentId, userId } of await CommentAddressee.findAll({
    where,
    order: [["id", "ASC"]],
    transaction: tx,
  })) {
    found.set(commentId, [...(found.get(commentId) ?? []), userId]);
  }
  return found;
}

function replyView(comment: Comment, to: readonly number[], people: ReadonlyMap<number, string>): ReplyView {
  const { id, authorId, printedName, writtenAt, body, suggestion } = comment;
  const author = { id: authorId, name: printedName };
  const addressed = to.map((userId) => ({ id: userId, name: people.get(userId) ?? "" }));
  return { id, author, at: writtenAt, text: body, suggestion: suggestion ?? null, to: addressed };
}

/** A line that a later round took out is named as the round of the remark had it. */
function placeOf({ field }: Comment, line: Line | undefined, state: BudgetState, round: RoundRecord | undefined) {
  if (!line) return { line: null, field: null, fieldLabel: null };
  const { kind, number } = line;
  const standing = state.lines.find((each) => each.kind === kind && each.number === number);
  const then = bodyIn(round, line);
  const [key] = (field ?? "").split(".");
  const body = then ?? standing?.body;
  const spec = body && fieldsOfBody(kind, body).find((each) => each.key === key);
  const name = typeof then?.name === "string" ? then.name : "";
  return {
    line: { kind, number, name: standing ? lineName(standing) : name },
    field: field ?? null,
    fieldLabel: field === null ? null : (spec?.label ?? field),
  };
}

function bodyIn(round: RoundRecord | undefined, { kind, number }: Pick<Line, "kind" | "number">) {
  return round?.edits.find((edit) => edit.kind === kind && edit.number === number)?.body ?? null;
}

function referredTo(
  { field }: Comment,
  line: Line | undefined,
  round: RoundRecord | undefined,
  { shown, state, people }: RemarkContext,
): string | null {
  if (!line || !field || round === undefined || round.id === shown.id) return null;
  const names = nameBookOf(state, people);
  const printed = (of: RoundRecord) => {
    const body = bodyIn(of, line);
    const row = body && fieldRows({ kind: line.kind, body }, names).find((each) => each.field === field);
    return row ? `${row.text}${row.unit === undefined ? "" : `\u2009${row.unit}`}` : null;
  };
  const then = printed(round);
  return then === printed(shown) ? null : then;
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

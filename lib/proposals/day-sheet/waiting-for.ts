import type { Transaction } from "sequelize";
import { newestIssue, productById, type ProductRow } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { Comment } from "@/models/comment";
import { budgetReader, type BudgetReader } from "../records/budget-reader";
import { moveViews } from "../reading/move-views";
import { listedProposals, type ListedProposal } from "../reading/proposal-list";

/** The open proposals of one product, read for one person. */
export interface OpenProposals {
  product: ProductRow;
  budgets: BudgetReader;
  open: { listed: ListedProposal; tasks: Task[] }[];
}

/** One thing that waits for the reader. */
export interface Task {
  what: string;
  /** An approval that the reader may give now. */
  isSignature: boolean;
}

/** What waits for a person in each established product in which they hold a role. */
export async function openProposals(actor: Actor, at: string, tx: Transaction): Promise<OpenProposals[]> {
  const found: OpenProposals[] = [];
  for (const productId of new Set(actor.memberships.map((membership) => membership.productId))) {
    if ((await newestIssue(productId, tx)) === null) continue;
    const product = await productById(productId, tx);
    const budgets = budgetReader(productId, tx);
    const people = new Map((await namesOf(productId, tx)).map(({ id, name }) => [id, name]));
    const open: OpenProposals["open"] = [];
    for (const listed of await listedProposals(actor, productId, people, { at, budgets, tx, onlyOpen: true })) {
      open.push({ listed, tasks: tasksOf(actor, listed, await commentsOf(listed.proposal.id, tx)) });
    }
    found.push({ product, budgets, open });
  }
  return found;
}

export function isMine(actor: Actor, { proposal }: ListedProposal): boolean {
  return proposal.proposerId === actor.userId || proposal.coEditorIds.includes(actor.userId);
}

/** Everything of one proposal that waits for the reader. */
function tasksOf(actor: Actor, listed: ListedProposal, comments: readonly Comment[]): Task[] {
  const requests = comments.filter(({ asksAction, settledAt }) => asksAction && settledAt === null);
  const work = [
    ...(isMine(actor, listed) ? authorsWork(listed) : []),
    ...requests.flatMap((remark) => threadWork(actor, listed, remark, comments) ?? []),
  ];
  return [
    ...signaturesWaiting(actor, listed, requests).map((what) => ({ what, isSignature: true })),
    ...work.map((what) => ({ what, isSignature: false })),
  ];
}

function signaturesWaiting(actor: Actor, { review }: ListedProposal, open: readonly Comment[]): string[] {
  if (!review) return [];
  const moves = moveViews(
    actor,
    review,
    open.flatMap(({ number }) => number ?? []),
  );
  return [
    ...(moves.sign_as_reviewer.allowed ? ["Sign as reviewer, or return it"] : []),
    ...(moves.sign_as_program_manager.allowed ? ["Sign as program manager, or return it"] : []),
  ];
}

function authorsWork({ row, review }: ListedProposal): string[] {
  if (row.state === "draft") return ["Finish the draft, or withdraw it"];
  if (row.state === "returned") return ["Rework it and propose it again"];
  return row.overtaken.length > 0 && review ? [`Carry it forward to issue ${review.today.issue}`] : [];
}

/** A request waits for the editors until they answered, then for who raised it. */
function threadWork(
  actor: Actor,
  listed: ListedProposal,
  remark: Comment,
  comments: readonly Comment[],
): string | null {
  const last = comments.filter(({ parentId }) => parentId === remark.id).at(-1);
  const isAnswered = last !== undefined && last.authorId !== remark.authorId;
  if (remark.authorId === actor.userId)
    return isAnswered ? `Settle remark R${remark.number}, or say what is missing` : null;
  return isMine(actor, listed) && !isAnswered ? `Answer remark R${remark.number}, which asks for action` : null;
}

function commentsOf(proposalId: number, tx: Transaction): Promise<Comment[]> {
  return Comment.findAll({ where: { proposalId }, order: [["id", "ASC"]], transaction: tx });
}

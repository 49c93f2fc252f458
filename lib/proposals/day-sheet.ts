import type { Transaction } from "sequelize";
import { newestIssue, productById, type ProductRow } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { Comment } from "@/models/comment";
import { inSnapshot } from "@/models/database";
import { budgetReader, type BudgetReader } from "./budget-reader";
import { changedSince } from "./changed-since";
import { moveViews } from "./move-views";
import { ownItems } from "./own-items";
import { listedProposals, type ListedProposal } from "./proposal-list";
import { previousVisit } from "./visits";
import type { DaySheetEntry, DaySheetView } from "./workspace-views";

/** A person's first page, over all products in which they hold a role. */
export function daySheet(actor: Actor, clock: Clock = systemClock): Promise<DaySheetView> {
  return inSnapshot(async (tx) => {
    const at = clock().toISOString();
    const lastSeenAt = await previousVisit(actor.userId, tx);
    const sheet: DaySheetView = { waitsForMe: [], iWaitFor: [], myItems: [], changedSince: [], lastSeenAt };
    for (const productId of new Set(actor.memberships.map((membership) => membership.productId))) {
      const product = await productById(productId, tx);
      if ((await newestIssue(productId, tx)) === null) continue;
      const budgets = budgetReader(productId, tx);
      await addProduct(sheet, actor, product, { at, budgets, tx });
    }
    return sheet;
  });
}

async function addProduct(
  sheet: DaySheetView,
  actor: Actor,
  product: ProductRow,
  reading: { at: string; budgets: BudgetReader; tx: Transaction },
): Promise<void> {
  const { budgets, tx } = reading;
  const people = new Map((await namesOf(product.id, tx)).map(({ id, name }) => [id, name]));
  const listed = await listedProposals(actor, product.id, people, reading);
  for (const each of listed) {
    const requests = await requestsOf(each.proposal.id, tx);
    for (const what of waitsFor(actor, each, requests)) sheet.waitsForMe.push(entry(product, each, what));
    if (isMine(actor, each) && each.row.waitingFor.length > 0) {
      const waitingFor = each.row.waitingFor;
      const what = waitingFor.map(({ capacity }) => `Signature of a ${ROLE_NAMES[capacity].toLowerCase()}`).join(", ");
      sheet.iWaitFor.push({ ...entry(product, each, what), waitingFor });
    }
  }
  sheet.myItems.push(...ownItems(actor.userId, product.code, await budgets.newest()));
  sheet.changedSince.push(...(await changedSince(product, sheet.lastSeenAt, reading.at, tx)));
}

/** Everything of one proposal that waits for the reader. */
function waitsFor(actor: Actor, listed: ListedProposal, requests: readonly Comment[]): string[] {
  const open = requests.filter(({ asksAction, settledAt }) => asksAction && settledAt === null);
  return [
    ...signaturesWaiting(actor, listed, open),
    ...(isMine(actor, listed) ? authorsWork(listed) : []),
    ...open.flatMap((remark) => threadWork(actor, listed, remark, requests) ?? []),
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

function isMine(actor: Actor, { proposal }: ListedProposal): boolean {
  return proposal.proposerId === actor.userId || proposal.coEditorIds.includes(actor.userId);
}

function entry({ code }: ProductRow, { row, proposal }: ListedProposal, what: string): DaySheetEntry {
  const { proposalId, key, label, title, neededBy } = row;
  const since = row.proposedAt ?? proposal.createdAt;
  return { productCode: code, proposalId, key, label, title, what, since, neededBy };
}

function requestsOf(proposalId: number, tx: Transaction): Promise<Comment[]> {
  return Comment.findAll({ where: { proposalId }, order: [["id", "ASC"]], transaction: tx });
}

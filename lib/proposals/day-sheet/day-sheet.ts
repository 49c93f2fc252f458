import type { ProductRow } from "@/lib/budget/load-budget";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { inSnapshot } from "@/models/database";
import { changedSince, issueSeenAt } from "../reading/changed-since";
import { marginEffectOf } from "../review/margin-share";
import { ownItems } from "./own-items";
import type { ListedProposal } from "../reading/proposal-list";
import { previousVisit } from "../records/visits";
import { isMine, openProposals, type OpenProposals, type Task } from "./waiting-for";
import { inWaitingOrder, type WaitingOrder } from "./waiting-order";
import type { DaySheetEntry, DaySheetView } from "../workspace-views";

/** A person's first page, over all products in which they hold a role. */
export function daySheet(
  actor: Actor,
  clock: Clock = systemClock,
  order: WaitingOrder = "needed",
): Promise<DaySheetView> {
  return inSnapshot(async (tx) => {
    const at = clock().toISOString();
    const lastSeenAt = await previousVisit(actor.userId, tx);
    const sheet: DaySheetView = { waitsForMe: [], iWaitFor: [], myItems: [], changedSince: [], lastSeenAt };
    for (const read of await openProposals(actor, at, tx)) {
      const { product, budgets } = read;
      addProposals(sheet, actor, read);
      const now = await budgets.newest();
      const seen = await issueSeenAt(product.id, lastSeenAt, tx);
      const then = seen === null || seen === now.issue ? null : await budgets.at(seen);
      sheet.myItems.push(...ownItems(actor.userId, product.code, now, then));
      sheet.changedSince.push(...(await changedSince(product, lastSeenAt, at, tx)));
    }
    sheet.waitsForMe = inWaitingOrder(sheet.waitsForMe, order);
    sheet.iWaitFor = inWaitingOrder(sheet.iWaitFor, "needed");
    return sheet;
  });
}

function addProposals(sheet: DaySheetView, actor: Actor, { product, open }: OpenProposals): void {
  for (const { listed, tasks } of open) {
    for (const task of tasks) sheet.waitsForMe.push(entry(product, listed, task));
    const { waitingFor } = listed.row;
    if (!isMine(actor, listed) || waitingFor.length === 0) continue;
    const what = waitingFor.map(({ capacity }) => `Signature of a ${ROLE_NAMES[capacity].toLowerCase()}`).join(", ");
    sheet.iWaitFor.push({ ...entry(product, listed, { what, isSignature: false }), waitingFor });
  }
}

function entry({ code }: ProductRow, { row, review, proposal }: ListedProposal, task: Task): DaySheetEntry {
  const { proposalId, key, label, title, neededBy } = row;
  const since = row.proposedAt ?? proposal.createdAt;
  const margin = review && marginEffectOf(review);
  return { productCode: code, proposalId, key, label, title, ...task, since, neededBy, margin };
}

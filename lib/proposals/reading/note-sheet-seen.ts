import { canonicalJson } from "@/lib/audit/canonical-json";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inTransaction } from "@/models/database";
import { SheetSeen } from "@/models/sheet-seen";
import { movedSince } from "../review/moved-since";
import { SeenSheet, seenSheet } from "../review/seen-sheet";
import type { MovedView } from "../sheet-views";
import type { ProposalView } from "../views";

const PAUSE = 30 * 60_000;

/**
 * Remembers what a person saw of a sheet, and answers what moved since their look before; null on the first one. It
 * stays the look before while they read on: reloading the page takes no mark away.
 */
export function noteSheetSeen(actor: Actor, view: ProposalView, clock: Clock = systemClock): Promise<MovedView | null> {
  const now = seenSheet(view);
  const seen = canonicalJson(now);
  const where = { userId: actor.userId, proposalId: view.proposalId };
  return inTransaction(async (tx) => {
    const at = clock().toISOString();
    const row = await SheetSeen.findOne({ where, transaction: tx });
    if (!row) {
      await SheetSeen.create({ ...where, seen, lastAt: at }, { transaction: tx });
      return null;
    }
    const isNewLook = row.seen !== seen || Date.parse(at) - Date.parse(row.lastAt) > PAUSE;
    const earlier = isNewLook ? { earlier: row.seen, earlierAt: row.lastAt } : {};
    await row.update({ ...earlier, seen, lastAt: at }, { transaction: tx });
    if (row.earlier === null || row.earlierAt === null) return null;
    return movedSince(SeenSheet.parse(JSON.parse(row.earlier)), row.earlierAt, now);
  });
}

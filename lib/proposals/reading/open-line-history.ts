import { lineHistory } from "@/lib/budget/line-history";
import type { LineRevisionView } from "@/lib/budget/views";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inSnapshot, inTransaction } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { historySubject, noteLooking } from "../records/note-looking";
import { proposalById, proposalQuestion } from "../records/proposal-record";
import { roundOf } from "../records/round-record";
import type { OpenLineHistoryInput } from "../schema";

/** Every revision of an edited line, newest first; that somebody looked at it is remembered for the open round. */
export async function openLineHistory(
  actor: Actor,
  { proposalId, kind, number }: OpenLineHistoryInput,
  clock: Clock = systemClock,
): Promise<LineRevisionView[]> {
  const { proposal, round } = await inSnapshot(async (tx) => {
    const found = await proposalById(proposalId, tx);
    authorize(actor, proposalQuestion(found, actor, "read"));
    return { proposal: found, round: await roundOf(proposalId, found.round, tx) };
  });
  const revisions = await lineHistory(actor, proposal.productCode, kind, number);
  const isEdited = round?.edits.some((edit) => edit.kind === kind && edit.number === number) ?? false;
  if (round && isEdited && proposal.state === "proposed") {
    const subject = historySubject(round.id, kind, number);
    const looked = { userId: actor.userId, kind: "line history" as const, subject };
    await inTransaction((tx) => noteLooking(looked, clock().toISOString(), tx));
  }
  return revisions;
}
